using BandSpec.Documents.Model;

namespace BandSpec.Documents.Pdf.Layout;

/// <summary>
/// The title block and the blocks of names with their values. To a reading program a block of facts is a table of two columns.
/// </summary>
internal static class FactsLayout
{
    private const double Gutter = 22;

    public static IEnumerable<Slab> Lay(TitleBlock title, double width)
    {
        var kind = new Tag(TagKind.P);
        List<Slab> slabs =
        [
            .. TextLayout.Lines(LineBreaker.Break(title.Kind, Look.Kind, width), Look.Kind, 0, kind),
            Slab.Gap(3),
            .. TextLayout.Lines(LineBreaker.Break(title.Title, Look.Title, width), Look.Title, 0, new Tag(TagKind.H1)),
            .. TextLayout.Lines(LineBreaker.Break(title.Subtitle, Look.Subtitle, width), Look.Subtitle, 0, new Tag(TagKind.P)),
            Slab.Gap(4),
            .. title.Identity.Count == 0 ? [] : Lay(new Facts(title.Identity, 2), width),
        ];
        return slabs.Select(s => s with { KeepWithNext = true });
    }

    public static IEnumerable<Slab> Lay(Facts facts, double width)
    {
        var tag = new Tag(TagKind.Table);
        var column = (width - (facts.Columns - 1) * Gutter) / facts.Columns;
        var widest = facts.Items.Max(f => LineBreaker.NaturalWidth(f.Name, Look.FactName));
        var name = Math.Min(widest, 0.5 * column) + 10;
        // Facts run down the first column, then down the next: related ones stay below one another.
        var rows = (facts.Items.Count + facts.Columns - 1) / facts.Columns;
        var cells = facts.Items.Select(f => Lay(f, tag, name, column)).ToList();
        for (int row = 0; row < rows; row++)
        {
            var across = Enumerable.Range(0, facts.Columns).Select(c => c * rows + row).Where(i => i < cells.Count).ToList();
            var marks = across.SelectMany((i, c) => cells[i].Marks.Select(m => m.Moved(c * (column + Gutter), 0)));
            var lines = across.Select((_, c) => Line(c * (column + Gutter), column));
            var height = across.Max(i => cells[i].Height);
            if (row == rows - 1) lines = lines.Concat(lines.Select(l => l.Moved(0, height)));
            yield return new Slab(height, [.. lines, .. marks])
            {
                Before = row == 0 ? Look.ParagraphGap + 2 : 0, KeepWithNext = row == 0 && rows > 1
            };
        }
    }

    private static Mark Line(double left, double width) => new RuleMark(left, 0, left + width, 0, 0.35, Look.Hairline);

    private static Slab Lay(Fact fact, Tag table, double name, double column)
    {
        var row = table.Child(TagKind.TR);
        var head = new Tag(TagKind.TH, row) { Scope = HeaderScope.Row };
        var left = BoxLayout.Stack(TextLayout.Lines(LineBreaker.Break(fact.Name, Look.FactName, name - 8), Look.FactName, 0, head));
        var value = LineBreaker.Break(fact.Value, Look.FactValue, column - name);
        var right = BoxLayout.Stack(TextLayout.Lines(value, Look.FactValue, name, row.Child(TagKind.TD)));
        return new Slab(Math.Max(left.Height, right.Height) + 4, [.. left.Marks.Concat(right.Marks).Select(m => m.Moved(0, 2))]);
    }
}
