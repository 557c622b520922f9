using BandSpec.Documents.Model;
using BandSpec.Documents.Pdf;
using BandSpec.Documents.Pdf.Layout;
using Xunit;

namespace BandSpec.Tests.Documents;

/// <summary>The first stage of drawing: where things come to stand.</summary>
public sealed class LayoutTests
{
    public static TheoryData<string> Papers => ["A4", "Letter"];

    [Fact]
    public void A_line_is_never_wider_than_its_room_and_no_letter_is_lost()
    {
        var text = string.Join(' ', Enumerable.Range(1, 40).Select(i => new string('w', i)));
        var lines = LineBreaker.Break(text, Look.Body, 120);
        Assert.All(lines, line => Assert.True(line.Width <= 120));
        Assert.Equal(text.Replace(" ", "", StringComparison.Ordinal), Letters(lines).Replace(" ", "", StringComparison.Ordinal));
    }

    [Theory]
    [InlineData("one two", 0, new[] { "one", "two" })]
    [InlineData("25\u00a0bar and", 0, new[] { "25\u00a0bar", "and" })]
    [InlineData("first\nsecond", 500, new[] { "first", "second" })]
    [InlineData("error-band", 30, new[] { "error-", "band" })]
    [InlineData("\u22125-3", 1e9, new[] { "\u22125-3" })]
    [InlineData("", 100, new[] { "" })]
    public void Lines_break_where_they_may(string text, double width, string[] expected) =>
        Assert.Equal(expected, LineBreaker.Break(text, Look.Body, width).Select(line => Letters([line])));

    [Theory]
    [MemberData(nameof(Papers))]
    public void Nothing_stands_outside_the_text_area(string paper)
    {
        var page = Page(paper);
        foreach (var mark in DocumentLayout.Lay(SampleDocument.Full(), page).SelectMany(marks => marks))
        {
            var (left, top, right, bottom) = Extent(mark);
            Assert.True(
                left >= page.Left - 0.01 && right <= page.Right + 0.01 && top >= page.Top - 0.01 && bottom <= page.Bottom + 0.01,
                mark.ToString());
        }
    }

    [Theory]
    [MemberData(nameof(Papers))]
    public void Texts_do_not_overlap(string paper)
    {
        foreach (var marks in DocumentLayout.Lay(SampleDocument.Full(), Page(paper)))
        {
            var boxes = marks.OfType<TextMark>().Select(Extent).OrderBy(b => b.Top).ToList();
            for (int i = 0; i < boxes.Count; i++)
                for (int k = i + 1; k < boxes.Count && boxes[k].Top < boxes[i].Bottom - 0.5; k++)
                    Assert.False(
                        boxes[k].Left < boxes[i].Right - 0.5 && boxes[i].Left < boxes[k].Right - 0.5, $"{boxes[i]} and {boxes[k]}");
        }
    }

    [Fact]
    public void A_table_over_pages_repeats_its_heading_as_decoration_and_keeps_every_row()
    {
        var pages = DocumentLayout.Lay(SampleDocument.Full(), PageGeometry.A4);
        var points = pages.SelectMany(p => p).OfType<TextMark>().Where(t => t.Tag is { Kind: TagKind.TH } && t.Text.StartsWith('V') && t.Text.Length == 3).Select(t => t.Text);
        Assert.Equal(Enumerable.Range(1, 60).Select(i => $"V{i:00}"), points);
        var again = pages.SelectMany(p => p).OfType<TextMark>().Where(t => t.Tag is null && t.Text == "Nominal");
        Assert.NotEmpty(again);
    }

    [Fact]
    public void A_row_taller_than_a_page_is_split_between_lines_and_nothing_is_cut()
    {
        var words = DocumentLayout.Lay(
            SampleDocument.Full(), PageGeometry.A4).SelectMany(p => p).OfType<TextMark>().SelectMany(t => t.Text.Split(' ')).ToHashSet();
        Assert.All(Enumerable.Range(1, 1500), i => Assert.Contains($"word{i}", words));
    }

    [Fact]
    public void A_heading_is_never_the_last_thing_on_a_page()
    {
        for (int lines = 40; lines < 60; lines++)
        {
            Block[] blocks = [
                .. Enumerable.Range(1, lines).Select(i => (Block)new Paragraph($"line {i}")), new Heading(1, "1", "Heading"),
                new Paragraph("after")];
            var pages = DocumentLayout.Lay(new Document(SampleDocument.Frame(), blocks), PageGeometry.A4);
            Assert.All(pages, page => Assert.NotEqual("Heading", page.OfType<TextMark>().Last().Text.Split('\u00a0')[^1]));
        }
    }

    private static PageGeometry Page(string paper) => paper == "A4" ? PageGeometry.A4 : PageGeometry.Letter;

    private static string Letters(IEnumerable<Line> lines) => string.Concat(lines.SelectMany(l => l.Spans).Select(s => s.Text));

    private static (double Left, double Top, double Right, double Bottom) Extent(Mark mark) => mark switch
    {
        // Small letters without ascenders and descenders: lines may lie close, letters may not touch.
        TextMark t => (t.X, t.Y - 0.66 * t.Size, t.X + BandSpec.Documents.Fonts.Typeface.Of(t.Face).Width(t.Text, t.Size), t.Y),
        RuleMark r => (r.X1, r.Y1, r.X2, r.Y2),
        FillMark f => (f.Area.X, f.Area.Y, f.Area.X + f.Area.Width, f.Area.Bottom),
        ChartMark c => (c.Area.X, c.Area.Y, c.Area.X + c.Area.Width, c.Area.Bottom),
        _ => (PageGeometry.Letter.Right, PageGeometry.Letter.Top, PageGeometry.A4.Left, PageGeometry.Letter.Top),
    };
}
