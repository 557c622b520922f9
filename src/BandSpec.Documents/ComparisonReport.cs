using System.Text;
using BandSpec.Core.Revisions;
using BandSpec.Documents.Charts;
using BandSpec.Documents.Composing;
using BandSpec.Documents.Markdown;
using BandSpec.Documents.Model;
using BandSpec.Documents.Pdf;
using Figure = BandSpec.Documents.Model.Figure;

namespace BandSpec.Documents;

/// <summary>Draws the comparison of two specifications. The same arguments give the same bytes.</summary>
public static class ComparisonReport
{
    /// <summary>The report as PDF and Markdown, and its chart as SVG; in English, whatever the language of the specifications.</summary>
    /// <param name="comparison">The two records.</param>
    /// <param name="causes">What each changed part of the inputs does alone, the one that moved most first.</param>
    /// <param name="options">Paper and program.</param>
    /// <exception cref="Fonts.MissingLetterException">A text holds a letter that no embedded font has.</exception>
    public static IReadOnlyList<DocumentFile> Draw(Comparison comparison, IReadOnlyList<Cause> causes, DocumentOptions options)
    {
        ArgumentNullException.ThrowIfNull(options);
        Document document = new ComparisonComposer(comparison, causes).Compose(options.Program);
        PageGeometry page = options.Paper == Paper.Letter ? PageGeometry.Letter : PageGeometry.A4;
        Frame frame = document.Frame;
        PdfFacts facts = new(frame.Title, frame.Author, frame.Subject, frame.Language, frame.Date, options.Program, [], options.ClaimsConformance);
        return
        [
            new("comparison.pdf", PdfWriter.Write(document, page, facts)),
            new("comparison.md", Encoding.UTF8.GetBytes(MarkdownWriter.Write(document))),
            .. document.Blocks.OfType<Figure>().Select(f => new DocumentFile(
                f.FileName, Encoding.UTF8.GetBytes(SvgPen.Draw(f.Chart, $"{f.Label}: {f.Caption.Plain}", f.Alternative)))),
        ];
    }

    /// <summary>The report as Markdown alone, without its chart and the chart's chapter: to be put into a merge request as it is.</summary>
    /// <param name="comparison">The two records.</param>
    /// <param name="causes">What each changed part of the inputs does alone.</param>
    /// <param name="program">Name and version of the program.</param>
    public static string Markdown(Comparison comparison, IReadOnlyList<Cause> causes, string program)
    {
        Document document = new ComparisonComposer(comparison, causes) { HasChart = false }.Compose(program);
        return MarkdownWriter.Write(document);
    }
}
