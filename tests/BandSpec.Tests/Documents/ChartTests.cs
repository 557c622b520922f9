using System.Xml.Linq;
using BandSpec.Documents.Charts;
using BandSpec.Documents.Model;
using Xunit;

namespace BandSpec.Tests.Documents;

/// <summary>Charts as SVG; the same pictures go on paper.</summary>
public sealed class ChartTests
{
    private static readonly XNamespace Svg = "http://www.w3.org/2000/svg";

    public static TheoryData<string> Files => [.. All.Select(f => f.FileName)];

    private static IEnumerable<Figure> All => SampleCharts.Figures().Prepend(SampleCharts.BandFigure());

    [Theory]
    [MemberData(nameof(Files))]
    public void Is_well_formed_and_told_in_words(string file)
    {
        var root = Draw(file);
        Assert.Equal("A <title> & more", root.Element(Svg + "title")!.Value);
        Assert.Equal("words", root.Element(Svg + "desc")!.Value);
        Assert.Equal("img", root.Attribute("role")!.Value);
    }

    [Theory]
    [MemberData(nameof(Files))]
    public void Stays_inside_its_picture(string file)
    {
        var root = Draw(file);
        var (width, height) = (Number(root.Attribute("width")!.Value[..^2]), Number(root.Attribute("height")!.Value[..^2]));
        foreach (var text in root.Descendants(Svg + "text"))
        {
            Assert.InRange(Number(text.Attribute("x")!.Value), 0, width);
            Assert.InRange(Number(text.Attribute("y")!.Value), 0, height);
        }
    }

    [Fact]
    public void Lines_are_told_apart_without_their_colour()
    {
        var lines = new[] { ChartStyle.Allowed, ChartStyle.Design, ChartStyle.Maximum, ChartStyle.Typical, ChartStyle.PlanLine };
        Assert.Equal(lines.Length, lines.Select(l => (l.Width, string.Join(' ', l.Dashes ?? []))).Distinct().Count());
    }

    [Fact]
    public void Neighbouring_fillings_differ_in_lightness_or_hatching() => Assert.All(Enumerable.Range(0, 15), i =>
    {
        Tile one = Tile.Of(i), next = Tile.Of(i + 1);
        Assert.True(Math.Abs(Luma(one) - Luma(next)) > 35 || one.Slope != next.Slope, $"{i} and {i + 1}");
    });

    [Fact]
    public void A_minus_is_a_minus_and_the_decimal_sign_is_the_language_s()
    {
        var text = SvgPen.Draw(SampleCharts.Band with { DecimalSign = "," }, "t", "d");
        Assert.Contains(">\u22120,5<", text);
        Assert.DoesNotContain(">-", text);
        Assert.DoesNotContain(">0.5<", text);
    }

    [Fact]
    public void A_letter_that_cannot_be_set_is_an_error_and_no_message_inside_the_picture()
    {
        var chart = SampleCharts.Band with { Words = SampleCharts.Band.Words with { Across = "温度" } };
        Assert.ThrowsAny<Exception>(() => BandSpec.Documents.Pdf.PdfWriter.Write(
            new Document(SampleDocument.Frame(), [new Figure("F", "c", "a", chart, "f.svg")]), BandSpec.Documents.Pdf.PageGeometry.A4,
            SampleDocument.Facts()));
    }

    private static XElement Draw(string file) =>
        XDocument.Parse(SvgPen.Draw(All.Single(f => f.FileName == file).Chart, "A <title> & more", "words")).Root!;

    private static double Number(string text) => double.Parse(text, System.Globalization.CultureInfo.InvariantCulture);

    private static double Luma(Tile tile) => 0.299 * tile.Ground.R + 0.587 * tile.Ground.G + 0.114 * tile.Ground.B;
}
