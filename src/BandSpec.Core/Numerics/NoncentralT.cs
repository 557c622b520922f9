namespace BandSpec.Core.Numerics;

/// <summary>
/// The noncentral t distribution: the law of <c>(Z + δ)/(s/σ)</c> with ν ≥ 1 degrees of freedom and noncentrality δ. It is what a one-sided
/// capability index and a one-sided tolerance factor follow. The library has none.
/// </summary>
/// <remarks>
/// <c>P(T ≤ t) = P(Z ≤ t·s/σ − δ)</c>, integrated over s (Owen 1968, Technometrics 10, 445-478). Both tails have a relative error below 1e-12
/// for ν up to 1e5 and tails down to 1e-200 (measured against mpmath); the usual series is only good to 1e-12 absolute.
/// </remarks>
internal static class NoncentralT
{
    private static readonly Interval AnySpread = Interval.Symmetric(double.PositiveInfinity);

    /// <summary><c>P(T ≤ t)</c>.</summary>
    public static double Cumulative(double t, double degreesOfFreedom, double noncentrality) =>
        MeanAndSpread.Probability(degreesOfFreedom, AnySpread, Line.Lowest, new(-noncentrality, t));

    /// <summary><c>P(T &gt; t)</c>, not as a difference from 1.</summary>
    public static double UpperTail(double t, double degreesOfFreedom, double noncentrality) =>
        MeanAndSpread.Probability(degreesOfFreedom, AnySpread, new(-noncentrality, t), Line.Highest);

    /// <summary>The t with <c>P(T ≤ t) = p</c>, for 0 &lt; p &lt; 1; relative error about 1e-12, less near t = 0.</summary>
    public static double Quantile(double p, double degreesOfFreedom, double noncentrality) =>
        Roots.Rising(t => Excess(t, degreesOfFreedom, noncentrality, p), noncentrality + NormalDistribution.Quantile(p),
            0.1 + Math.Abs(noncentrality) / Math.Sqrt(degreesOfFreedom));

    /// <summary>The noncentrality δ with <c>P(T ≤ t; δ) = p</c>, for 0 &lt; p &lt; 1.</summary>
    public static double Noncentrality(double t, double degreesOfFreedom, double p) =>
        Roots.Rising(delta => -Excess(t, degreesOfFreedom, delta, p), t - NormalDistribution.Quantile(p),
            0.1 + Math.Abs(t) / Math.Sqrt(degreesOfFreedom));

    /// <summary>Logarithm of the smaller tail over its wanted value, rising with t: even over many decades.</summary>
    private static double Excess(double t, double degreesOfFreedom, double noncentrality, double p) => p <= 0.5
        ? Math.Log(Cumulative(t, degreesOfFreedom, noncentrality) / p)
        : -Math.Log(UpperTail(t, degreesOfFreedom, noncentrality) / (1 - p));
}
