using System.Text;
using BandSpec.Core.LotJudging;
using BandSpec.Documents.Charts;
using BandSpec.Documents.Judging;
using BandSpec.Documents.Markdown;
using BandSpec.Documents.Model;
using BandSpec.Documents.Pdf;
using BandSpec.Documents.Templates;

namespace BandSpec.Documents;

/// <summary>Draws the documents of a lot's judgement. The same arguments give the same bytes, on any machine, in any culture.</summary>
public static class JudgementPackage
{
    /// <summary>The judgement as PDF and Markdown, and a chart of every characteristic as SVG, each name without a folder.</summary>
    /// <param name="judged">The judgement.</param>
    /// <param name="files">The files of readings it rests on.</param>
    /// <param name="attachments">Files that the PDF carries, such as judgement.json.</param>
    /// <param name="date">The day of the judgement.</param>
    /// <param name="options">Paper, language and templates.</param>
    /// <exception cref="TemplateException">A word file cannot be read or carried out.</exception>
    public static IReadOnlyList<DocumentFile> Draw(
        LotJudgement judged, IReadOnlyList<JudgedFile> files, IReadOnlyList<SourceFile> attachments, DateOnly date, DocumentOptions options)
    {
        ArgumentNullException.ThrowIfNull(judged);
        ArgumentNullException.ThrowIfNull(attachments);
        ArgumentNullException.ThrowIfNull(options);
        var words = Words.Load(new TemplateSources(options.Templates), options.Language, Words.OfJudgements);
        var view = new JudgementViewMaker(judged, files, words.Plain("decimal-sign")).Make();
        words = words.About(JudgementForTemplates.Of(view, words, options.Program));
        var document = JudgementComposer.Compose(view, words, date, options);
        PageGeometry page = options.Paper == Paper.Letter ? PageGeometry.Letter : PageGeometry.A4;
        PdfFacts facts = new(
            document.Frame.Title, document.Frame.Author, document.Frame.Subject, document.Frame.Language, date, options.Program,
            [.. attachments.Select(f => new Attachment(f.Name, f.MediaType, f.Description, f.IsInput ? Relationship.Source : Relationship.Data, f.Bytes.ToArray()))],
            options.ClaimsConformance);
        return
        [
            new("judgement.pdf", PdfWriter.Write(document, page, facts)),
            new("judgement.md", Encoding.UTF8.GetBytes(MarkdownWriter.Write(document))),
            .. document.Blocks.OfType<Figure>().Select(f => new DocumentFile(
                f.FileName, Encoding.UTF8.GetBytes(SvgPen.Draw(f.Chart, $"{f.Label}: {f.Caption.Plain}", f.Alternative)))),
        ];
    }
}
