namespace BandSpec.Core.Numerics;

/// <summary>
/// The joint law of a normal sample's mean and standard deviation, which are independent: <c>Z ~ N(0, 1)</c> and <c>x = s/σ</c> as in
/// <see cref="ScaledChi"/>. Chi-square, noncentral t and the law of the capability index are all probabilities that Z lies between
/// two straight lines in x.
/// </summary>
internal static class MeanAndSpread
{
    /// <summary>
    /// <c>P(lower(x) ≤ Z ≤ upper(x), x ∈ spread)</c> with <paramref name="degreesOfFreedom"/> ≥ 1. Relative error below 1e-12 for results down to
    /// 1e-290 and up to 1e6 degrees of freedom, measured against mpmath.
    /// </summary>
    public static double Probability(double degreesOfFreedom, Interval spread, Line lower, Line upper)
    {
        var law = new ScaledChi(degreesOfFreedom);
        Line from = lower.From(law.Origin), to = upper.From(law.Origin);
        Interval z(double d) => new(from.At(d), to.At(d));
        double logarithm(double d) => law.LogDensity(d) + NormalDistribution.LogFractionBetween(z(d));
        double integrand(double d) => law.Density(d) * NormalDistribution.FractionBetween(z(d));
        Interval range = new Interval(spread.Lower - law.Origin, spread.Upper - law.Origin).Intersect(law.Range);
        return LogConcave.Integrate(logarithm, integrand, range, [from.Step, to.Step]);
    }
}

/// <summary>A straight line <c>offset + slope·x</c>; a line at infinity has an infinite offset and slope 0.</summary>
/// <param name="Offset">Value at x = 0.</param>
/// <param name="Slope">Rise per unit of x.</param>
internal readonly record struct Line(double Offset, double Slope)
{
    /// <summary>Below everything.</summary>
    public static Line Lowest => new(double.NegativeInfinity, 0);

    /// <summary>Above everything.</summary>
    public static Line Highest => new(double.PositiveInfinity, 0);

    /// <summary>Where the line crosses 0, and how wide a normal step along it looks.</summary>
    public SmoothStep Step => new(-Offset / Slope, 1 / Math.Abs(Slope));

    /// <summary>Value at <paramref name="x"/>.</summary>
    public double At(double x) => Offset + Slope * x;

    /// <summary>The same line with x counted from <paramref name="origin"/>.</summary>
    public Line From(double origin) => new(At(origin), Slope);
}
