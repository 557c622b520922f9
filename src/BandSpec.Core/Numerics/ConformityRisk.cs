namespace BandSpec.Core.Numerics;

/// <summary>
/// What deciding by measurement costs, JCGM 106:2012 clause 9: the process makes true values <c>N(mean, sigma²)</c>, a measurement adds
/// <c>N(0, u²)</c>, an item conforms when its true value lies in the tolerance and is accepted when its reading lies in the acceptance interval.
/// </summary>
internal static class ConformityRisk
{
    /// <summary>
    /// The risks of one decision rule. Relative error as in <see cref="JointNormal.Probability"/>. With <c>sigma = 0</c> every item is the
    /// mean, with <c>u = 0</c> the reading is the truth; an empty acceptance interval rejects all, so that the producer's risk is all
    /// conforming items. Ends of the intervals may be infinite.
    /// </summary>
    public static ConformityRisks Of(double mean, double sigma, double u, Interval tolerance, Interval acceptance)
    {
        double joint(Interval truth, Interval reading) => JointNormal.Probability(mean, sigma, u, truth, reading);
        Interval whole = Interval.Symmetric(double.PositiveInfinity);
        double conformance = sigma == 0
            ? joint(tolerance, whole)
            : NormalDistribution.FractionBetween(tolerance.Standardize(mean, sigma));
        if (acceptance.IsEmpty)
            return new(0, conformance, 0, conformance);

        double total = Math.Sqrt(sigma * sigma + u * u);
        double acceptanceShare = total == 0
            ? joint(whole, acceptance)
            : NormalDistribution.FractionBetween(acceptance.Standardize(mean, total));
        if (sigma == 0)
            return OfOneValue(mean, u, tolerance, acceptance, acceptanceShare);
        double consumer = joint(tolerance.Below, acceptance) + joint(tolerance.Above, acceptance);
        double producer = joint(tolerance, acceptance.Below) + joint(tolerance, acceptance.Above);
        return new(consumer, producer, acceptanceShare, conformance);
    }

    /// <summary>The same for a tolerance ±<paramref name="limit"/> and acceptance limits ±<paramref name="acceptanceLimit"/>; a negative one accepts nothing.</summary>
    public static ConformityRisks Symmetric(double mean, double sigma, double u, double limit, double acceptanceLimit) =>
        Of(mean, sigma, u, Interval.Symmetric(limit), Interval.Symmetric(acceptanceLimit));

    /// <summary>A process without spread puts all its weight on one point, which may be an end of the tolerance and then conforms.</summary>
    private static ConformityRisks OfOneValue(double mean, double u, Interval tolerance, Interval acceptance, double accepted)
    {
        if (!tolerance.Contains(mean))
            return new(accepted, 0, accepted, 0);
        double rejected = u == 0
            ? 1 - accepted
            : NormalDistribution.FractionBetween(acceptance.Below.Standardize(mean, u))
                + NormalDistribution.FractionBetween(acceptance.Above.Standardize(mean, u));
        return new(0, rejected, accepted, 1);
    }
}

/// <summary>The four probabilities of a decision rule, each of all items made (joint, not conditional).</summary>
/// <param name="Consumer">Nonconforming and accepted: <c>R_C</c> of JCGM 106:2012, 9.3.2.</param>
/// <param name="Producer">Conforming and rejected: <c>R_P</c>.</param>
/// <param name="Acceptance">Accepted, conforming or not.</param>
/// <param name="Conformance">Conforming, accepted or not: <c>p_c</c> of the process.</param>
internal readonly record struct ConformityRisks(double Consumer, double Producer, double Acceptance, double Conformance)
{
    /// <summary>Fraction nonconforming among the accepted; 0 when nothing is accepted.</summary>
    public double NonconformingGivenAccepted => Acceptance > 0 ? Consumer / Acceptance : 0;
}
