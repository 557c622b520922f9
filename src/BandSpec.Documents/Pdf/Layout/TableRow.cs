using BandSpec.Documents.Model;

namespace BandSpec.Documents.Pdf.Layout;

/// <summary>A row of a table; one too high for a page can be cut between its lines, the rest becoming a row of its own.</summary>
internal sealed class TableRow
{
    private readonly Table _table;
    private readonly int _index;
    private readonly ColumnWidths _columns;
    private readonly double _width;
    private readonly Tag _body;
    private readonly IReadOnlyList<IReadOnlyList<Line>> _cells;

    private TableRow(Table table, int index, ColumnWidths columns, double width, Tag body)
    {
        (_table, _index, _columns, _width, _body) = (table, index, columns, width, body);
        // A figure is not broken: its column is as wide as it needs.
        double Room(int i) => table.Columns[i].Align == Align.Decimal ? double.MaxValue : columns.Widths[i];
        _cells = [.. Row.Cells.Select((cell, i) => LineBreaker.Break(cell, Style, Room(i)))];
    }

    private Row Row => _table.Rows[_index];

    private TextStyle Style =>
        Row.Kind == RowKind.Total ? Look.HeadCell with { Size = Look.Cell.Size, Leading = Look.Cell.Leading } : Look.Cell;

    public static Slab Lay(Table table, int index, ColumnWidths columns, double width, Tag body)
    {
        if (table.Rows[index].Kind == RowKind.Section) return Section(table.Rows[index], table.Columns.Count, width, body, index == 0);
        var row = new TableRow(table, index, columns, width, body);
        return row.From(0, row._cells.Max(c => c.Count));
    }

    private static Slab Section(Row row, int columns, double width, Tag body, bool first)
    {
        var tag = new Tag(TagKind.TH, body.Child(TagKind.TR)) { Scope = HeaderScope.Row, Columns = columns };
        var line = LineBreaker.Break(row.Cells[0], Look.HeadCell, width)[0];
        var top = first ? 2 : 5;
        var baseline = top + TextLayout.Baseline(Look.HeadCell);
        return new Slab(top + Look.HeadCell.Leading + 2, [.. line.At(0, baseline, Look.Accent, tag)]);
    }

    // The lines from the first up to the last of every cell.
    private Slab From(int first, int last)
    {
        var tag = _body.Child(TagKind.TR);
        var marks = new List<Mark>();
        for (int i = 0; i < _cells.Count; i++)
        {
            var cell = i == 0 ? new Tag(TagKind.TH, tag) { Scope = HeaderScope.Row } : tag.Child(TagKind.TD);
            if (_cells[i].Skip(first).Take(last - first).All(l => l.Spans.Count == 0)) marks.Add(new EmptyMark(cell));
            foreach (var (line, k) in _cells[i].Select((l, k) => (l, k)).Skip(first).Take(last - first))
            {
                var baseline = Look.CellPad + (k - first) * Style.Leading + TextLayout.Baseline(Style);
                marks.AddRange(line.At(_columns.Lefts[i] + Offset(i, line), baseline, Style.Ink, cell));
            }
        }
        var height = 2 * Look.CellPad + (last - first) * Style.Leading;
        if (_index > 0 && _table.Rows[_index - 1].Kind != RowKind.Section && first == 0) marks.Add(Above());
        return new Slab(height, marks) { Split = room => Cut(first, last, room) };
    }

    private RuleMark Above() => Row.Kind == RowKind.Total
        ? new RuleMark(0, 0, _width, 0, 0.5, Look.Rule)
        : new RuleMark(0, 0, _width, 0, 0.35, Look.Hairline);

    private (Slab, Slab)? Cut(int first, int last, double room)
    {
        var fitting = first + (int)((room - 2 * Look.CellPad) / Style.Leading);
        return fitting <= first || fitting >= last ? null : (From(first, fitting), From(fitting, last));
    }

    private double Offset(int i, Line line) => _table.Columns[i].Align switch
    {
        Align.Left => 0,
        Align.Centre => (_columns.Widths[i] - line.Width) / 2,
        Align.Right => _columns.Widths[i] - line.Width,
        _ => _columns.Widths[i] - _columns.Fractions[i] + ColumnWidths.FractionWidth(Row.Cells[i]) - line.Width,
    };
}
