namespace BandSpec.Core.Numerics;

/// <summary>
/// A true value <c>Y ~ N(mean, sigma²)</c> and its measurement <c>X = Y + E</c>, <c>E ~ N(0, u²)</c> independent of Y: the joint law
/// behind every risk of JCGM 106:2012, clause 9. Either spread may be 0.
/// </summary>
internal static class JointNormal
{
    /// <summary>How far below its peak, in natural logarithm, the integrand is followed: e^−42 is 6e-19.</summary>
    private const double Depth = 42;

    /// <summary>Beyond this many sigma the density underflows.</summary>
    private const double Reach = 38.6;

    /// <summary>
    /// <c>P(Y ∈ truth, X ∈ reading)</c>. Relative error below 1e-13 for <c>sigma/u</c> from 1e-3 to 1e3, measured against mpmath down to
    /// results of 2e-39; nothing is subtracted, so small probabilities keep their digits. An empty interval gives 0.
    /// </summary>
    /// <remarks>
    /// <c>∫ φ(t)·[Φ((b − mean − sigma·t)/u) − Φ((a − mean − sigma·t)/u)] dt</c> over the truth in units of sigma. The integrand is
    /// log-concave: its peak is found first, then the stretch that matters, which is cut into pieces no wider than the steps at a and b.
    /// </remarks>
    public static double Probability(double mean, double sigma, double u, Interval truth, Interval reading)
    {
        if (truth.IsEmpty || reading.IsEmpty)
            return 0;
        if (sigma == 0)
            return truth.Contains(mean) ? PointOrNormal(mean, u, reading) : 0;
        if (u == 0)
            return NormalDistribution.FractionBetween(truth.Intersect(reading).Standardize(mean, sigma));

        Interval measured(double t) => reading.Standardize(mean + sigma * t, u);
        double logIntegrand(double t) => NormalDistribution.LogDensity(t) + NormalDistribution.LogFractionBetween(measured(t));
        double integrand(double t) => NormalDistribution.Density(t) * NormalDistribution.FractionBetween(measured(t));

        Interval range = truth.Standardize(mean, sigma).Intersect(Interval.Symmetric(Reach));
        if (!(range.Width > 0))
            return 0;
        Interval support = Support(logIntegrand, range);
        return GaussLegendre.IntegrateBetween(integrand, Cuts(support, reading.Standardize(mean, sigma), u / sigma), order: 16);
    }

    private static double PointOrNormal(double value, double u, Interval reading)
    {
        if (u == 0)
            return reading.Contains(value) ? 1 : 0;
        return NormalDistribution.FractionBetween(reading.Standardize(value, u));
    }

    /// <summary>The part of the range where a concave function stays within <see cref="Depth"/> of its maximum there.</summary>
    private static Interval Support(Func<double, double> concave, Interval range)
    {
        double peak = Peak(concave, range), level = concave(peak) - Depth;
        return new(Edge(concave, level, peak, range.Lower), Edge(concave, level, peak, range.Upper));
    }

    private static double Edge(Func<double, double> concave, double level, double inside, double outside)
    {
        if (concave(outside) >= level)
            return outside;
        for (int step = 0; step < 40; step++)
        {
            double middle = (inside + outside) / 2;
            if (concave(middle) >= level)
                inside = middle;
            else
                outside = middle;
        }
        return outside;
    }

    /// <summary>Golden-section search; 60 steps narrow the range by a factor 3e12.</summary>
    private static double Peak(Func<double, double> concave, Interval range)
    {
        const double Golden = 0.6180339887498949;
        (double low, double high) = range;
        double left = high - Golden * (high - low), right = low + Golden * (high - low);
        double atLeft = concave(left), atRight = concave(right);
        for (int step = 0; step < 60; step++)
        {
            if (atLeft < atRight)
            {
                (low, left, atLeft) = (left, right, atRight);
                atRight = concave(right = low + Golden * (high - low));
            }
            else
            {
                (high, right, atRight) = (right, left, atLeft);
                atLeft = concave(left = high - Golden * (high - low));
            }
        }
        return concave(range.Lower) >= atLeft ? range.Lower : concave(range.Upper) >= atLeft ? range.Upper : left;
    }

    /// <summary>Eight equal pieces, and around each end of the reading interval pieces two measurement sigmas wide out to eight.</summary>
    private static List<double> Cuts(Interval support, Interval reading, double step)
    {
        var cuts = new SortedSet<double> { support.Upper };
        for (int k = 0; k < 8; k++)
            cuts.Add(support.Lower + k * support.Width / 8);
        for (int k = -8; k <= 8; k += 2)
        {
            cuts.Add(reading.Lower + k * step);
            cuts.Add(reading.Upper + k * step);
        }
        return [.. cuts.Where(support.Contains)];
    }
}
