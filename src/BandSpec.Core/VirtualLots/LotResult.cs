namespace BandSpec.Core.VirtualLots;

/// <summary>Lots that were made, from the first to the one before the end.</summary>
/// <param name="First">Number of the first lot.</param>
/// <param name="End">Number of the lot after the last.</param>
public readonly record struct LotRange(long First, long End);

/// <summary>
/// What was counted and summed over lots that were made: exact sums, so that results of parts put together equal the result of the whole,
/// bit for bit. Figures with their intervals are read from a <see cref="LotReport"/>.
/// </summary>
public sealed class LotResult
{
    internal LotResult(LotOrder order, ulong fingerprint, IReadOnlyList<LotRange> ranges, LotTally tally) =>
        (Order, Fingerprint, Ranges, Tally) = (order, fingerprint, ranges, tally);

    /// <summary>The order, of which this may be a part.</summary>
    public LotOrder Order { get; }

    /// <summary>Equal for results of the same subject, different (but for a chance of 2⁻⁶⁴) for others.</summary>
    public ulong Fingerprint { get; }

    /// <summary>Which lots were made: rising, without overlap, neighbours joined.</summary>
    public IReadOnlyList<LotRange> Ranges { get; }

    /// <summary>Lots made.</summary>
    public long LotsMade => Tally.Lots;

    /// <summary>Units made.</summary>
    public long UnitsMade => LotsMade * Order.LotSize;

    /// <summary>Whether all lots of the part, or of the whole order after gathering, were made.</summary>
    public bool IsComplete => Ranges.Count == 1 && Ranges[0] == new LotRange(Order.FirstLot, Order.EndLot);

    /// <summary>Every sum, for writing to a file and back: whole numbers, those of measured quantities in units of 2⁻⁶⁴.</summary>
    public IReadOnlyList<Int128> Figures => Tally.Figures;

    internal LotTally Tally { get; }

    /// <summary>A result as it was written to a file.</summary>
    /// <param name="subject">The subject that the result is said to be of.</param>
    /// <param name="order">The order.</param>
    /// <param name="ranges">Which lots were made.</param>
    /// <param name="figures">Every sum.</param>
    /// <exception cref="ArgumentException">The figures are not those of such a subject, or not of as many lots.</exception>
    public static LotResult From(LotSubject subject, LotOrder order, IReadOnlyList<LotRange> ranges, IReadOnlyList<Int128> figures)
    {
        ArgumentNullException.ThrowIfNull(subject);
        ArgumentNullException.ThrowIfNull(ranges);
        LotLaw law = new(subject);
        LotTally tally = new(law.TallyPlan, figures);
        if (tally.Lots != ranges.Sum(r => r.End - r.First))
            throw new ArgumentException($"the sums are of {tally.Lots} lots, the ranges of {ranges.Sum(r => r.End - r.First)}", nameof(figures));
        return new LotResult(order, law.Fingerprint, ranges, tally);
    }
}
