using BandSpec.Documents.Model;

namespace BandSpec.Documents.Composing;

/// <summary>Page one answers: what is promised, over which range, how the band looks, and whether it holds.</summary>
internal static class FrontPage
{
    public static IEnumerable<Block> Compose(Composition c)
    {
        var identity = c.View.Identity;
        yield return new TitleBlock(c.Words["front.kind"], identity.Title, c.Words["front.subtitle"],
        [
            c.Fact("number", identity.Number), c.Fact("revision", identity.Revision), c.Fact("date", identity.Date),
            c.Fact("customer", identity.Customer), c.Fact("prepared-by", identity.PreparedBy), c.Fact("platform"),
        ]);
        yield return new Paragraph(c.Words["front.promise"], Voice.Lead);
        var margin = new KeyFigure(c.Words["front.margin"], c.View.Verdict.Margin, c.Words["front.margin-remark"]);
        yield return new Headline([Key(c, "allowed"), Key(c, "range"), margin, Key(c, "verdict")]);
        yield return c.Figure("front.figure", c.Charts.Band, "band-over-temperature.svg");
        yield return new Callout(
            c.View.Verdict.Feasible ? Tone.Assurance : Tone.Refusal, c.Words["front.answer-title"], c.Words.Paragraphs("front.answer"));
    }

    private static KeyFigure Key(Composition c, string key) =>
        new(c.Words["front." + key], c.Words[$"front.{key}-value"], c.Words[$"front.{key}-remark"]);
}
