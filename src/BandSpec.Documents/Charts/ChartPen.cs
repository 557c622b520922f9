using BandSpec.Documents.Fonts;
using OxyPlot;

namespace BandSpec.Documents.Charts;

/// <summary>
/// What charts are drawn with, on paper or in SVG: OxyPlot's many calls brought down to a line, a shape and a piece of text on a
/// baseline, so that both media show the same picture. Letters are measured with the embedded faces.
/// </summary>
internal abstract class ChartPen : RenderContextBase
{
    private readonly Stack<OxyRect> _clips = new();

    protected ChartPen() => RendersToScreen = false;

    public sealed override int ClipCount => _clips.Count;

    public abstract void Stroke(IReadOnlyList<ScreenPoint> points, Stroke stroke);

    public abstract void Fill(IReadOnlyList<ScreenPoint> outline, OxyColor fill, Stroke? edge);

    /// <summary>Text with its left end and baseline at the point.</summary>
    public abstract void Write(ScreenPoint at, string text, Face face, double size, OxyColor ink);

    protected abstract void BeginClip(OxyRect area);

    protected abstract void EndClip();

    public static Face FaceOf(double weight) => weight >= 600 ? Face.SemiBold : Face.Regular;

    public sealed override void DrawLine(
        IList<ScreenPoint> points, OxyColor stroke, double thickness, EdgeRenderingMode mode, double[]? dashes, LineJoin join)
    {
        if (points.Count > 1 && thickness > 0 && stroke.IsVisible())
            Stroke([.. points], new Stroke(stroke, thickness, Scaled(dashes, thickness)));
    }

    public sealed override void DrawPolygon(
        IList<ScreenPoint> points, OxyColor fill, OxyColor stroke, double thickness, EdgeRenderingMode mode, double[]? dashes,
        LineJoin join)
    {
        Stroke? edge = stroke.IsVisible() && thickness > 0 ? new Stroke(stroke, thickness, Scaled(dashes, thickness)) : null;
        if (fill.IsVisible()) Fill([.. points], fill, edge);
        else if (edge is not null) Stroke([.. points, points[0]], edge);
    }

    // Text in these charts is never turned, so the angle is not looked at.
    public sealed override void DrawText(
        ScreenPoint p, string text, OxyColor fill, string? fontFamily, double fontSize, double fontWeight,
        double rotate, HorizontalAlignment halign, VerticalAlignment valign, OxySize? maxSize)
    {
        if (string.IsNullOrEmpty(text)) return;
        var face = FaceOf(fontWeight);
        var width = Typeface.Of(face).Width(text, fontSize);
        var capitals = Typeface.Of(face).CapHeight * fontSize;
        var x = p.X - halign switch { HorizontalAlignment.Center => width / 2, HorizontalAlignment.Right => width, _ => 0 };
        var y = p.Y + valign switch
        {
            VerticalAlignment.Top => capitals + 0.1 * fontSize, VerticalAlignment.Middle => capitals / 2, _ => -0.1 * fontSize
        };
        Write(new ScreenPoint(x, y), text, face, fontSize, fill);
    }

    public sealed override OxySize MeasureText(string? text, string? fontFamily, double fontSize, double fontWeight) =>
        string.IsNullOrEmpty(text) ? OxySize.Empty : new OxySize(Typeface.Of(FaceOf(fontWeight)).Width(text, fontSize), 0.9 * fontSize);

    public sealed override void PushClip(OxyRect clippingRectangle)
    {
        _clips.Push(clippingRectangle);
        BeginClip(clippingRectangle);
    }

    public sealed override void PopClip()
    {
        _clips.Pop();
        EndClip();
    }

    // OxyPlot gives dashes in multiples of the thickness.
    private static double[]? Scaled(double[]? dashes, double thickness) => dashes is null ? null : [.. dashes.Select(d => d * thickness)];
}

/// <summary>Colour and width in points of a line, and its dashes in points (none: an unbroken line).</summary>
internal sealed record Stroke(OxyColor Ink, double Width, double[]? Dashes = null);
