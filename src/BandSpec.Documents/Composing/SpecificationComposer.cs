using BandSpec.Documents.Model;

namespace BandSpec.Documents.Composing;

/// <summary>The whole specification as blocks: page one, then the chapters that carry the detail.</summary>
internal static class SpecificationComposer
{
    public static Document Compose(Composition c, DateOnly date, string language, Standing standing, bool attached) => new(
        Frame(c, date, language, standing),
        [
            .. FrontPage.Compose(c),
            new PageBreak(),
            .. ApplicationChapter.Compose(c, 1),
            .. BandChapter.Compose(c, 2),
            .. BudgetChapter.Compose(c, 3),
            .. PlanChapter.Compose(c, 4),
            .. TestChapter.Compose(c, 5),
            .. ClosingChapters.Cautions(c, 6),
            .. ClosingChapters.Method(c, 7, attached),
        ]);

    private static Frame Frame(Composition c, DateOnly date, string language, Standing standing)
    {
        var words = c.Words;
        var stamp = standing switch
        {
            Standing.Refused => new Stamp(standing, words.Plain("stamp-refused"), words.Plain("stamp-refused-sentence")),
            Standing.Draft => new Stamp(standing, words.Plain("stamp-draft"), words.Plain("stamp-draft-sentence")),
            _ => new Stamp(standing, "", ""),
        };
        return new Frame(
            c.View.Identity.Title, c.View.Identity.PreparedBy, words.Plain("subject"), language, date,
            words.Plain("running-left"), words.Plain("running-right"), words.Plain("footer"), words.Plain("page-of"),
            words.Plain("continued"), stamp);
    }
}
