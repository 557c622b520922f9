namespace BandSpec.Core.Numerics;

/// <summary>
/// The joint law of a normal sample's mean and standard deviation, which are independent: <c>Z ~ N(0, 1)</c> and <c>d = s/σ − 1</c> as in
/// <see cref="ScaledChi"/>. Chi-square, noncentral t and the law of the capability index are all probabilities that Z lies between
/// two straight lines in d.
/// </summary>
internal static class MeanAndSpread
{
    /// <summary>
    /// <c>P(lower(d) ≤ Z ≤ upper(d), d ∈ spread)</c> with <paramref name="degreesOfFreedom"/> ≥ 1. Relative error below 1e-12 for results down to
    /// 1e-290 and up to 1e6 degrees of freedom, measured against mpmath.
    /// </summary>
    public static double Probability(double degreesOfFreedom, Interval spread, Line lower, Line upper)
    {
        Interval z(double d) => new(lower.At(d), upper.At(d));
        double logarithm(double d) => ScaledChi.LogDensity(d, degreesOfFreedom) + NormalDistribution.LogFractionBetween(z(d));
        double integrand(double d) => ScaledChi.Density(d, degreesOfFreedom) * NormalDistribution.FractionBetween(z(d));
        Interval range = spread.Intersect(ScaledChi.Range(degreesOfFreedom));
        return LogConcave.Integrate(logarithm, integrand, range, [lower.Step, upper.Step]);
    }
}

/// <summary>A straight line <c>offset + slope·d</c>; a line at infinity has an infinite offset and slope 0.</summary>
/// <param name="Offset">Value at d = 0.</param>
/// <param name="Slope">Rise per unit of d.</param>
internal readonly record struct Line(double Offset, double Slope)
{
    /// <summary>Below everything.</summary>
    public static Line Lowest => new(double.NegativeInfinity, 0);

    /// <summary>Above everything.</summary>
    public static Line Highest => new(double.PositiveInfinity, 0);

    /// <summary>Value at <paramref name="d"/>.</summary>
    public double At(double d) => Offset + Slope * d;

    /// <summary>Where the line crosses 0, and how wide a normal step along it looks.</summary>
    public SmoothStep Step => new(-Offset / Slope, 1 / Math.Abs(Slope));
}
