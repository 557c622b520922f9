namespace BandSpec.Core.Numerics;

/// <summary>
/// Guard bands <c>w = T_U − A_U = A_L − T_L</c> that keep a stated risk. A positive one makes acceptance stricter than the tolerance,
/// a negative one more lenient (JCGM 106:2012 clause 8.3). Same unit as the tolerance.
/// </summary>
internal static class GuardBand
{
    /// <summary>
    /// The smallest guard band, not below <paramref name="smallest"/>, whose global consumer's risk is at most <paramref name="risk"/>
    /// for a process <c>N(mean, sigma²)</c> measured with standard uncertainty u. One always exists when risk &gt; 0: at half the tolerance
    /// nothing is accepted any more, and the answer then tells how much is left.
    /// </summary>
    /// <exception cref="ArgumentOutOfRangeException">The risk is not between 0 and 1, both excluded.</exception>
    public static double ForConsumerRisk(double mean, double sigma, double u, Interval tolerance, double risk, double smallest = 0)
    {
        RequireProbability(risk);
        double excess(double w) => LogRatio(ConformityRisk.Of(mean, sigma, u, tolerance, tolerance.Inset(w)).Consumer, risk);
        if (excess(smallest) <= 0)
            return smallest;
        double half = tolerance.Width / 2, upper = half;
        if (double.IsInfinity(half))
        {
            double step = sigma + u;
            for (upper = smallest + step; excess(upper) > 0; upper += step)
                step *= 2;
        }
        return Roots.Bracketed(excess, smallest, upper);
    }

    /// <summary>
    /// The guard band that leaves an item reading exactly at an acceptance limit the probability <paramref name="risk"/> of being
    /// nonconforming, both limits counted: <c>Q(w/u) + Q((T − w)/u) = risk</c> with T the tolerance's width. Null when no guard band can,
    /// because even a reading in the middle is more doubtful than that (<see cref="LargestUncertainty"/> says what would do).
    /// </summary>
    /// <exception cref="ArgumentOutOfRangeException">The risk is not between 0 and 1, both excluded.</exception>
    public static double? ForSpecificRisk(double u, double width, double risk)
    {
        RequireProbability(risk);
        if (u == 0)
            return 0;
        double ratio = width / u, best = NormalDistribution.FractionOutside(ratio / 2);
        double oneSided = NormalDistribution.UpperQuantile(risk);
        if (double.IsInfinity(ratio))
            return u * oneSided;
        if (best > risk)
            return null;
        double excess(double g) => LogRatio(NormalDistribution.UpperTail(g) + NormalDistribution.UpperTail(ratio - g), risk);
        double lower = Math.Min(oneSided, ratio / 2);
        return excess(lower) <= 0 ? u * lower : excess(ratio / 2) >= 0 ? width / 2 : u * Roots.Bracketed(excess, lower, ratio / 2);
    }

    /// <summary>
    /// The largest standard uncertainty with which <see cref="ForSpecificRisk"/> has an answer: <c>T/(2·z)</c> with <c>2Q(z) = risk</c>.
    /// </summary>
    /// <exception cref="ArgumentOutOfRangeException">The risk is not between 0 and 1, both excluded.</exception>
    public static double LargestUncertainty(double width, double risk)
    {
        RequireProbability(risk);
        return width / (2 * NormalDistribution.UpperQuantile(risk / 2));
    }

    /// <summary>Logarithms make the search even over many decades; a risk of exactly 0 stands for one far below any wanted.</summary>
    private static double LogRatio(double actual, double wanted) => actual > 0 ? Math.Log(actual / wanted) : -1000;

    private static void RequireProbability(double risk)
    {
        if (!(risk is > 0 and < 1))
            throw new ArgumentOutOfRangeException(nameof(risk), risk, "A risk lies between 0 and 1.");
    }
}
