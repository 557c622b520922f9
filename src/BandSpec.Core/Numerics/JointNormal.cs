namespace BandSpec.Core.Numerics;

/// <summary>
/// A true value <c>Y ~ N(mean, sigma²)</c> and its measurement <c>X = Y + E</c>, <c>E ~ N(0, u²)</c> independent of Y: the joint law
/// behind every risk of JCGM 106:2012, clause 9. Either spread may be 0.
/// </summary>
internal static class JointNormal
{
    /// <summary>Beyond this many sigma the density underflows.</summary>
    private const double Reach = 38.6;

    /// <summary>
    /// <c>P(Y ∈ truth, X ∈ reading)</c>. Relative error below 1e-13 for <c>sigma/u</c> from 1e-3 to 1e3, measured against mpmath down to
    /// results of 2e-39; nothing is subtracted, so small probabilities keep their digits. An empty interval gives 0.
    /// </summary>
    /// <remarks>
    /// <c>∫ φ(t)·[Φ((b − mean − sigma·t)/u) − Φ((a − mean − sigma·t)/u)] dt</c> over the truth in units of sigma. The integrand is
    /// log-concave in t.
    /// </remarks>
    public static double Probability(double mean, double sigma, double u, Interval truth, Interval reading)
    {
        if (truth.IsEmpty || reading.IsEmpty)
            return 0;
        if (sigma == 0)
            return truth.Contains(mean) ? PointOrNormal(mean, u, reading) : 0;
        if (u == 0)
            return NormalDistribution.FractionBetween(truth.Intersect(reading).Standardize(mean, sigma));

        Interval offset = new(reading.Lower - mean, reading.Upper - mean);
        Interval measured(double t) => offset.Standardize(sigma * t, u);
        double logIntegrand(double t) => NormalDistribution.LogDensity(t) + NormalDistribution.LogFractionBetween(measured(t));
        double integrand(double t) => NormalDistribution.Density(t) * NormalDistribution.FractionBetween(measured(t));

        Interval range = truth.Standardize(mean, sigma).Intersect(Interval.Symmetric(Reach));
        if (!(range.Width > 0))
            return 0;
        Interval steps = reading.Standardize(mean, sigma);
        return LogConcave.Integrate(logIntegrand, integrand, range, [new(steps.Lower, u / sigma), new(steps.Upper, u / sigma)]);
    }

    private static double PointOrNormal(double value, double u, Interval reading)
    {
        if (u == 0)
            return reading.Contains(value) ? 1 : 0;
        return NormalDistribution.FractionBetween(reading.Standardize(value, u));
    }
}
