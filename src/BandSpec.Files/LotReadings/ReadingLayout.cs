using System.Globalization;
using BandSpec.Core.Findings;
using BandSpec.Core.LotJudging;
using BandSpec.Core.Quantities;

namespace BandSpec.Files.LotReadings;

/// <summary>How a file of readings is laid out, detected from its first lines and stated to the user.</summary>
public sealed class ReadingLayout
{
    private ReadingLayout(ReadingColumns columns, char separator, char decimalSign) =>
        (Columns, Separator, DecimalSign) = (columns, separator, decimalSign);

    /// <summary>What parts the cells: <c>;</c>, <c>,</c> or a tab; the zero character in a file of typed columns.</summary>
    public char Separator { get; }

    /// <summary>What parts whole from fraction: <c>.</c> or <c>,</c>.</summary>
    public char DecimalSign { get; }

    /// <summary>Headings of columns that were not read.</summary>
    public IReadOnlyList<string> UnusedColumns => Columns.Unused;

    /// <summary>In words: separator, decimal sign, and which heading was taken for what.</summary>
    public string Description
    {
        get
        {
            IEnumerable<string> taken = Enum.GetValues<LotColumn>().Where(IsRead).Select(c => $"{c.ToString().ToLowerInvariant()} from `{Columns[c]!.Value.Heading}`");
            string parted = Separator switch { '\t' => "tabs", ';' => "semicolons", _ => "commas" };
            string form = Separator == '\0' ? "columns of a database" : $"cells parted by {parted}, decimal {(DecimalSign == ',' ? "comma" : "point")}";
            return $"{form}; {string.Join(", ", taken)}";
        }
    }

    internal ReadingColumns Columns { get; }

    /// <summary>What a reading is multiplied with to be in the unit of the limits.</summary>
    internal double ReadingFactor { get; private set; } = 1;

    /// <summary>Unit of the pressure column.</summary>
    internal PressureUnit PressureUnit { get; private set; } = PressureUnit.Pascal;

    /// <summary>Where the lot stands: the lot's own column, else the date's; −1 without either.</summary>
    internal int LotIndex => Columns[LotColumn.Lot]?.Index ?? Columns[LotColumn.Date]?.Index ?? -1;

    /// <summary>Whether the lot is the day of a date, so that the time after it does not count.</summary>
    internal bool LotIsDay => Columns[LotColumn.Lot] is null;

    /// <summary>The heading that the lot is taken from; <see langword="null"/> without one.</summary>
    internal string? LotHeading => HeadingOf(LotColumn.Lot) ?? HeadingOf(LotColumn.Date);

    /// <summary>Whether points are found by their id, not by place.</summary>
    internal bool HasPoint => Columns[LotColumn.Point] is not null;

    /// <summary>How numbers are written.</summary>
    internal CultureInfo Culture
    {
        get
        {
            var culture = (CultureInfo)CultureInfo.InvariantCulture.Clone();
            culture.NumberFormat.NumberDecimalSeparator = DecimalSign.ToString();
            culture.NumberFormat.NumberGroupSeparator = "\u2019";
            return culture;
        }
    }

    /// <summary>
    /// Detects the layout from the beginning of a file. The separator is the one the heading holds most of; the decimal sign is a comma when
    /// cells are not parted by commas and the first readings hold one and no point.
    /// </summary>
    /// <param name="beginning">The first lines of the file, the last perhaps cut.</param>
    /// <param name="limits">What the readings will be held against.</param>
    /// <returns>The layout, or <see langword="null"/> and what was found.</returns>
    internal static (ReadingLayout? Layout, IReadOnlyList<Finding> Findings) Detect(string beginning, LotLimits limits)
    {
        string[] lines = [.. beginning.Split('\n').Select(line => line.TrimEnd('\r')).Where(line => line.Length > 0)];
        if (lines.Length == 0)
            return (null, [new(FieldPath.InReadings(""), "empty", "the file is empty", "a line of headings, then one line for each reading")]);
        char separator = new[] { ';', '\t', ',' }.MaxBy(sign => lines[0].Count(c => c == sign));
        (ReadingColumns columns, IReadOnlyList<Finding> findings) = ReadingColumns.Of(Cells(lines[0], separator));
        if (findings.Count > 0)
            return (null, findings);
        int reading = columns[LotColumn.Reading]!.Value.Index;
        string[] readings = [.. lines.Skip(1).Take(200).Select(line => Cells(line, separator)).Where(cells => cells.Length > reading).Select(cells => cells[reading])];
        bool comma = separator != ',' && readings.Any(r => r.Contains(',')) && !readings.Any(r => r.Contains('.'));
        return Fitted(new ReadingLayout(columns, separator, comma ? ',' : '.'), limits);
    }

    /// <summary>The layout of a file whose columns are typed, so that only headings count.</summary>
    internal static (ReadingLayout? Layout, IReadOnlyList<Finding> Findings) OfTable(IReadOnlyList<string> headings, LotLimits limits)
    {
        (ReadingColumns columns, IReadOnlyList<Finding> findings) = ReadingColumns.Of(headings);
        return findings.Count > 0 ? (null, findings) : Fitted(new ReadingLayout(columns, '\0', '.'), limits);
    }

    /// <summary>The heading of a column; <see langword="null"/> when there is none.</summary>
    internal string? HeadingOf(LotColumn column) => Columns[column]?.Heading;

    private static (ReadingLayout? Layout, IReadOnlyList<Finding> Findings) Fitted(ReadingLayout layout, LotLimits limits)
    {
        Finding[] units = [.. layout.TakeUnits(limits)];
        return units.Length > 0 ? (null, units) : (layout, []);
    }

    private IEnumerable<Finding> TakeUnits(LotLimits limits)
    {
        PlacedColumn reading = Columns[LotColumn.Reading]!.Value;
        if (reading.Unit.Length == 0)
            ReadingFactor = 1;
        else if (OutputUnits.Factor(reading.Unit, limits.OutputUnit) is { } factor)
            ReadingFactor = factor;
        else
            yield return new(FieldPath.InReadings(reading.Heading), "unit", $"readings in `{reading.Unit}`", $"`{limits.OutputUnit}`, as in the limits");

        PressureUnit = limits.Points[0].Pressure.Unit;
        if (Columns[LotColumn.Pressure] is { Unit.Length: > 0 } pressure)
        {
            if (PressureUnit.All.FirstOrDefault(unit => unit.Symbol == pressure.Unit) is { } known)
                PressureUnit = known;
            else
                yield return new(FieldPath.InReadings(pressure.Heading), "unit", $"pressures in `{pressure.Unit}`", string.Join(", ", PressureUnit.All));
        }
    }

    private bool IsRead(LotColumn column) => column switch
    {
        LotColumn.Date => Columns[column] is not null && Columns[LotColumn.Lot] is null,
        LotColumn.Temperature or LotColumn.Pressure or LotColumn.Direction =>
            Columns[column] is not null && Columns[LotColumn.Point] is null,
        _ => Columns[column] is not null,
    };

    /// <summary>Cells of a line of the beginning; quotes around a cell are dropped.</summary>
    private static string[] Cells(string line, char separator) => [.. line.TrimStart('\uFEFF').Split(separator).Select(cell => cell.Trim().Trim('"'))];
}
