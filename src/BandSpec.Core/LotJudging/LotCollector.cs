using BandSpec.Core.Numerics;

namespace BandSpec.Core.LotJudging;

/// <summary>One reading of one unit, its point found. A view of text that belongs to the reader: it is copied where it has to last.</summary>
public readonly ref struct LotReading
{
    /// <summary>Serial number of the unit, not empty.</summary>
    public required ReadOnlySpan<char> Serial { get; init; }

    /// <summary>The lot it belongs to; empty when the readings name none.</summary>
    public ReadOnlySpan<char> Lot { get; init; }

    /// <summary>Index of the point in <see cref="LotLimits.Points"/>.</summary>
    public required int Point { get; init; }

    /// <summary>The reading in <see cref="LotLimits.OutputUnit"/>, finite.</summary>
    public required double Value { get; init; }

    /// <summary>Line in the file, from 1.</summary>
    public long Line { get; init; }
}

/// <summary>
/// Takes the readings of a lot one after the other, in any order and any number, and keeps what judging needs. Memory: 4 bytes a reading and
/// about 90 a unit up to 200 MB in all, and a fixed amount per point and lot. Not for several threads at once.
/// </summary>
public sealed class LotCollector
{
    /// <summary>Lots told apart at most; readings of later ones count as one more lot.</summary>
    public const int MostLots = 4000;

    private readonly TallyBench bench;
    private readonly Dictionary<string, int> lots = [];
    private readonly Dictionary<string, int>.AlternateLookup<ReadOnlySpan<char>> lotBySpan;
    private readonly List<int> lotOfUnit = [];

    private (string Name, int Index) lastLot = ("", -1);

    /// <summary>A collector for readings that are held against these limits.</summary>
    public LotCollector(LotLimits limits)
    {
        ArgumentNullException.ThrowIfNull(limits);
        Limits = limits;
        Units = new UnitTable(limits.Points.Count);
        bench = new([.. limits.Points.Select(point => new Tally(Interval.Symmetric(point.Tolerance.Percent)))]);
        lotBySpan = lots.GetAlternateLookup<ReadOnlySpan<char>>();
    }

    /// <summary>What the readings are held against.</summary>
    public LotLimits Limits { get; }

    /// <summary>What was wrong with lines that take no part.</summary>
    public ReadingFaults Faults { get; } = new();

    /// <summary>Readings that were taken.</summary>
    public long Readings { get; private set; }

    /// <summary>The lots by name, in the order they were met; none when no reading named one.</summary>
    public IReadOnlyCollection<string> LotNames => [.. lots.Keys.Where(name => name.Length > 0)];

    internal UnitTable Units { get; }

    /// <summary>What was tallied at each point, of all readings taken so far.</summary>
    internal IReadOnlyList<Tally> Tallies => bench.Finish();

    /// <summary>
    /// Takes one reading. A second one of the same unit and point is a <see cref="ReadingFault.Duplicate"/>; one of a unit beyond the memory bound
    /// counts at its point and is noted.
    /// </summary>
    /// <param name="reading">The reading.</param>
    /// <param name="file">The file it is from, for faults.</param>
    public void Add(in LotReading reading, string file)
    {
        int unit = Units.IndexOf(reading.Serial), lot = LotIndex(reading.Lot);
        double error = Limits.ErrorOf(reading.Point, reading.Value);
        if (unit < 0)
        {
            Faults.Add(ReadingFault.UnitNotFollowed, file, reading.Line, reading.Serial);
        }
        else
        {
            ref float cell = ref Units.ErrorsOf(unit)[reading.Point];
            if (!float.IsNaN(cell))
            {
                Faults.Add(ReadingFault.Duplicate, file, reading.Line, $"{reading.Serial}, {Limits.Points[reading.Point].Id}");
                return;
            }

            cell = (float)error;
            if (unit == lotOfUnit.Count)
                lotOfUnit.Add(lot);
            if (!Limits.Points[reading.Point].Accepts(reading.Value))
                Units.MarkFailed(unit, reading.Point);
        }

        Readings++;
        bench.Add(new(reading.Point, unit, lot, error));
    }

    /// <summary>The lot in which a unit was first met.</summary>
    internal int LotOf(int unit) => lotOfUnit[unit];

    private int LotIndex(ReadOnlySpan<char> lot)
    {
        // Readings of a lot mostly come together, and comparing is cheaper than looking up.
        if (lastLot.Index >= 0 && lot.SequenceEqual(lastLot.Name))
            return lastLot.Index;
        if (lotBySpan.TryGetValue(lot, out string? name, out int index))
            return (lastLot = (name, index)).Index;
        if (lots.Count >= MostLots)
            return MostLots;
        lots.Add(lot.ToString(), lots.Count);
        return lots.Count - 1;
    }
}
