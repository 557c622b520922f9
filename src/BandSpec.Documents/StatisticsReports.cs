using System.Text;
using BandSpec.Core.Characterizing;
using BandSpec.Documents.Charts;
using BandSpec.Documents.Composing;
using BandSpec.Documents.Markdown;
using BandSpec.Documents.Model;
using BandSpec.Documents.Pdf;

namespace BandSpec.Documents;

/// <summary>Draws the reports on statistics: of a characterization and of an ageing test. The same arguments give the same bytes.</summary>
public static class StatisticsReports
{
    /// <summary>The report of a characterization as PDF and Markdown, its charts as SVG.</summary>
    /// <param name="found">The characterization.</param>
    /// <param name="family">The family's name.</param>
    /// <param name="files">The files of readings that it rests on.</param>
    /// <param name="date">The day of the report.</param>
    /// <param name="options">Paper and program; its language is not asked for, reports on statistics are in English.</param>
    public static IReadOnlyList<DocumentFile> Draw(
        Characterization found, string family, IReadOnlyList<SourceFile> files, DateOnly date, DocumentOptions options)
    {
        ArgumentNullException.ThrowIfNull(found);
        ArgumentNullException.ThrowIfNull(files);
        ArgumentNullException.ThrowIfNull(options);
        return Draw("characterization", CharacterizationComposer.Compose(found, Head(family, files, date, options)), files, options);
    }

    /// <summary>The report of an ageing test as PDF and Markdown.</summary>
    /// <param name="found">The ageing statistics.</param>
    /// <param name="family">The family's name.</param>
    /// <param name="files">The files of readings that they rest on.</param>
    /// <param name="date">The day of the report.</param>
    /// <param name="options">Paper and program.</param>
    public static IReadOnlyList<DocumentFile> Draw(
        AgeingStatistics found, string family, IReadOnlyList<SourceFile> files, DateOnly date, DocumentOptions options)
    {
        ArgumentNullException.ThrowIfNull(found);
        ArgumentNullException.ThrowIfNull(files);
        ArgumentNullException.ThrowIfNull(options);
        return Draw("ageing", AgeingComposer.Compose(found, Head(family, files, date, options)), files, options);
    }

    private static ReportHead Head(string family, IReadOnlyList<SourceFile> files, DateOnly date, DocumentOptions options) =>
        new(family, [.. files.Select(file => file.Name)], date, options.Program);

    private static IReadOnlyList<DocumentFile> Draw(string name, Document document, IReadOnlyList<SourceFile> files, DocumentOptions options)
    {
        PdfFacts facts = new(
            document.Frame.Title, document.Frame.Author, document.Frame.Subject, document.Frame.Language, document.Frame.Date, options.Program,
            [.. files.Select(f => new Attachment(f.Name, f.MediaType, f.Description, Relationship.Source, f.Bytes.ToArray()))], options.ClaimsConformance);
        PageGeometry page = options.Paper == Paper.Letter ? PageGeometry.Letter : PageGeometry.A4;
        return
        [
            new($"{name}.pdf", PdfWriter.Write(document, page, facts)),
            new($"{name}.md", Encoding.UTF8.GetBytes(MarkdownWriter.Write(document))),
            .. document.Blocks.OfType<Figure>().Select(f => new DocumentFile(
                f.FileName, Encoding.UTF8.GetBytes(SvgPen.Draw(f.Chart, $"{f.Label}: {f.Caption.Plain}", f.Alternative)))),
        ];
    }
}
