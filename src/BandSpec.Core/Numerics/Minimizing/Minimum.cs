namespace BandSpec.Core.Numerics.Minimizing;

/// <summary>A function with its slope at one place.</summary>
/// <param name="Place">The place.</param>
/// <param name="Value">The value; positive infinity outside the function's domain.</param>
/// <param name="Slope">The gradient; unused where the value is infinite.</param>
internal sealed record SlopedPoint(double[] Place, double Value, double[] Slope)
{
    /// <summary>A place outside the function's domain.</summary>
    public static SlopedPoint Outside(double[] place) => new(place, double.PositiveInfinity, []);
}

/// <summary>How a minimisation ended.</summary>
internal enum MinimizingEnd
{
    /// <summary>The decrease still to be had is not worth a step, or lost in rounding.</summary>
    Converged,

    /// <summary>No further step lowers the function, though its slope asks for one: rounding has the last word.</summary>
    NoFurtherDecrease,

    /// <summary>The most steps allowed were taken.</summary>
    StepsUsedUp,
}

/// <summary>Where a minimisation ended.</summary>
/// <param name="Point">The lowest point.</param>
/// <param name="End">How it ended.</param>
/// <param name="Evaluations">How often the function was evaluated.</param>
internal sealed record Minimum(SlopedPoint Point, MinimizingEnd End, int Evaluations);
