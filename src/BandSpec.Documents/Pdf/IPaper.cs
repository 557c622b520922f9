using BandSpec.Documents.Fonts;

namespace BandSpec.Documents.Pdf;

/// <summary>
/// What the drawing stage asks of a PDF library, and all it asks. Points count from the top left corner, downwards. Everything is drawn
/// inside an open element or as decoration.
/// </summary>
internal interface IPaper : IDisposable
{
    void NewSheet(PageGeometry page);

    /// <summary>Opens a node of the structure. A figure also tells where on the sheet it stands.</summary>
    void Open(Tag tag, Box? area);

    void Close();

    void BeginDecoration();

    void EndDecoration();

    void Text(double x, double baseline, string text, Face face, double size, Colour ink);

    void Polyline(IReadOnlyList<(double X, double Y)> points, double width, Colour ink, IReadOnlyList<double>? dashes);

    void Polygon(IReadOnlyList<(double X, double Y)> points, Colour ink);

    void BeginClip(Box area);

    void EndClip();

    /// <summary>An entry of the outline that leads to a height on the current sheet.</summary>
    void Bookmark(int level, string title, double y);

    /// <summary>The finished file.</summary>
    byte[] Finish();
}
