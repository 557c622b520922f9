namespace BandSpec.Core.Numerics;

/// <summary>
/// How capability indices estimated from a normal sample scatter, and what can be claimed from them. Estimates use the sample mean of n
/// readings and a standard deviation with ν degrees of freedom (n − 1, or fewer when it is pooled within lots).
/// </summary>
/// <remarks>
/// Every limit takes the probability p with which the true index lies above it: 0.95 gives a 95 % lower bound, 0.05 the upper bound of the
/// same confidence, 0.975 and 0.025 together a two-sided 95 % interval.
/// </remarks>
internal static class CapabilityLaw
{
    /// <summary>Limit for Cp, whose estimate follows chi-square: <c>Ĉp·√(χ²_{1−p,ν}/ν)</c>.</summary>
    public static double SpreadLimit(double estimate, double degreesOfFreedom, double probability) =>
        estimate * Math.Sqrt(ChiSquared.Quantile(1 - probability, degreesOfFreedom) / degreesOfFreedom);

    /// <summary>
    /// Limit for a one-sided index such as CPU: <c>3√n·Ĉ</c> is noncentral t with <c>δ = 3√n·C</c>, solved for C. Used for Cpk it never
    /// claims too much, wherever the process sits; for a centred process it is cautious.
    /// </summary>
    public static double OneSidedLimit(double estimate, double n, double degreesOfFreedom, double probability)
    {
        double scale = 3 * Math.Sqrt(n);
        return NoncentralT.Noncentrality(scale * estimate, degreesOfFreedom, probability) / scale;
    }

    /// <summary>
    /// <c>P(Ĉpk ≥ y)</c> for a process with index C and mean off the middle by ξ standard deviations: the exact law of Pearn and Lin (2004,
    /// Comput. Ind. Eng. 47, 351-369). With half the tolerance <c>bσ, b = 3C + |ξ|</c>, it is <c>P(|Z + ξ√n| ≤ √n·(b − 3y·s/σ))</c>.
    /// </summary>
    public static double AtLeast(double y, double index, double offCentre, double n, double degreesOfFreedom)
    {
        double root = Math.Sqrt(n), xi = Math.Abs(offCentre), b = 3 * index + xi;
        double largest = y > 0 ? b / (3 * y) : double.PositiveInfinity;
        return MeanAndSpread.Probability(degreesOfFreedom, new(0, largest),
            new(-root * (b + xi), 3 * y * root), new(root * (b - xi), -3 * y * root));
    }

    /// <summary>
    /// Limit for Cpk by the exact law, for a process whose mean is off the middle by <paramref name="offCentre"/> standard deviations:
    /// the C for which an estimate at least this large has probability 1 − p.
    /// </summary>
    public static double TwoSidedLimit(double estimate, double offCentre, double n, double degreesOfFreedom, double probability) =>
        Roots.Rising(c => Math.Log(AtLeast(estimate, c, offCentre, n, degreesOfFreedom) / (1 - probability)),
            OneSidedLimit(estimate, n, degreesOfFreedom, probability), 0.02 + 0.1 * Math.Abs(estimate) / Math.Sqrt(degreesOfFreedom));
}
