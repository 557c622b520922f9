using System.Text;
using BandSpec.Documents;
using Xunit;

namespace BandSpec.Tests.Documents;

/// <summary>The finished documents of a specification, as they lie in the package.</summary>
public sealed class SpecificationPackageTests
{
    private static readonly Lazy<IReadOnlyDictionary<string, byte[]>> Feasible = new(() => Drafts.Draw(Drafts.Feasible));

    [Fact]
    public void Holds_pdf_markdown_charts_and_limits() => Assert.Equal(
        [
            "band-over-temperature.svg", "chamber-run.svg", "dwell-profile.svg", "error-over-pressure.svg", "error-shares.svg",
            "specification.md", "specification.pdf", "test-card.txt", "test-points.csv", "test-sequence.xml",
        ],
        Feasible.Value.Keys.Order(StringComparer.Ordinal));

    [Fact]
    public void Two_drawings_are_the_same_to_the_last_byte()
    {
        var again = Drafts.Draw(Drafts.Feasible);
        Assert.All(Feasible.Value, file => Assert.True(file.Value.AsSpan().SequenceEqual(again[file.Key]), file.Key));
    }

    [Fact]
    public void Page_and_Markdown_show_the_same_figures()
    {
        var page = Plain(Tools.Run("pdftotext", Feasible.Value["specification.pdf"], path => $"-layout {path} -"));
        var figures = System.Text.RegularExpressions.Regex.Matches(
            Markdown(Feasible.Value), @"(?<![\w.])\u2212?\d+\.\d+(?![\w.])").Select(m => m.Value).Distinct().ToList();
        Assert.True(figures.Count > 80);
        Assert.All(figures, figure => Assert.Contains(figure, page));
    }

    [Fact]
    public void Every_limit_stands_alike_on_the_page_and_in_every_layout()
    {
        var page = Plain(Tools.Run("pdftotext", Feasible.Value["specification.pdf"], path => $"-layout {path} -"));
        foreach (var row in Encoding.UTF8.GetString(Feasible.Value["test-points.csv"]).Split('\n', StringSplitOptions.RemoveEmptyEntries).Skip(1).Select(line => line.Split(',')))
        {
            string id = row[2], lower = row[7], nominal = row[8], upper = row[9];
            Assert.Matches($@"{id} .* {lower} +{nominal} +{upper} ", page);
            Assert.Matches($@"{id} .* {lower} +{nominal} +{upper}\n", Encoding.UTF8.GetString(Feasible.Value["test-card.txt"]));
            Assert.Matches($"""point id="{id}"[^\n]*\n *<accept lower="{lower}" nominal="{nominal}" upper="{upper}"/>""", Encoding.UTF8.GetString(Feasible.Value["test-sequence.xml"]));
        }
    }

    [Fact]
    public void A_printed_limit_is_never_wider_than_the_limit()
    {
        var rows = Encoding.UTF8.GetString(Feasible.Value["test-points.csv"]).Split(
            '\n', StringSplitOptions.RemoveEmptyEntries).Skip(1).Select(line => line.Split(',')).ToList();
        Assert.Equal(Drafts.Feasible.VerificationPoints.Count, rows.Count);
        foreach (var (point, row) in Drafts.Feasible.VerificationPoints.Zip(rows))
        {
            Assert.InRange(Number(row[7]), point.Lower - 1e-9, point.Lower + 1e-4);
            Assert.InRange(Number(row[9]), point.Upper - 1e-4, point.Upper + 1e-9);
        }
    }

    [Fact]
    public void Every_page_of_what_is_not_feasible_says_so()
    {
        var files = Drafts.Draw(Drafts.Refused, Drafts.Options with { Release = Drafts.Mark });
        var pages = Tools.Run("pdftotext", files["specification.pdf"], path => $"-layout {path} -").TrimEnd('\f').Split('\f');
        Assert.All(pages, page => Assert.Contains("NOT FEASIBLE", page));
        Assert.StartsWith("**NOT FEASIBLE**", Markdown(files));
        Assert.Contains("NOT FEASIBLE", Encoding.UTF8.GetString(files["test-card.txt"]));
    }

