using BandSpec.Documents.Fonts;

namespace BandSpec.Documents.Pdf.Layout;

/// <summary>Letters of one face and size on a line; X from the line's left end, rise above its baseline.</summary>
internal readonly record struct Span(double X, double Rise, string Text, Face Face, double Size);

/// <summary>A finished line of text.</summary>
internal sealed record Line(IReadOnlyList<Span> Spans, double Width)
{
    /// <summary>The marks of the line with its left end and baseline at the point.</summary>
    public IEnumerable<Mark> At(double x, double baseline, Colour ink, Tag? tag) =>
        Spans.Select(s => new TextMark(tag, x + s.X, baseline - s.Rise, s.Text, s.Face, s.Size, ink));
}
