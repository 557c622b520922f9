using BandSpec.Core.Numerics;

namespace BandSpec.Core.LotJudging;

/// <summary>Capability without any law of distribution (ISO 22514-2, percentile method).</summary>
/// <param name="Low">The value that 0.135 % of all lie below, %FS.</param>
/// <param name="Median">The value that half of all lie below, %FS.</param>
/// <param name="High">The value that 99.865 % of all lie below, %FS.</param>
/// <param name="Spread">Tolerance over High minus Low.</param>
/// <param name="Nearer">The smaller share of the room between median and limit that a side takes.</param>
/// <param name="NearerLower">
/// 95 % lower limit of it from order statistics; <see langword="null"/> below <see cref="SmallestForLimit"/> values, which cannot give one.
/// </param>
/// <param name="Values">How many values were sorted: all, or the bounded random sample.</param>
public sealed record PercentileFigures(
    double Low, double Median, double High, double Spread, double Nearer, double? NearerLower, int Values)
{
    /// <summary>Fewest values from which order statistics bound both an outer percentile and the median at 97.5 % each.</summary>
    public const int SmallestForLimit = 2731;

    /// <summary>Whether there are too few values for the outer percentiles, so that the smallest and the largest stand for them: an index is then too good.</summary>
    public bool ExtremesStand => Values < Percentiles.SmallestSample;

    internal static PercentileFigures Of(ReadOnlySpan<double> sorted, Interval tolerance)
    {
        double low = Percentiles.Of(sorted, Percentiles.Low), high = Percentiles.Of(sorted, Percentiles.High);
        double median = Percentiles.Of(sorted, 0.5);
        (double spread, double nearer) = Percentiles.Capability(low, median, high, tolerance);
        return new(low, median, high, spread, nearer, LowerLimit(sorted, tolerance), sorted.Length);
    }

    /// <summary>
    /// Both sides with the outer percentile farther out and the median nearer to it than they are with 97.5 % confidence each, so that both hold
    /// with 95 % (Bonferroni).
    /// </summary>
    private static double? LowerLimit(ReadOnlySpan<double> sorted, Interval tolerance)
    {
        const double Each = (1 + CapabilityFigures.Confidence) / 2;
        int n = sorted.Length;
        if (OrderStatistics.UpperRank(n, Percentiles.High, Each) is not { } high || OrderStatistics.UpperRank(n, 0.5, Each) is not { } middle)
            return null;
        double upper = Share(tolerance.Upper, sorted[n - middle], sorted[high - 1]);
        double lower = Share(-tolerance.Lower, -sorted[middle - 1], -sorted[n - high]);
        return Math.Min(upper, lower);
    }

    private static double Share(double limit, double median, double outer) => (limit - median) / (outer - median);
}
