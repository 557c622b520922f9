using OxyPlot;

namespace BandSpec.Documents.Pdf;

/// <summary>
/// Stage two: draws the laid-out pages. On each page the decoration comes first, then the text and charts in reading order; elements of
/// the structure are opened and closed as the marks need them, so that a table over two pages stays one table.
/// </summary>
internal sealed class Drawing(IPaper paper)
{
    private readonly List<Tag> _open = [];

    public void Draw(IReadOnlyList<IReadOnlyList<Mark>> pages, PageGeometry page)
    {
        foreach (var marks in pages)
        {
            paper.NewSheet(page);
            paper.BeginDecoration();
            foreach (var mark in marks.Where(m => m.Tag is null)) Draw(mark);
            paper.EndDecoration();
            foreach (var mark in marks.Where(m => m.Tag is not null))
            {
                MoveTo(mark.Tag!, (mark as ChartMark)?.Area);
                Draw(mark);
            }
        }
        while (_open.Count > 0) CloseLast();
    }

    private void MoveTo(Tag tag, Box? area)
    {
        var path = tag.Path();
        var common = 0;
        while (common < _open.Count && common < path.Count && _open[common] == path[common]) common++;
        while (_open.Count > common) CloseLast();
        foreach (var node in path.Skip(common))
        {
            paper.Open(node, node == tag ? area : null);
            _open.Add(node);
        }
    }

    private void CloseLast()
    {
        paper.Close();
        _open.RemoveAt(_open.Count - 1);
    }

    private void Draw(Mark mark)
    {
        switch (mark)
        {
            case TextMark text: paper.Text(text.X, text.Y, text.Text, text.Face, text.Size, text.Ink); break;
            case RuleMark rule: paper.Polyline([(rule.X1, rule.Y1), (rule.X2, rule.Y2)], rule.Width, rule.Ink, null); break;
            case FillMark fill: paper.Polygon(Corners(fill.Area), fill.Ink); break;
            case BookmarkMark bookmark: paper.Bookmark(bookmark.Level, bookmark.Title, bookmark.Y); break;
            case ChartMark chart: chart.Chart.Draw(
                new SheetPen(paper), new OxyRect(chart.Area.X, chart.Area.Y, chart.Area.Width, chart.Area.Height)); break;
        }
    }

    private static (double, double)[] Corners(Box box) =>
        [(box.X, box.Y), (box.X + box.Width, box.Y), (box.X + box.Width, box.Bottom), (box.X, box.Bottom)];
}
