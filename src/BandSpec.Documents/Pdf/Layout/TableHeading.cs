using BandSpec.Documents.Model;

namespace BandSpec.Documents.Pdf.Layout;

/// <summary>The heading rows of a table: group headings over the columns they span, then titles with their units below.</summary>
internal sealed class TableHeading(Table table, ColumnWidths columns, double width)
{
    /// <param name="head">The tag to hang the cells under; none when the heading is repeated.</param>
    public Slab Lay(Tag? head)
    {
        var marks = new List<Mark> { new RuleMark(0, 0, width, 0, 0.9, Look.Ink) };
        var y = Look.CellPad;
        if (table.HasGroups) y = LayGroups(head?.Child(TagKind.TR), marks, y);
        y = LayTitles(head?.Child(TagKind.TR), marks, y);
        marks.Add(new RuleMark(0, y, width, y, 0.5, Look.Rule));
        return new Slab(y, marks);
    }

    private double LayGroups(Tag? row, List<Mark> marks, double y)
    {
        for (int first = 0, next; first < table.Columns.Count; first = next)
        {
            next = first + 1;
            var group = table.Columns[first].Group;
            while (next < table.Columns.Count && group.Length > 0 && table.Columns[next].Group == group) next++;
            var tag = row is null ? null : new Tag(TagKind.TH, row) { Scope = HeaderScope.Column, Columns = next - first };
            if (group.Length == 0)
            {
                if (tag is not null) marks.Add(new EmptyMark(tag));
                continue;
            }
            double left = columns.Lefts[first], right = columns.Lefts[next - 1] + columns.Widths[next - 1];
            var line = LineBreaker.Break(group, Look.HeadCell, double.MaxValue)[0];
            marks.AddRange(line.At((left + right - line.Width) / 2, y + TextLayout.Baseline(Look.HeadCell), Look.HeadCell.Ink, tag));
            marks.Add(new RuleMark(left, y + Look.HeadCell.Leading + 1, right, y + Look.HeadCell.Leading + 1, 0.5, Look.Rule));
        }
        return y + Look.HeadCell.Leading + 3;
    }

    private double LayTitles(Tag? row, List<Mark> marks, double y)
    {
        var titles = table.Columns.Select((c, i) => LineBreaker.Break(c.Title, Look.HeadCell, columns.Widths[i])).ToList();
        IReadOnlyList<Line> Unit(Column c, int i) => c.Unit.Length == 0 ? [] : LineBreaker.Break(c.Unit, Look.UnitCell, columns.Widths[i]);
        var units = table.Columns.Select(Unit).ToList();
        // Titles end on a common line and units on the one below, so that the eye finds them at one height.
        int titleLines = titles.Max(t => t.Count), unitLines = units.Max(u => u.Count);
        var unitTop = y + titleLines * Look.HeadCell.Leading;
        for (int i = 0; i < table.Columns.Count; i++)
        {
            var tag = row is null ? null : new Tag(TagKind.TH, row) { Scope = HeaderScope.Column };
            if (tag is not null && table.Columns[i].Title.IsEmpty) marks.Add(new EmptyMark(tag));
            Set(marks, titles[i], i, y + (titleLines - titles[i].Count) * Look.HeadCell.Leading, Look.HeadCell, tag);
            Set(marks, units[i], i, unitTop, Look.UnitCell, tag);
        }
        return unitTop + unitLines * Look.UnitCell.Leading + Look.CellPad;
    }

    private void Set(List<Mark> marks, IReadOnlyList<Line> lines, int column, double top, TextStyle style, Tag? tag)
    {
        for (int k = 0; k < lines.Count; k++)
        {
            var x = columns.Lefts[column] + table.Columns[column].Align switch
            {
                Align.Left => 0,
                Align.Centre => (columns.Widths[column] - lines[k].Width) / 2,
                _ => columns.Widths[column] - lines[k].Width,
            };
            marks.AddRange(lines[k].At(x, top + k * style.Leading + TextLayout.Baseline(style), style.Ink, tag));
        }
    }
}
