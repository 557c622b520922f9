using System.Globalization;
using BandSpec.Documents.Model;

namespace BandSpec.Documents.Composing;

/// <summary>The whole specification as blocks: page one, then the chapters that carry the detail.</summary>
internal static class SpecificationComposer
{
    /// <summary>The number of the chapter that says why the answer is what it is; later ones move up where there is none.</summary>
    private const int Diagnosis = 6;

    public static Document Compose(Composition c, DateOnly date, DocumentOptions options, Standing standing, bool attached) => new(
        Frame(c, date, options, standing),
        [
            .. FrontPage.Compose(c),
            new PageBreak(),
            .. ApplicationChapter.Compose(c, 1),
            .. BandChapter.Compose(c, 2),
            .. BudgetChapter.Compose(c, 3),
            .. PlanChapter.Compose(c, 4),
            .. TestChapter.Compose(c, 5),
            .. c.View.Diagnosis is { } found ? DiagnosisChapter.Compose(c, Diagnosis, found) : [],
            .. ClosingChapters.Cautions(c, c.View.Diagnosis is null ? Diagnosis : Diagnosis + 1),
            .. ClosingChapters.Method(c, c.View.Diagnosis is null ? Diagnosis + 1 : Diagnosis + 2, attached, options.Release),
        ]);

    private static Frame Frame(Composition c, DateOnly date, DocumentOptions options, Standing standing)
    {
        var words = c.Words;
        var stamp = standing switch
        {
            Standing.Refused => new Stamp(standing, words.Plain("stamp-refused"), words.Plain("stamp-refused-sentence")),
            Standing.Draft => new Stamp(standing, words.Plain("stamp-draft"), words.Plain("stamp-draft-sentence")),
            Standing.Released => new Stamp(standing, words.Plain("stamp-released"), words.Say("stamp-released-sentence", About(options.Release!)).Plain),
            _ => new Stamp(standing, "", ""),
        };
        return new Frame(
            c.View.Identity.Title, c.View.Identity.PreparedBy, words.Plain("subject"), options.Language, date,
            words.Plain("running-left"), words.Plain("running-right"), words.Plain("footer"), words.Plain("page-of"),
            words.Plain("continued"), stamp);
    }

    /// <summary>A release as the words see it; its time is universal, so that the document does not depend on where it was made.</summary>
    internal static (string, object)[] About(ReleaseMark release) =>
    [
        ("by", release.By), ("on", release.At.UtcDateTime.ToString("yyyy-MM-dd", CultureInfo.InvariantCulture)),
        ("at", release.At.UtcDateTime.ToString("HH:mm:ss", CultureInfo.InvariantCulture)),
    ];
}
