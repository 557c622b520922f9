using MathNet.Numerics;

namespace BandSpec.Core.Numerics;

/// <summary>
/// The chi-square distribution with ν > 0 degrees of freedom, not necessarily whole, both tails to full digits for ν ≥ 1. Own code because the library's quantile is off
/// by 6e-9 at a probability of 1e-6 and 3e-7 at 1e-9, and its upper tail by 4e-11 at 100 000 degrees of freedom (against mpmath).
/// </summary>
internal static class ChiSquared
{
    /// <summary>
    /// <c>P(χ² ≤ x)</c>; relative error as in <see cref="MeanAndSpread"/>. Below one degree of freedom, where that law has no peak,
    /// a power series.
    /// </summary>
    public static double Cumulative(double x, double degreesOfFreedom) =>
        degreesOfFreedom < 1
            ? BelowOneDegree(degreesOfFreedom / 2, Math.Max(x, 0) / 2)
            : Within(new(0, Ratio(x, degreesOfFreedom)), degreesOfFreedom);

    /// <summary><c>P(χ² &gt; x)</c>, not as a difference from 1.</summary>
    public static double UpperTail(double x, double degreesOfFreedom) =>
        degreesOfFreedom < 1
            ? SpecialFunctions.GammaUpperRegularized(degreesOfFreedom / 2, Math.Max(x, 0) / 2)
            : Within(new(Ratio(x, degreesOfFreedom), double.PositiveInfinity), degreesOfFreedom);

    /// <summary>The x with <c>P(χ² ≤ x) = p</c>, for 0 &lt; p &lt; 1; relative error about 1e-13.</summary>
    public static double Quantile(double p, double degreesOfFreedom)
    {
        // Solved on the smaller tail, in ln x; the start is the cube-root approximation of Wilson and Hilferty (1931).
        double variance = 2 / (9 * degreesOfFreedom), root = 1 - variance + NormalDistribution.Quantile(p) * Math.Sqrt(variance);
        double start = Math.Log(degreesOfFreedom) + 3 * Math.Log(Math.Max(root, 0.01));
        double excess(double logX) => p <= 0.5
            ? Math.Log(Cumulative(Math.Exp(logX), degreesOfFreedom) / p)
            : -Math.Log(UpperTail(Math.Exp(logX), degreesOfFreedom) / (1 - p));
        return Math.Exp(Roots.Rising(excess, start, 0.1 / Math.Sqrt(degreesOfFreedom)));
    }

    /// <summary>
    /// <c>y^a·e^(−y)/Γ(a+1)·Σ y^k/((a+1)…(a+k))</c> (Abramowitz and Stegun 6.5.29) for a &lt; ½; from y = 1 on the library's, which gives 0 for
    /// small y.
    /// </summary>
    private static double BelowOneDegree(double a, double y)
    {
        if (y > 1)
            return SpecialFunctions.GammaLowerRegularized(a, y);
        double term = 1, sum = 1;
        for (int k = 1; k <= 20; k++)
            sum += term *= y / (a + k);
        return Math.Pow(y, a) * Math.Exp(-y) / SpecialFunctions.Gamma(a + 1) * sum;
    }

    private static double Ratio(double x, double degreesOfFreedom) => Math.Sqrt(Math.Max(x, 0) / degreesOfFreedom);

    private static double Within(Interval spread, double degreesOfFreedom) =>
        MeanAndSpread.Probability(degreesOfFreedom, spread, Line.Lowest, Line.Highest);
}