    [Fact]
    public void Every_page_says_that_it_is_a_draft_or_who_released_it_and_when()
    {
        var released = Drafts.Draw(Drafts.Feasible, Drafts.Options with { Release = Drafts.Mark });
        Assert.StartsWith("**DRAFT**", Markdown(Feasible.Value));
        Assert.StartsWith("**RELEASED** – by Ylva Strøm on 2026-11-25", Markdown(released));
        Assert.Contains("09:30:00", Markdown(released));
        Assert.Contains(Drafts.Mark.Digest, Markdown(released));
        foreach (var (files, words) in new[] { (Feasible.Value, "DRAFT"), (released, "RELEASED") })
            Assert.All(
                Tools.Run("pdftotext", files["specification.pdf"], path => $"-layout {path} -").TrimEnd('\f').Split('\f'),
                page => Assert.Contains(words, page));
    }

    [Fact]
    public void Another_language_changes_words_and_signs_but_no_figure()
    {
        var german = Drafts.Draw(Drafts.Feasible, Drafts.Options with { Language = "de" });
        Assert.Contains("Fehlerband-Spezifikation", Markdown(german));
        static IEnumerable<string> Figures(string text) =>
            System.Text.RegularExpressions.Regex.Matches(text, @"\d+[.,]\d+").Select(m => m.Value.Replace(',', '.')).Distinct().Order();
        var english = Figures(Markdown(Feasible.Value)).ToHashSet();
        Assert.All(Figures(Markdown(german)), figure => Assert.Contains(figure, english));
        Assert.Equal(Feasible.Value["test-points.csv"], german["test-points.csv"]);
        Assert.Equal(Feasible.Value["test-sequence.xml"], german["test-sequence.xml"]);
    }

    [Fact]
    public void Inputs_are_named_by_digest_and_attached()
    {
        Assert.Contains(
            Convert.ToHexStringLower(System.Security.Cryptography.SHA256.HashData(Drafts.Sources[0].Bytes.Span)), Markdown(Feasible.Value));
        var attached = SpecificationFile.Attachments(Feasible.Value["specification.pdf"]);
        Assert.Equal(Drafts.Sources.Select(s => s.Name), attached.Select(a => a.Name));
        Assert.All(Drafts.Sources.Zip(attached), pair => Assert.True(pair.First.Bytes.Span.SequenceEqual(pair.Second.Bytes.Span)));
    }

    [Fact]
    public void Is_small() => Assert.InRange(Drafts.Draw(Drafts.Feasible)["specification.pdf"].Length, 20_000, 250_000);

    [Theory]
    [InlineData(Paper.A4, "595.276 x 841.89")]
    [InlineData(Paper.Letter, "612 x 792")]
    public void Long_inputs_lay_out_on_either_paper(Paper paper, string size)
    {
        var pdf = Drafts.Draw(Drafts.Stress, Drafts.Options with { Paper = paper })["specification.pdf"];
        Assert.Contains(size, Tools.Run("pdfinfo", pdf, path => path));
        Assert.Contains("No syntax or stream encoding errors found", Tools.Run("qpdf", pdf, path => $"--check {path}"));
        Assert.All(ContentStreams.Of(pdf), page => Assert.Null(ContentStreams.WrongNesting(page)));
        var text = Plain(Tools.Run("pdftotext", pdf, path => $"-layout {path} -"));
        Assert.All(Drafts.Stress.VerificationPoints, point => Assert.Contains(point.Id, text));
        Assert.Contains("Общество геотермальной энергетики", text);
    }

    private static string Markdown(IReadOnlyDictionary<string, byte[]> files) => Encoding.UTF8.GetString(files["specification.md"]);

    private static string Plain(string text) => text.Replace('\u00a0', ' ');

    private static double Number(string text) => double.Parse(text, System.Globalization.CultureInfo.InvariantCulture);
}
