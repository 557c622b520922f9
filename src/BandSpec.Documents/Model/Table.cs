namespace BandSpec.Documents.Model;

internal enum Align
{
    Left,
    Centre,
    Right,

    /// <summary>Figures stand with their decimal points above one another.</summary>
    Decimal,
}

/// <summary>A column: its heading, its unit set lighter below it, and the group heading it shares with its neighbours (or none).</summary>
internal sealed record Column(Phrase Title, Align Align = Align.Left, string Unit = "", string Group = "");

internal enum RowKind
{
    Body,

    /// <summary>A heading within the table, spanning all columns: only the first cell counts.</summary>
    Section,

    /// <summary>A sum or a result, set off by a rule and stronger letters.</summary>
    Total,
}

internal sealed record Row(IReadOnlyList<Phrase> Cells, RowKind Kind = RowKind.Body);

/// <summary>A table with its label ("Table 3") and caption above and an optional remark below. The first column heads its row.</summary>
internal sealed record Table : Block
{
    public Table(string label, Phrase caption, IReadOnlyList<Column> columns, IReadOnlyList<Row> rows, Phrase? remark = null)
    {
        if (rows.FirstOrDefault(r => r.Kind != RowKind.Section && r.Cells.Count != columns.Count) is { } odd)
            throw new ArgumentException(
                $"A row of {odd.Cells.Count} cells in a table of {columns.Count} columns: {odd.Cells[0]}", nameof(rows));
        (Label, Caption, Columns, Rows, Remark) = (label, caption, columns, rows, remark ?? Phrase.Empty);
    }

    public string Label { get; }

    public Phrase Caption { get; }

    public IReadOnlyList<Column> Columns { get; }

    public IReadOnlyList<Row> Rows { get; }

    public Phrase Remark { get; }

    public bool HasGroups => Columns.Any(c => c.Group.Length > 0);
}
