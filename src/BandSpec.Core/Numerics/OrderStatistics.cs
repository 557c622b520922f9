using MathNet.Numerics;

namespace BandSpec.Core.Numerics;

/// <summary>Confidence limits for percentiles that need no law of distribution: they are values of the sample, chosen by rank.</summary>
internal static class OrderStatistics
{
    /// <summary>
    /// The smallest rank r, from 1, such that the r-th of n values lies above the p-quantile with at least the stated confidence; null when not
    /// even the largest does.
    /// </summary>
    /// <remarks><c>P(X_(r) ≥ ξ_p) = P(at most r − 1 of n lie below ξ_p)</c>, binomial (David and Nagaraja 2003, Order Statistics, 7.1).</remarks>
    public static int? UpperRank(int n, double p, double confidence)
    {
        // At most r − 1 successes: the beta integral I_{1−p}(n − r + 1, r); it grows with r.
        bool enough(int r) => SpecialFunctions.BetaRegularized(n - r + 1, r, 1 - p) >= confidence;
        if (!enough(n))
            return null;
        int fails = 0, holds = n;
        while (holds - fails > 1)
        {
            int middle = (fails + holds) / 2;
            (fails, holds) = enough(middle) ? (fails, middle) : (middle, holds);
        }

        return holds;
    }

    /// <summary>The largest rank whose value lies below the p-quantile with at least the stated confidence; null when not even the smallest does.</summary>
    public static int? LowerRank(int n, double p, double confidence) => UpperRank(n, 1 - p, confidence) is { } rank ? n + 1 - rank : null;
}
