using System.Globalization;
using System.Security;
using System.Text;
using BandSpec.Documents.Fonts;
using OxyPlot;

namespace BandSpec.Documents.Charts;

/// <summary>Writes a chart as SVG text. Baselines are explicit, since readers of SVG disagree on dominant-baseline.</summary>
internal sealed class SvgPen : ChartPen
{
    private const string Families = "'Source Sans 3','Source Sans Pro','Segoe UI','Helvetica Neue',Arial,sans-serif";

    private readonly StringBuilder _body = new();
    private int _clips;

    /// <summary>The whole file of a chart, with its title and its description for those who cannot see it.</summary>
    public static string Draw(Chart chart, string title, string description)
    {
        var pen = new SvgPen();
        chart.Draw(pen, new OxyRect(0, 0, chart.Width, chart.Height));
        return string.Create(CultureInfo.InvariantCulture, $"""
            <svg xmlns="http://www.w3.org/2000/svg" width="{F(chart.Width)}pt" height="{F(chart.Height)}pt" viewBox="0 0 {F(chart.Width)} {F(chart.Height)}"
             role="img" aria-labelledby="title desc" font-family="{Families}">
            <title id="title">{Safe(title)}</title>
            <desc id="desc">{Safe(description)}</desc>
            <rect width="100%" height="100%" fill="#ffffff"/>
            {pen._body}</svg>

            """).ReplaceLineEndings("\n");
    }

    public override void Stroke(IReadOnlyList<ScreenPoint> points, Stroke stroke) =>
        Element($"<polyline points=\"{Points(points)}\" fill=\"none\"{Edge(stroke)}/>");

    public override void Fill(IReadOnlyList<ScreenPoint> outline, OxyColor fill, Stroke? edge) =>
        Element($"<polygon points=\"{Points(outline)}\" fill=\"{Colour(fill)}\"{(edge is null ? "" : Edge(edge))}/>");

    public override void Write(ScreenPoint at, string text, Face face, double size, OxyColor ink) =>
        Element(
            $"<text x=\"{F(at.X)}\" y=\"{F(at.Y)}\" font-size=\"{F(size)}\"{Weight(face)}{Length(text, face, size)} fill=\"{Colour(ink)}\">{Safe(text)}</text>");

    protected override void BeginClip(OxyRect area)
    {
        var id = "c" + (++_clips).ToString(CultureInfo.InvariantCulture);
        var place = $"x=\"{F(area.Left)}\" y=\"{F(area.Top)}\" width=\"{F(area.Width)}\" height=\"{F(area.Height)}\"";
        Element($"<clipPath id=\"{id}\"><rect {place}/></clipPath>");
        Element($"<g clip-path=\"url(#{id})\">");
    }

    protected override void EndClip() => Element("</g>");

    /// <summary>The width that the text was placed by, so that it keeps its room in whatever font a reader has.</summary>
    private static string Length(string text, Face face, double size) =>
        text.Length == 0 ? "" : $" textLength=\"{F(Typeface.Of(face).Width(text, size))}\" lengthAdjust=\"spacingAndGlyphs\"";

    private void Element(string text) => _body.Append(text).Append('\n');

    private static string Edge(Stroke stroke) =>
        $" stroke=\"{Colour(stroke.Ink)}\" stroke-width=\"{F(stroke.Width)}\" stroke-linejoin=\"round\""
        + (stroke.Dashes is { } dashes ? $" stroke-dasharray=\"{string.Join(' ', dashes.Select(F))}\"" : "");

    private static string Weight(Face face) => face == Face.SemiBold ? " font-weight=\"600\"" : "";

    private static string Points(IReadOnlyList<ScreenPoint> points) => string.Join(' ', points.Select(p => $"{F(p.X)},{F(p.Y)}"));

    private static string Colour(OxyColor c) => $"#{c.R:x2}{c.G:x2}{c.B:x2}";

    private static string F(double value) =>
        Math.Round(value, 2).ToString("0.##", CultureInfo.InvariantCulture) is var text && text == "-0" ? "0" : text;

    private static string Safe(string text) => SecurityElement.Escape(text);
}
