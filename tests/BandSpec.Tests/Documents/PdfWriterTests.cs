using System.Globalization;
using System.Text;
using BandSpec.Documents;
using BandSpec.Documents.Fonts;
using BandSpec.Documents.Model;
using BandSpec.Documents.Pdf;
using Xunit;

namespace BandSpec.Tests.Documents;

/// <summary>The sample document as PDF, read back by programs of others and by checks of our own.</summary>
public sealed class PdfWriterTests
{
    private static readonly Lazy<byte[]> Sample = new(() => Write(SampleDocument.Full()));

    [Fact]
    public void Two_drawings_are_the_same_to_the_last_byte_in_any_culture_and_thread()
    {
        var elsewhere = Task.Run(() =>
        {
            CultureInfo.CurrentCulture = new CultureInfo("") { NumberFormat = { NumberDecimalSeparator = ",", NegativeSign = "~" } };
            return Write(SampleDocument.Full());
        });
        Assert.True(Sample.Value.AsSpan().SequenceEqual(elsewhere.Result));
    }

    [Fact]
    public void Qpdf_finds_nothing_wrong() =>
        Assert.Contains("No syntax or stream encoding errors found", Tools.Run("qpdf", Sample.Value, path => $"--check {path}"));

    [Fact]
    public void Mupdf_draws_every_page_without_a_warning()
    {
        var lines = Tools.Run(
            "mutool", Sample.Value, path => $"draw -o /dev/null {path}").Split('\n', StringSplitOptions.RemoveEmptyEntries);
        // A mupdf built without colour management says so for every file that has a profile.
        Assert.All(
            lines,
            line => Assert.True(
                line.StartsWith("page ", StringComparison.Ordinal) || line.Contains("ICC support is not available", StringComparison.Ordinal),
                line));
    }

    [Fact]
    public void Every_font_is_embedded_a_subset_and_mapped_to_letters()
    {
        var fonts = Tools.Run("pdffonts", Sample.Value, path => path).Split('\n', StringSplitOptions.RemoveEmptyEntries).Skip(2).ToList();
        Assert.Equal(4, fonts.Count);
        Assert.All(fonts, font => Assert.Matches(@"^[A-Z]{6}\+Source.*CID TrueType +Identity-H +yes yes yes", font));
    }

    [Fact]
    public void Marked_content_is_nested_rightly_on_every_page()
    {
        var pages = ContentStreams.Of(Sample.Value);
        Assert.True(pages.Count >= 8);
        Assert.All(pages, page => Assert.Null(ContentStreams.WrongNesting(page)));
    }

    [Fact]
    public void Text_is_found_in_reading_order()
    {
        var text = Tools.Run("pdftotext", Sample.Value, path => $"-layout {path} -");
        string[] inOrder = [
            "DRAFT", "Custom error-band specification", "Brine reinjection line", "±1.0 %FS", "Figure 1", "1 Error band by region",
            "Table 1", "Table 2 (continued)", "Table 3", "2 Charts", "Figure 5", "Ωμέγα, Давление, Übergröße, Łódź",
            "Small print at the end."];
        var at = 0;
        foreach (var piece in inOrder)
        {
            var found = text.Replace('\u00a0', ' ').Replace(
                "  ", " ", StringComparison.Ordinal).IndexOf(piece, at, StringComparison.Ordinal);
            Assert.True(found >= 0, piece);
            at = found;
        }
    }

    [Fact]
    public void Tables_are_tagged_with_headers_and_figures_with_words_and_a_place()
    {
        var structure = Tools.Run("pdfinfo", Sample.Value, path => $"-struct {path}");
        Assert.Matches(@"Table \(block\)\s+Caption\s+P \(block\)\s+THead\s+TR\s+TH", structure);
        Assert.Contains("/Scope /Column", structure);
        Assert.Contains("/Scope /Row", structure);
        Assert.Contains("/ColSpan 3", structure);
        Assert.Equal(SampleDocument.Full().Blocks.OfType<Figure>().Count(), structure.Split("/BBox").Length - 1);
    }

    [Fact]
    public void The_properties_are_escaped_and_claim_nothing_unasked()
    {
        var text = Encoding.UTF8.GetString(Sample.Value);
        Assert.Contains("<rdf:li xml:lang=\"x-default\">Brine &lt;reinjection&gt; &amp; line</rdf:li>", text);
        Assert.DoesNotContain("pdfaid", text);
        var claiming = PdfWriter.Write(SampleDocument.Full(), PageGeometry.A4, SampleDocument.Facts() with { ClaimsConformance = true });
        Assert.Contains("<pdfaid:part>3</pdfaid:part>", Encoding.UTF8.GetString(claiming));
    }

    [Fact]
    public void What_is_attached_comes_back_byte_for_byte()
    {
        var binary = new Attachment(
            "a.bin", "application/octet-stream", "All bytes", Relationship.Data, [.. Enumerable.Range(0, 2000).Select(i => (byte)(i * 7))]);
        var empty = new Attachment("Ωμέγα.yaml", "application/yaml", "Nothing", Relationship.Source, []);
        var pdf = PdfWriter.Write(SampleDocument.Full(), PageGeometry.A4, SampleDocument.Facts(SampleDocument.Note, binary, empty));
        var back = SpecificationFile.Attachments(pdf);
        Assert.Equal(["a.bin", "note.txt", "Ωμέγα.yaml"], back.Select(f => f.Name));
        Assert.Equal([binary.Bytes, SampleDocument.Note.Bytes, empty.Bytes], back.Select(f => f.Bytes.ToArray()));
    }

    [Fact]
    public void A_file_that_is_no_pdf_is_told_so() =>
        Assert.Throws<InvalidDataException>(() => SpecificationFile.Attachments("not a PDF at all"u8.ToArray()));

    [Fact]
    public void A_letter_that_no_font_has_stops_the_drawing() =>
        Assert.Throws<MissingLetterException>(() => Write(new Document(SampleDocument.Frame(), [new Paragraph("圧力")])));

    private static byte[] Write(Document document) => PdfWriter.Write(document, PageGeometry.A4, SampleDocument.Facts(SampleDocument.Note));
}
