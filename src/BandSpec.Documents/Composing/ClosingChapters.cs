using BandSpec.Documents.Model;

namespace BandSpec.Documents.Composing;

/// <summary>Cautions, and where the figures come from.</summary>
internal static class ClosingChapters
{
    public static IEnumerable<Block> Cautions(Composition c, int number) =>
        [c.Chapter(number, "cautions.heading"), new Bullets(c.Words.Paragraphs("cautions"))];

    public static IEnumerable<Block> Method(Composition c, int number, bool attached, ReleaseMark? release)
    {
        yield return c.Chapter(number, "method.heading");
        foreach (var paragraph in c.Words.Paragraphs("method.text", ("attached", attached))) yield return new Paragraph(paragraph);
        if (release is not null)
        {
            yield return new Paragraph(c.Words.Say("method.release", SpecificationComposer.About(release)));
            yield return new Paragraph(((Phrase)release.Digest).In(Lettering.Code));
        }
        if (c.View.Inputs.Count == 0) yield break;
        yield return c.Table(c.Words["method.table"], [c.Column("file"), c.Column("digest")],
            c.View.Inputs.Select(i => new Row([i.Name, ((Phrase)i.Digest).In(Lettering.Code)])));
    }
}
