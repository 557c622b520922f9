using BandSpec.Core.Findings;
using BandSpec.Files.Csv;

namespace BandSpec.Files.LotReadings;

/// <summary>What a column of readings holds.</summary>
internal enum LotColumn
{
    Serial,
    Point,
    Temperature,
    Pressure,
    Direction,
    Reading,
    Lot,
    Date,
}

/// <summary>A column's place in the file and the unit its heading names in brackets; empty when it names none.</summary>
internal readonly record struct PlacedColumn(int Index, string Heading, string Unit);

/// <summary>Which column is which, found by heading in any order.</summary>
internal sealed class ReadingColumns
{
    private static readonly (LotColumn Column, string[] Headings)[] Accepted =
    [
        (LotColumn.Serial, ["serial", "serial-number", "serial-no", "sn", "unit", "unit-id"]),
        (LotColumn.Point, ["point", "point-id", "id", "test-point"]),
        (LotColumn.Temperature, ["temperature", "temp", "t", "chamber-temperature"]),
        (LotColumn.Pressure, ["pressure", "p", "applied-pressure"]),
        (LotColumn.Direction, ["direction", "dir"]),
        (LotColumn.Reading, ["reading", "output", "value", "measured"]),
        (LotColumn.Lot, ["lot", "batch", "lot-number"]),
        (LotColumn.Date, ["date", "day", "time", "timestamp", "date-time"]),
    ];

    private readonly Dictionary<LotColumn, PlacedColumn> columns = [];

    private ReadingColumns(IReadOnlyList<string> headings) => Headings = headings;

    /// <summary>The headings as they stand in the file.</summary>
    public IReadOnlyList<string> Headings { get; }

    /// <summary>Headings that mean nothing here; their columns are not read.</summary>
    public List<string> Unused { get; } = [];

    /// <summary>The column of a kind; <see langword="null"/> when the file has none.</summary>
    public PlacedColumn? this[LotColumn column] => columns.TryGetValue(column, out PlacedColumn placed) ? placed : null;

    /// <summary>Finds the columns; what is missing or doubled is found too.</summary>
    public static (ReadingColumns Columns, IReadOnlyList<Finding> Findings) Of(IReadOnlyList<string> headings)
    {
        var found = new ReadingColumns(headings);
        List<Finding> findings = [];
        for (int i = 0; i < headings.Count; i++)
        {
            ColumnHeading heading = ColumnHeading.Of(headings[i]);
            if (Accepted.FirstOrDefault(entry => entry.Headings.Contains(heading.Key)) is not { Headings: not null } known)
                found.Unused.Add(headings[i]);
            else if (!found.columns.TryAdd(known.Column, new(i, headings[i], heading.Unit)))
                findings.Add(new(FieldPath.InReadings(headings[i]), "double-column",
                    $"two columns for the {Word(known.Column)}: `{found.columns[known.Column].Heading}` and `{headings[i]}`", "one of them"));
        }

        findings.AddRange(found.MissingColumns());
        return (found, findings);
    }

    private IEnumerable<Finding> MissingColumns()
    {
        if (this[LotColumn.Serial] is null)
            yield return Missing(LotColumn.Serial);
        if (this[LotColumn.Reading] is null)
            yield return Missing(LotColumn.Reading);
        if (this[LotColumn.Point] is null && (this[LotColumn.Temperature] is null || this[LotColumn.Pressure] is null))
            yield return Missing(LotColumn.Point) with
            {
                Accepted = $"a column {Names(LotColumn.Point)}, or columns for temperature and pressure",
            };
    }

    private Finding Missing(LotColumn column) => new(
        FieldPath.InReadings(""), "missing-column", $"no column for the {Word(column)} among {string.Join(", ", Headings.Select(h => $"`{h}`"))}",
        $"a column {Names(column)}")
    {
        Nearest = Accepted[(int)column].Headings.FirstOrDefault(name => Unused.Exists(heading => Spelling.Nearest(ColumnHeading.Of(heading).Key, [name]) is not null)),
    };

    private static string Names(LotColumn column) => string.Join(", ", Accepted[(int)column].Headings.Select(name => $"`{name}`"));

    private static string Word(LotColumn column) => column == LotColumn.Serial ? "serial number" : column.ToString().ToLowerInvariant();
}
