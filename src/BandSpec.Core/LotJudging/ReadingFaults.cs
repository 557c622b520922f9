namespace BandSpec.Core.LotJudging;

/// <summary>What can be wrong with one line of readings. Such a line is counted and named, and takes no part in the figures.</summary>
public enum ReadingFault
{
    /// <summary>The line has fewer cells than the columns need.</summary>
    MissingCell,

    /// <summary>No serial number.</summary>
    NoSerial,

    /// <summary>No point has this id, or this temperature, pressure and direction.</summary>
    UnknownPoint,

    /// <summary>Several points fit, because the direction is not said.</summary>
    AmbiguousPoint,

    /// <summary>Text where a number belongs.</summary>
    NotANumber,

    /// <summary>The reading is in another unit, or looks a thousandfold off as if it were.</summary>
    OtherUnit,

    /// <summary>The reading is farther from its nominal output than ten thousand spans: no instrument shows it, and no sum of squares should hold it.</summary>
    BeyondMeasure,

    /// <summary>This unit has a reading of this point already; the first one stands.</summary>
    Duplicate,

    /// <summary>Counted at its point, but its unit is beyond the number that can be followed in memory.</summary>
    UnitNotFollowed,
}

/// <summary>Where one fault was met.</summary>
/// <param name="File">Name of the file.</param>
/// <param name="Line">Line in it, from 1.</param>
/// <param name="Text">What stood there.</param>
public sealed record FaultPlace(string File, long Line, string Text);

/// <summary>Faults by kind: how many, and the first places of each.</summary>
public sealed class ReadingFaults
{
    /// <summary>How many places of each kind are named; the others are counted.</summary>
    public const int PlacesNamed = 20;

    private readonly SortedDictionary<ReadingFault, (long Count, List<FaultPlace> Places)> byKind = [];

    /// <summary>How many faults of all kinds.</summary>
    public long Total => byKind.Values.Sum(entry => entry.Count);

    /// <summary>Every kind that was met, in the order of <see cref="ReadingFault"/>.</summary>
    public IEnumerable<(ReadingFault Kind, long Count, IReadOnlyList<FaultPlace> Places)> All =>
        byKind.Select(entry => (entry.Key, entry.Value.Count, (IReadOnlyList<FaultPlace>)entry.Value.Places));

    /// <summary>How many of one kind.</summary>
    public long Count(ReadingFault kind) => byKind.TryGetValue(kind, out (long Count, List<FaultPlace>) entry) ? entry.Count : 0;

    /// <summary>Notes one fault; its text is copied only while places are still named.</summary>
    public void Add(ReadingFault kind, string file, long line, ReadOnlySpan<char> text)
    {
        (long count, List<FaultPlace> places) = byKind.TryGetValue(kind, out (long, List<FaultPlace>) entry) ? entry : (0, []);
        if (count < PlacesNamed)
            places.Add(new(file, line, text.ToString()));
        byKind[kind] = (count + 1, places);
    }
}
