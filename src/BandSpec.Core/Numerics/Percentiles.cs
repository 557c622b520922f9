namespace BandSpec.Core.Numerics;

/// <summary>Percentiles of readings, and the capability figures that need no normal law (ISO 22514-2, percentile method).</summary>
internal static class Percentiles
{
    /// <summary>Fraction below minus three sigma of a normal law, which the outer percentiles stand for.</summary>
    public const double Low = 0.0013498980316300933;

    /// <summary>Fraction below plus three sigma.</summary>
    public const double High = 1 - Low;

    /// <summary>
    /// The value below which the fraction p of a population lies, estimated from readings sorted upwards: the reading of rank
    /// <c>p·(n + 1)</c>, interpolated (definition 6 of Hyndman and Fan 1996, Am. Stat. 50, 361); beyond the first or last rank that reading itself.
    /// </summary>
    public static double Of(ReadOnlySpan<double> sorted, double p)
    {
        double rank = p * (sorted.Length + 1);
        int below = (int)Math.Clamp(Math.Floor(rank), 1, sorted.Length), above = Math.Min(below + 1, sorted.Length);
        double share = Math.Clamp(rank - below, 0, 1);
        return sorted[below - 1] + share * (sorted[above - 1] - sorted[below - 1]);
    }

    /// <summary>
    /// <c>Pp = (U − L)/(X₉₉.₈₆₅ − X₀.₁₃₅)</c> and <c>Ppk = min((U − X₅₀)/(X₉₉.₈₆₅ − X₅₀), (X₅₀ − L)/(X₅₀ − X₀.₁₃₅))</c>; infinite where readings do not differ.
    /// </summary>
    public static (double Pp, double Ppk) Capability(double low, double median, double high, Interval limits)
    {
        double upper = (limits.Upper - median) / (high - median), lower = (median - limits.Lower) / (median - low);
        return (limits.Width / (high - low), Math.Min(upper, lower));
    }

    /// <summary>Readings below which the outer percentiles lie beyond the first and last reading: 740.</summary>
    public static readonly int SmallestSample = (int)Math.Ceiling(1 / Low) - 1;
}
