namespace BandSpec.Core.Numerics;

/// <summary>
/// Rounding to multiples of a decimal step. Worked in <see cref="decimal"/>, so that 29 steps of 0.01 are 0.29 and print that way.
/// </summary>
internal static class StepRounding
{
    private const decimal OnTheStep = 1e-9m;

    /// <summary>The smallest multiple that is not below the value, but for 10⁻⁹ of a step: a value that sits on a step stays there.</summary>
    public static double Up(double value, double step)
    {
        decimal size = (decimal)step;
        return (double)(Math.Ceiling(((decimal)value / size) - OnTheStep) * size);
    }

    /// <summary>The largest multiple that is not above the value, without any tolerance.</summary>
    public static decimal Down(decimal value, decimal step) => Math.Floor(value / step) * step;

    /// <summary>The smallest multiple that is not below the value, without any tolerance.</summary>
    public static decimal UpStrictly(decimal value, decimal step) => Math.Ceiling(value / step) * step;
}
