using BandSpec.Documents.Charts;

namespace BandSpec.Documents.Judging;

/// <summary>
/// Cuts values into the bins of a histogram: the width after Freedman and Diaconis (1981), 2·IQR/∛n, in whole steps of the output, so that no
/// bin holds more steps than its neighbour and a comb appears where none is.
/// </summary>
internal static class ValueBins
{
    private const int Fewest = 5, Most = 60;

    /// <summary>The bins of values within ±reach; shares are of all values. At least one value.</summary>
    public static IReadOnlyList<ValueBin> Of(IReadOnlyList<double> values, double reach)
    {
        double[] all = [.. values.Order()];
        double[] shown = [.. all.Where(v => Math.Abs(v) <= reach)];
        if (shown.Length == 0)
            return [new ValueBin(-reach, reach, 0)];
        double range = shown[^1] - shown[0], step = Step(shown, 1e-7 * Math.Max(range, reach));
        double width = range > 0 ? step * Math.Max(1, Math.Round(Width(shown, range) / step)) : reach / 30;
        double start = shown[0] - ((range > 0 ? step : width) / 2);
        int count = 1 + (int)Math.Floor((shown[^1] - start) / width);
        long[] counts = new long[count];
        foreach (double value in shown)
            counts[Math.Min(count - 1, (int)((value - start) / width))]++;
        return [.. counts.Select((n, i) => new ValueBin(start + (i * width), start + ((i + 1) * width), 100.0 * n / all.Length))];
    }

    private static double Width(double[] sorted, double range)
    {
        double between = sorted[sorted.Length * 3 / 4] - sorted[sorted.Length / 4];
        double wanted = between > 0 ? 2 * between / Math.Cbrt(sorted.Length) : range / Math.Sqrt(sorted.Length);
        return Math.Clamp(wanted, range / Most, range / Fewest);
    }

    /// <summary>The smallest gap between values that differ by more than rounding.</summary>
    private static double Step(double[] sorted, double rounding)
    {
        double step = double.PositiveInfinity;
        for (int i = 1; i < sorted.Length; i++)
            if (sorted[i] - sorted[i - 1] is var gap && gap > rounding)
                step = Math.Min(step, gap);
        return double.IsFinite(step) ? step : rounding;
    }
}
