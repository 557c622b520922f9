namespace BandSpec.Core.Numerics;

/// <summary>
/// Factors k of statistical tolerance intervals for a normal population (ISO 16269-6): mean ± k·s of n readings holds at least the
/// fraction <c>content</c> of all values with the stated confidence. Both probabilities lie strictly between 0 and 1; n ≥ 2.
/// </summary>
internal static class ToleranceFactors
{
    /// <summary>One-sided factor k1, exact: the quantile of the noncentral t with <c>δ = z_p·√n</c>, over √n.</summary>
    public static double OneSided(double n, double content, double confidence) =>
        NoncentralT.Quantile(confidence, n - 1, Math.Sqrt(n) * NormalDistribution.Quantile(content)) / Math.Sqrt(n);

    /// <summary>Two-sided factor k2, exact for an interval around the sample mean.</summary>
    /// <remarks>
    /// A mean that is off by z holds the content when <c>s ≥ r(z)/k</c>, with <c>Φ(z + r) − Φ(z − r) = p</c>; the confidence is the average of
    /// that probability over <c>z ~ N(0, 1/n)</c> (Odeh and Owen 1980, Tables for Normal Tolerance Limits). It is solved for k on its complement.
    /// The widely printed 2.210167 for n = 43, content 90 %, confidence 99 % comes from exchanged arguments; 2.222825 is right.
    /// </remarks>
    public static double TwoSided(double n, double content, double confidence)
    {
        (double Weight, double Reach)[] offsets = Offsets(n, content);
        double complement(double k) => offsets.Sum(o => o.Weight * ChiSquared.Cumulative((n - 1) * Math.Pow(o.Reach / k, 2), n - 1));
        double start = offsets[0].Reach * Math.Sqrt((n - 1) * (1 + 1 / n) / ChiSquared.Quantile(1 - confidence, n - 1));
        return Roots.Rising(k => k <= 0 ? double.NegativeInfinity : Math.Log((1 - confidence) / complement(k)), start, 0.02 * start);
    }

    /// <summary>How far the interval must reach for each place of the mean, and that place's share of the probability.</summary>
    private static (double Weight, double Reach)[] Offsets(double n, double content)
    {
        const int Panels = 5;
        const double Farthest = 9;
        GaussRule rule = GaussLegendre.Rule(16);
        double half = Farthest / Panels / 2;
        var offsets = new (double, double)[Panels * rule.Nodes.Length];
        for (int i = 0; i < offsets.Length; i++)
        {
            (int panel, int node) = Math.DivRem(i, rule.Nodes.Length);
            double y = half * (2 * panel + 1 + rule.Nodes[node]);
            offsets[i] = (2 * half * rule.Weights[node] * NormalDistribution.Density(y), Reach(y / Math.Sqrt(n), content));
        }
        return offsets;
    }

    /// <summary>The r with <c>Φ(z + r) − Φ(z − r) = content</c>, for z ≥ 0.</summary>
    private static double Reach(double z, double content) =>
        Roots.Rising(r => NormalDistribution.FractionBetween(new(z - r, z + r)) - content, z + NormalDistribution.Quantile(content), 0.1);
}
