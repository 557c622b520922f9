using BandSpec.Documents.Charts;
using BandSpec.Documents.Fonts;
using OxyPlot;

namespace BandSpec.Documents.Pdf;

/// <summary>Draws a chart on paper, as lines, shapes and text within its figure.</summary>
internal sealed class SheetPen(IPaper paper) : ChartPen
{
    public override void Stroke(IReadOnlyList<ScreenPoint> points, Stroke stroke) =>
        paper.Polyline(Plain(points), stroke.Width, Plain(stroke.Ink), stroke.Dashes);

    public override void Fill(IReadOnlyList<ScreenPoint> outline, OxyColor fill, Stroke? edge)
    {
        paper.Polygon(Plain(outline), Plain(fill));
        if (edge is not null) Stroke([.. outline, outline[0]], edge);
    }

    public override void Write(ScreenPoint at, string text, Face face, double size, OxyColor ink)
    {
        var x = at.X;
        foreach (var (set, piece) in Letters.InFaces(text, face))
        {
            paper.Text(x, at.Y, piece, set, size, Plain(ink));
            x += Typeface.Of(set).Width(piece, size);
        }
    }

    protected override void BeginClip(OxyRect area) => paper.BeginClip(new Box(area.Left, area.Top, area.Width, area.Height));

    protected override void EndClip() => paper.EndClip();

    private static (double, double)[] Plain(IReadOnlyList<ScreenPoint> points) => [.. points.Select(p => (p.X, p.Y))];

    private static Colour Plain(OxyColor c) => new(c.R, c.G, c.B);
}
