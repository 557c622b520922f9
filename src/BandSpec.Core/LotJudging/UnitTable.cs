namespace BandSpec.Core.LotJudging;

/// <summary>
/// The errors of every unit at every point, so that readings may come in any order. Four bytes an error, in %FS: a float keeps seven
/// digits, far below any limit; whether a reading passes is decided before, on the full number.
/// </summary>
internal sealed class UnitTable
{
    /// <summary>Room for units, bytes: what keeps a file of ten million readings under 300 MB for the whole program.</summary>
    public const long Room = 200_000_000;

    private const int UnitsPerBlock = 1024;
    private const int BytesPerSerial = 88;

    private readonly int points;
    private readonly int words;
    private readonly int mostUnits;
    private readonly Dictionary<string, int> indices = [];
    private readonly Dictionary<string, int>.AlternateLookup<ReadOnlySpan<char>> bySpan;
    private readonly List<string> serials = [];
    private readonly List<float[]> errors = [];
    private readonly List<ulong[]> failures = [];

    private int last = -1;

    public UnitTable(int points, long room = Room)
    {
        this.points = points;
        words = (points + 63) / 64;
        mostUnits = (int)Math.Min(int.MaxValue, room / (BytesPerSerial + 4L * points + 8L * words));
        bySpan = indices.GetAlternateLookup<ReadOnlySpan<char>>();
    }

    /// <summary>How many units were met.</summary>
    public int Count => serials.Count;

    /// <summary>The index of a unit, given when it is first met; −1 for a new one when there is no room left.</summary>
    public int IndexOf(ReadOnlySpan<char> serial)
    {
        if (last >= 0 && serial.SequenceEqual(serials[last]))
            return last;
        if (bySpan.TryGetValue(serial, out int index))
            return last = index;
        if (serials.Count >= mostUnits)
            return -1;
        string text = serial.ToString();
        indices.Add(text, last = serials.Count);
        serials.Add(text);
        if (last % UnitsPerBlock == 0)
        {
            errors.Add(GC.AllocateUninitializedArray<float>(UnitsPerBlock * points));
            Array.Fill(errors[^1], float.NaN);
            failures.Add(new ulong[UnitsPerBlock * words]);
        }

        return last;
    }

    /// <summary>The serial number of a unit.</summary>
    public string SerialOf(int unit) => serials[unit];

    /// <summary>The errors of a unit by point, %FS; NaN where it has no reading.</summary>
    public Span<float> ErrorsOf(int unit) => errors[unit / UnitsPerBlock].AsSpan(unit % UnitsPerBlock * points, points);

    /// <summary>Notes that a unit's reading at a point does not pass.</summary>
    public void MarkFailed(int unit, int point) => FailuresOf(unit)[point / 64] |= 1UL << (point % 64);

    /// <summary>Whether a unit's reading at a point was marked.</summary>
    public bool HasFailed(int unit, int point) => (FailuresOf(unit)[point / 64] >> (point % 64) & 1) != 0;

    private Span<ulong> FailuresOf(int unit) => failures[unit / UnitsPerBlock].AsSpan(unit % UnitsPerBlock * words, words);
}
