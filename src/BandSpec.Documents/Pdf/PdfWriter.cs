using BandSpec.Documents.Model;
using BandSpec.Documents.Pdf.Finishing;
using BandSpec.Documents.Pdf.Layout;
using BandSpec.Documents.Pdf.Sharp;

namespace BandSpec.Documents.Pdf;

/// <summary>A document as PDF: laid out, drawn once, and finished. The same document gives the same bytes anywhere.</summary>
internal static class PdfWriter
{
    public static byte[] Write(Document document, PageGeometry page, PdfFacts facts)
    {
        var pages = DocumentLayout.Lay(document, page);
        IReadOnlyList<Mark> Furnished(IReadOnlyList<Mark> marks, int i) => [.. Furniture.Around(document.Frame, page, i + 1, pages.Count), .. marks];
        using var paper = new SharpPaper(facts);
        new Drawing(paper).Draw([.. pages.Select(Furnished)], page);
        return Finisher.Finish(paper.Finish(), facts);
    }
}
