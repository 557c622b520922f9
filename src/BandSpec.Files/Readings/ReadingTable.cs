using System.Security.Cryptography;
using BandSpec.Core.Findings;
using BandSpec.Files.Csv;
using BandSpec.Files.Forms;
using BandSpec.Files.Inputs;
using BandSpec.Files.Yaml;
using nietras.SeparatedValues;

namespace BandSpec.Files.Readings;

/// <summary>
/// A file of readings: comma, semicolon or tab between cells, a header, lines beginning with <c>#</c> before it. Which column is which the
/// header says; what is wrong is found cell by cell, with its place.
/// </summary>
internal sealed class ReadingTable
{
    /// <summary>The largest file of readings, in bytes: some four million readings.</summary>
    internal const int LargestFile = 1 << 28;

    private readonly string name;
    private readonly SourceText text;
    private readonly FoundFaults faults = new(InputFile.Readings);
    private readonly ReadingsFormat format;
    private readonly List<ColumnHeading> header = [];
    private readonly HashSet<ReadingField> condemned = [];
    private ReadingRow heading = new(1, []);

    private ReadingTable(InputContent content, ReadingsFormat format)
    {
        (name, this.format) = (content.Name, format);
        Reading = new Reading(faults, format.Range?.SpanInPascals);
        if (content.Refusal is { } why)
            faults.Add(Extent.Start, "", "file", why, "a file that can be read");
        else
            Source = new InputSource(InputFile.Readings, name, content.Bytes, Convert.ToHexStringLower(SHA256.HashData(content.Bytes.Span)));
        text = SourceText.Decode(content.Bytes.Span, faults, LargestFile);
    }

    /// <summary>The file for the record of inputs; null when it could not be had.</summary>
    internal InputSource? Source { get; }

    /// <summary>Where findings about cells go.</summary>
    internal Reading Reading { get; }

    /// <summary>Reads a file row by row.</summary>
    /// <param name="content">The file.</param>
    /// <param name="format">How it is to be understood.</param>
    /// <param name="needed">Columns of which one each has to be there.</param>
    /// <param name="make">Makes a reading of a row; null when a cell was at fault.</param>
    internal static ReadingsSet<T> Read<T>(
        InputContent content, ReadingsFormat format, IReadOnlyList<ReadingField[]> needed, Func<ReadingTable, ReadingRow, T?> make)
        where T : class
    {
        ReadingTable table = new(content, format);
        List<T> readings = [];
        if (table.faults.Count == 0)
            table.ReadRows(needed, row =>
            {
                if (make(table, row) is { } reading)
                    readings.Add(reading);
            });
        IReadOnlyList<PlacedFinding> findings = [.. table.PlacedFindings()];
        return new ReadingsSet<T>(findings.Count == 0 ? readings : [], table.Source, findings);
    }

    /// <summary>Whether a column is there.</summary>
    internal bool Has(ReadingField field) => IndexOf(field) >= 0;

    /// <summary>The unit that the header gives for a column, or the column's usual one; empty for none.</summary>
    internal string UnitOf(ReadingField field) => header[IndexOf(field)].Unit is { Length: > 0 } unit ? unit : field.DefaultUnit;

    /// <summary>The place of a column; −1 when it is not there.</summary>
    internal int IndexOf(ReadingField field) =>
        header.FindIndex(cell => field.Matches(cell, format.ColumnNames.GetValueOrDefault(field.Name)));

    /// <summary>Adds a finding about a cell.</summary>
    internal void Complain(ReadingRow row, ReadingField field, string rule, string found, string accepted) =>
        faults.Add(row.ExtentOf(IndexOf(field)), field.Name, rule, found, accepted);

    /// <summary>Adds a finding about a whole column, once, at its name in the header.</summary>
    internal void ComplainOfColumn(ReadingField field, string rule, string found, string accepted)
    {
        if (condemned.Add(field))
            Complain(heading, field, rule, found, accepted);
    }

    private void ReadRows(IReadOnlyList<ReadingField[]> needed, Action<ReadingRow> take)
    {
        int skipped = text.Lines.TakeWhile(line => line.StartsWith('#') || line.Length == 0).Count();
        if (skipped == text.Lines.Count)
        {
            faults.Add(Extent.Start, "", "no-header", "nothing is written here", "a header and readings");
            return;
        }

        using SepReader rows = Sep.Reader(options => options with { HasHeader = false, DisableColCountCheck = true })
            .FromText(string.Join('\n', text.Lines.Skip(skipped)));
        bool hasAll = false;
        foreach (SepReader.Row row in rows)
        {
            string[] cells = new string[row.ColCount];
            for (int i = 0; i < cells.Length; i++)
                cells[i] = row[i].ToString();
            if (header.Count > 0 && cells.Any(cell => cell.Trim().Length > 0))
                TakeRow(new ReadingRow(row.LineNumberFrom + skipped, cells), take);
            else if (header.Count == 0)
            {
                heading = new ReadingRow(skipped + 1, cells);
                header.AddRange(cells.Select(ColumnHeading.Of));
            }

            if (!hasAll && !(hasAll = HasAll(needed, skipped + 1)))
                return;
        }
    }

    private void TakeRow(ReadingRow row, Action<ReadingRow> take)
    {
        if (row.Count == header.Count)
            take(row);
        else
            faults.Add(
                new Extent(row.Line, 1, 1), "", "cell-count", $"{row.Count} cells where the header has {header.Count}", $"{header.Count} cells");
    }

    private bool HasAll(IReadOnlyList<ReadingField[]> needed, int line)
    {
        foreach (ReadingField[] alternatives in needed.Where(fields => !fields.Any(Has)))
            faults.Add(
                new Extent(line, 1, Math.Max(1, text.Line(line).Length)), alternatives[0].Name, "missing-column",
                $"no column {string.Join(" or ", alternatives.Select(field => field.Names))}",
                "a column of that name, its unit in brackets, or the name that it has here");
        return faults.Count == 0;
    }

    private IEnumerable<PlacedFinding> PlacedFindings() =>
        from located in faults.All
        let at = located.Extent
        select new PlacedFinding(located.Finding, new Place(name, at.Line, at.Column, at.Length, text.Line(at.Line)));
}
