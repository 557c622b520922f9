using System.Security.Cryptography;
using System.Text;
using BandSpec.Core.Specifying;
using BandSpec.Documents.Charts;
using BandSpec.Documents.Composing;
using BandSpec.Documents.Limits;
using BandSpec.Documents.Markdown;
using BandSpec.Documents.Model;
using BandSpec.Documents.Pdf;
using BandSpec.Documents.Printing;
using BandSpec.Documents.Templates;

namespace BandSpec.Documents;

/// <summary>
/// Draws the documents of a finished specification. The same arguments give the same bytes, on any machine, in any culture.
/// </summary>
public static class SpecificationPackage
{
    /// <summary>
    /// The specification as PDF and Markdown, its charts as SVG, and its limits in every layout of the templates: files to be written into
    /// the package's folder, in no particular order, each name without a folder.
    /// </summary>
    /// <param name="specification">The finished record.</param>
    /// <param name="sources">
    /// The files the document rests on and shows: inputs are listed with their digests; all are attached to the PDF, byte for byte.
    /// </param>
    /// <param name="options">Paper, language, templates and standing.</param>
    /// <exception cref="TemplateException">A template cannot be read or carried out, or a layout of the limits drops or changes a
    /// figure.</exception>
    /// <exception cref="Fonts.MissingLetterException">A text holds a letter that no embedded font has; see
    /// <see cref="Fonts.Letters.Missing"/>.</exception>
    public static IReadOnlyList<DocumentFile> Draw(Specification specification, IReadOnlyList<SourceFile> sources, DocumentOptions options)
    {
        ArgumentNullException.ThrowIfNull(specification);
        ArgumentNullException.ThrowIfNull(sources);
        ArgumentNullException.ThrowIfNull(options);
        var templates = new TemplateSources(options.Templates);
        var words = Words.Load(templates, options.Language);
        var standing = !specification.Feasible ? Standing.Refused : options.Release is null ? Standing.Draft : Standing.Released;
        var view = new PrintViewMaker(specification, words.Plain("decimal-sign")).Make(
            Digests(sources), options.Program, standing.ToString());
        words = words.About(ViewForTemplates.Of(view));
        var composition = new Composition(view, words, new SpecificationCharts(specification, view, words));
        var document = SpecificationComposer.Compose(
            composition, specification.Application.Requirement.Identity.Date, options, standing, sources.Count > 0);
        return
        [
            new("specification.pdf", PdfWriter.Write(document, Sheet(options.Paper), Facts(document.Frame, sources, options))),
            Text("specification.md", MarkdownWriter.Write(document)),
            .. document.Blocks.OfType<Figure>().Select(Picture),
            .. LimitsLayouts.Write(templates, view),
        ];
    }

    /// <summary>The files of a user's folder that would be read for a language, by their paths in it: what the documents depend on besides.</summary>
    /// <param name="own">The user's folder.</param>
    /// <param name="language">The language of the words.</param>
    public static IReadOnlyList<string> TemplatePaths(ITemplateFolder own, string language)
    {
        ArgumentNullException.ThrowIfNull(own);
        return [.. Words.PathsOf(language).Where(path => own.Read(path) is not null), .. own.Files("limits").Order(StringComparer.Ordinal)];
    }

    private static PageGeometry Sheet(Paper paper) => paper == Paper.Letter ? PageGeometry.Letter : PageGeometry.A4;

    private static DocumentFile Picture(Figure f) => Text(f.FileName, SvgPen.Draw(f.Chart, $"{f.Label}: {f.Caption.Plain}", f.Alternative));

    private static DocumentFile Text(string name, string text) => new(name, Encoding.UTF8.GetBytes(text));

    private static List<DigestView> Digests(IReadOnlyList<SourceFile> sources) =>
        [.. sources.Where(s => s.IsInput).Select(s => new DigestView(s.Name, Convert.ToHexStringLower(SHA256.HashData(s.Bytes.Span))))];

    private static Attachment Attached(SourceFile file) =>
        new(file.Name, file.MediaType, file.Description, file.IsInput ? Relationship.Source : Relationship.Data, file.Bytes.ToArray());

    private static PdfFacts Facts(Frame frame, IReadOnlyList<SourceFile> sources, DocumentOptions options) => new(
        frame.Title, frame.Author, frame.Subject, frame.Language, frame.Date, options.Program,
        [.. sources.Select(Attached)],
        options.ClaimsConformance);
}
