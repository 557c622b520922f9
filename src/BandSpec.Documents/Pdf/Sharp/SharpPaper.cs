using BandSpec.Documents.Fonts;
using PdfSharp.Drawing;
using PdfSharp.Pdf;
using PdfSharp.UniversalAccessibility;

namespace BandSpec.Documents.Pdf.Sharp;

/// <summary>
/// Paper made of PDFsharp 6.2.4. Streams are written plain; the finisher compresses them, because PDFsharp leaves the checksum of its
/// zlib streams out. Before anything is opened or closed the page is brought out of text mode, or marked content would be nested wrongly.
/// </summary>
internal sealed class SharpPaper : IPaper
{
    private static readonly XPdfFontOptions Unicode = new(PdfFontEncoding.Unicode);

    private readonly PdfDocument _document;
    private readonly UAManager _structure;
    private readonly SharpTags _tags;
    private readonly Dictionary<(Face, double), XFont> _fonts = [];
    private readonly Stack<PdfOutlineCollection> _outline = new();
    private XGraphics? _graphics;
    private PdfPage? _page;

    public SharpPaper(PdfFacts facts)
    {
        EmbeddedFonts.Install();
        _document = new PdfDocument();
        _document.Options.NoCompression = true;
        _document.Options.CompressContentStreams = false;
        SharpCatalogue.Write(_document, facts);
        _structure = UAManager.ForDocument(_document);
        _structure.SetDocumentLanguage(facts.Language);
        _tags = new SharpTags(_structure);
        _document.RenderEvents.RenderTextEvent += (_, e) =>
        {
            if (e.CodePointGlyphIndexPairs.FirstOrDefault(p => p.GlyphIndex == 0) is { CodePoint: > 0 } missing)
                throw new MissingLetterException(char.ConvertFromUtf32(missing.CodePoint), char.ConvertFromUtf32(missing.CodePoint));
        };
        _outline.Push(_document.Outlines);
    }

    private XGraphics Graphics => _graphics ?? throw new InvalidOperationException("Nothing can be drawn before the first sheet.");

    public void NewSheet(PageGeometry page)
    {
        if (_graphics is not null) _structure.BeginGraphicMode();
        _page = _document.AddPage();
        (_page.Width, _page.Height) = (XUnit.FromPoint(page.Width), XUnit.FromPoint(page.Height));
        _graphics = XGraphics.FromPdfPage(_page);
    }

    public void Open(Tag tag, Box? area)
    {
        _structure.BeginGraphicMode();
        _tags.Open(tag, area, _page!.Height.Point);
    }

    public void Close()
    {
        _structure.BeginGraphicMode();
        _structure.StructureBuilder.End();
    }

    public void BeginDecoration()
    {
        _structure.BeginGraphicMode();
        _structure.StructureBuilder.BeginArtifact();
    }

    public void EndDecoration() => Close();

    public void Text(double x, double baseline, string text, Face face, double size, Colour ink)
    {
        if (!_fonts.TryGetValue((face, size), out var font))
            _fonts[(face, size)] = font = new XFont(Typeface.Of(face).Name, size, XFontStyleEx.Regular, Unicode);
        Graphics.DrawString(text, font, new XSolidBrush(Plain(ink)), x, baseline, XStringFormats.BaseLineLeft);
    }

    public void Polyline(IReadOnlyList<(double X, double Y)> points, double width, Colour ink, IReadOnlyList<double>? dashes)
    {
        var pen = new XPen(Plain(ink), width) { LineJoin = XLineJoin.Round };
        // PDFsharp takes dashes in multiples of the width.
        if (dashes is not null) pen.DashPattern = [.. dashes.Select(d => d / width)];
        Graphics.DrawLines(pen, Plain(points));
    }

    public void Polygon(IReadOnlyList<(double X, double Y)> points, Colour ink) =>
        Graphics.DrawPolygon(new XSolidBrush(Plain(ink)), Plain(points), XFillMode.Winding);

    public void BeginClip(Box area)
    {
        Graphics.Save();
        Graphics.IntersectClip(new XRect(area.X, area.Y, area.Width, area.Height));
    }

    public void EndClip() => Graphics.Restore();

    public void Bookmark(int level, string title, double y)
    {
        while (_outline.Count > level) _outline.Pop();
        var entry = _outline.Peek().Add(title, _page!, level == 1);
        entry.PageDestinationType = PdfPageDestinationType.Xyz;
        (entry.Left, entry.Top) = (0, _page!.Height.Point - y + 12);
        _outline.Push(entry.Outlines);
    }

    public byte[] Finish()
    {
        using var file = new MemoryStream();
        _document.Save(file);
        return file.ToArray();
    }

    public void Dispose()
    {
        _graphics?.Dispose();
        _document.Dispose();
    }

    private static XColor Plain(Colour c) => XColor.FromArgb(c.R, c.G, c.B);

    private static XPoint[] Plain(IReadOnlyList<(double X, double Y)> points) => [.. points.Select(p => new XPoint(p.X, p.Y))];
}
