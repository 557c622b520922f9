using BandSpec.Documents.Model;

namespace BandSpec.Documents.Pdf.Layout;

/// <summary>A table as slabs: caption, heading that repeats on each page, one slab a row, and a closing rule.</summary>
internal sealed class TableLayout
{
    private const double CaptionGap = 2;

    private readonly Table _table;
    private readonly double _textWidth;
    private readonly double _width;
    private readonly ColumnWidths _columns;
    private readonly Tag _tag = new(TagKind.Table);
    private readonly Tag _body;

    private TableLayout(Table table, double width)
    {
        (_table, _textWidth, _columns) = (table, width, new ColumnWidths(table, width));
        _width = _columns.Total;
        _body = _tag.Child(TagKind.TBody);
    }

    public static IEnumerable<Slab> Lay(Table table, double width, string continued) => new TableLayout(table, width).Slabs(continued);

    private List<Slab> Slabs(string continued)
    {
        var captionTag = _tag.Child(TagKind.Caption).Child(TagKind.P);
        List<Slab> slabs = [
            .. Caption(Labelled(_table.Label, _table.Caption), captionTag, _textWidth), Slab.Gap(CaptionGap) with { KeepWithNext = true }];
        slabs[0] = slabs[0] with { Before = Look.BlockGap };
        var heading = new TableHeading(_table, _columns, _width);
        slabs.Add(heading.Lay(_tag.Child(TagKind.THead)) with { KeepWithNext = true });
        var again = Again(heading, continued);
        var count = _table.Rows.Count;
        for (int i = 0; i < count; i++)
        {
            var row = TableRow.Lay(_table, i, _columns, _width, _body) with { Repeat = again };
            // The first two and the last two rows stay together, and a heading within the table stays with what it heads.
            slabs.Add(row with { KeepWithNext = i == 0 || i >= count - 2 || _table.Rows[i].Kind == RowKind.Section });
        }
        slabs.Add(new Slab(0.5, [new RuleMark(0, 0, _width, 0, 0.9, Look.Ink)]) { KeepWithNext = !_table.Remark.IsEmpty });
        slabs.AddRange(Remark());
        slabs.Add(Slab.Gap(Look.BlockGap - Look.ParagraphGap));
        return slabs;
    }

    private static IEnumerable<Slab> Caption(Phrase text, Tag? tag, double width) =>
        TextLayout.Lines(LineBreaker.Break(text, Look.Caption, width), Look.Caption, 0, tag).Select(s => s with { KeepWithNext = true });

    public static Phrase Labelled(string label, Phrase caption) =>
        label.Length == 0 ? caption : ((Phrase)(label + "\u00a0\u00a0")).In(Lettering.Bold) + caption;

    // What stands again over the rows on the next page is decoration to a reading program: it has read it already.
    private Slab Again(TableHeading heading, string continued)
    {
        var caption = Caption(((Phrase)_table.Label).In(Lettering.Bold) + $" {continued}", null, _textWidth).ToList();
        var head = heading.Lay(null);
        var height = caption.Sum(s => s.Height) + CaptionGap;
        return new Slab(height + head.Height, [.. caption.SelectMany(s => s.Marks), .. head.Marks.Select(m => m.Moved(0, height))]);
    }

    private IEnumerable<Slab> Remark()
    {
        if (_table.Remark.IsEmpty) return [];
        return [
            Slab.Gap(3) with { KeepWithNext = true },
            .. TextLayout.Lines(LineBreaker.Break(_table.Remark, Look.Fine, _textWidth), Look.Fine, 0, new Tag(TagKind.P))];
    }
}
