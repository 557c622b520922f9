using BandSpec.Core.Numerics;

namespace BandSpec.Core.LotJudging;

/// <summary>
/// Everything that is kept of one characteristic, a point or a derived figure, while its values pass by once: moments over all and by lot,
/// how many lie outside, the extremes, a bounded sample for sorting and a condensed run chart. Values are errors in %FS.
/// </summary>
internal sealed class Tally(Interval tolerance)
{
    private readonly List<Moments?> byLot = [];

    /// <summary>What the values are held against.</summary>
    public Interval Tolerance => tolerance;

    /// <summary>Moments of all values.</summary>
    public Moments All { get; } = new(0);

    /// <summary>Moments of the values of each lot that has any.</summary>
    public IEnumerable<Moments> Lots => byLot.OfType<Moments>();

    /// <summary>How many values lie outside the tolerance.</summary>
    public long Outside { get; private set; }

    /// <summary>The outermost values.</summary>
    public Extremes Extremes { get; } = new();

    /// <summary>Values for sorting.</summary>
    public KeptValues Kept { get; } = new();

    /// <summary>Values in their order.</summary>
    public RunChart Run { get; } = new();

    /// <summary>Takes one value of a unit of a lot.</summary>
    public void Add(double value, int lot, int unit)
    {
        while (byLot.Count <= lot)
            byLot.Add(null);
        (byLot[lot] ??= new Moments(0)).Add(value);
        All.Add(value);
        if (!tolerance.Contains(value))
            Outside++;
        Extremes.Add(value, unit);
        Kept.Add(value, lot);
        Run.Add(value);
    }

    /// <summary>The mean of a lot, for taking the lots' differences out.</summary>
    public double MeanOf(int lot) => byLot[lot]!.Mean;
}
