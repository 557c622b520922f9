using System.Globalization;
using System.Text;
using BandSpec.Core.Findings;
using BandSpec.Core.LotJudging;
using BandSpec.Files.Inputs;
using BandSpec.Files.Yaml;
using nietras.SeparatedValues;

namespace BandSpec.Files.LotReadings;

/// <summary>What came of reading one file of readings.</summary>
/// <param name="File">Its name.</param>
/// <param name="Layout">How it was laid out; <see langword="null"/> when that could not be told.</param>
/// <param name="Lines">Lines of readings in it.</param>
/// <param name="Converted">Readings that named another unit and were converted.</param>
/// <param name="Findings">Why it could not be read; empty when it was.</param>
public sealed record ReadingReport(string File, ReadingLayout? Layout, long Lines, long Converted, IReadOnlyList<PlacedFinding> Findings);

/// <summary>
/// Reads text tables of readings, one reading a line, of any length: the file streams through once and only the collector keeps anything.
/// </summary>
public static class CsvReadings
{
    /// <summary>Bytes looked at to detect the layout.</summary>
    private const int Beginning = 65_536;

    /// <summary>Reads a file into the collector.</summary>
    /// <param name="stream">The file, which must be able to go back to its beginning; UTF-8, with or without a byte order mark.</param>
    /// <param name="name">Its name, for faults.</param>
    /// <param name="collector">Where the readings go.</param>
    public static ReadingReport Read(Stream stream, string name, LotCollector collector)
    {
        ArgumentNullException.ThrowIfNull(stream);
        ArgumentNullException.ThrowIfNull(collector);
        string beginning = BeginningOf(stream);
        (ReadingLayout? layout, IReadOnlyList<Finding> findings) = ReadingLayout.Detect(beginning, collector.Limits);
        if (layout is null)
            return new(name, null, 0, 0, [.. findings.Select(finding => new PlacedFinding(finding, PlaceOf(finding, name, beginning)))]);
        var taker = new ReadingTaker(collector, layout, name);
        using SepReader reader = Sep.New(layout.Separator).Reader(options => options with
        {
            HasHeader = false,
            DisableColCountCheck = true,
            Unescape = true,
            Trim = SepTrim.All,
            CultureInfo = layout.Culture,
        }).From(stream);
        return new(name, layout, Lines(reader, new CsvLine(layout, taker)), taker.Converted, []);
    }

    /// <summary>The heading that a finding is about, else the whole line of headings.</summary>
    private static Place PlaceOf(Finding finding, string name, string beginning)
    {
        string line = beginning.Split('\n')[0].Trim('\r', '\uFEFF');
        int at = Math.Max(0, line.IndexOf(finding.Field.Path, StringComparison.Ordinal));
        return new(name, 1, at + 1, finding.Field.Path.Length > 0 ? finding.Field.Path.Length : line.Length, line);
    }

    private static string BeginningOf(Stream stream)
    {
        byte[] bytes = new byte[Beginning];
        int read = stream.ReadAtLeast(bytes, Beginning, throwOnEndOfStream: false);
        stream.Position = 0;
        return Encoding.UTF8.GetString(bytes, 0, read);
    }

    private static long Lines(SepReader reader, CsvLine line)
    {
        long lines = 0;
        bool heading = true;
        foreach (SepReader.Row row in reader)
        {
            if (row.ColCount == 1 && row[0].Span.IsEmpty)
                continue;
            if (!heading)
            {
                lines++;
                line.Take(row);
            }

            heading = false;
        }

        return lines;
    }
}

/// <summary>Picks the cells of one line by the layout.</summary>
internal sealed class CsvLine(ReadingLayout layout, ReadingTaker taker)
{
    private readonly int serial = Index(layout, LotColumn.Serial);
    private readonly int reading = Index(layout, LotColumn.Reading);
    private readonly int point = Index(layout, LotColumn.Point);
    private readonly int temperature = Index(layout, LotColumn.Temperature);
    private readonly int pressure = Index(layout, LotColumn.Pressure);
    private readonly int direction = Index(layout, LotColumn.Direction);
    private readonly int lot = layout.LotIndex;
    private readonly int needed = 1 + new[] { LotColumn.Serial, LotColumn.Reading, LotColumn.Point }.Max(column => Index(layout, column));

    public void Take(SepReader.Row row)
    {
        if (row.ColCount < needed || (point < 0 && row.ColCount <= Math.Max(temperature, pressure)))
        {
            taker.Note(ReadingFault.MissingCell, row.LineNumberFrom, row.Span);
            return;
        }

        double number = row[reading].TryParse(out double value) ? value : double.NaN;
        int found = point >= 0
            ? taker.PointById(row[point].Span)
            : taker.PointAt(row[temperature].Span, row[pressure].Span, Cell(row, direction));
        taker.Take(row.LineNumberFrom, row[serial].Span, LotOf(row), found, found >= 0 ? default : PointText(row), number, row[reading].Span);
    }

    private ReadOnlySpan<char> LotOf(SepReader.Row row)
    {
        ReadOnlySpan<char> text = Cell(row, lot);
        return layout.LotIsDay && text.IndexOfAny('T', ' ') is > 0 and var end ? text[..end] : text;
    }

    private string PointText(SepReader.Row row) => point >= 0
        ? row[point].ToString()
        : string.Create(CultureInfo.InvariantCulture, $"{row[temperature]}, {row[pressure]}, {Cell(row, direction)}");

    private static ReadOnlySpan<char> Cell(SepReader.Row row, int index) => index >= 0 && index < row.ColCount ? row[index].Span : default;

    private static int Index(ReadingLayout layout, LotColumn column) => layout.Columns[column]?.Index ?? -1;
}
