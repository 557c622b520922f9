using BandSpec.Documents.Model;
using BandSpec.Documents.Printing;

namespace BandSpec.Documents.Composing;

/// <summary>The error budget: what the allowed error is spent on, and each term's figures by group.</summary>
internal static class BudgetChapter
{
    private const string Percent = "%FS";

    public static IEnumerable<Block> Compose(Composition c, int number)
    {
        yield return c.Chapter(number, "budget.heading");
        yield return new Paragraph(c.Words["budget.text"]);
        yield return c.Figure("budget.figure", c.Charts.Shares, "error-shares.svg");
        yield return c.Table(c.Words["budget.table"],
            [
                c.Column("term"), c.Column("region"), c.Column("mean", Align.Decimal, Percent), c.Column("sample", Align.Decimal, Percent),
                c.Column("long-run", Align.Decimal, Percent), c.Column("limit", Align.Decimal, "±" + Percent),
                c.Column("capability", Align.Decimal), c.Column("outside", Align.Decimal, "ppm"),
            ],
            TermGroups.All.SelectMany(group => Group(c, group)), c.Words.Say(
                "budget.table-remark", ("held", c.View.Terms.Any(t => t.Held))));
    }

    private static IEnumerable<Row> Group(Composition c, string group)
    {
        var derived = c.View.Derived.Where(d => d.Group == group).Select(d => Row(c, d));
        var terms = c.View.Terms.Where(t => t.Group == group).Select(t => Row(c, t));
        List<Row> rows = [.. derived, .. terms];
        return rows.Count == 0 ? rows : rows.Prepend(new Row([c.Words["group." + group]], RowKind.Section));
    }

    private static Row Row(Composition c, DerivedView d) =>
        new([c.Words["derived." + d.Key], Region(c, d.Region), "", "", "", d.Limit, "", ""]);

    private static Row Row(Composition c, TermView t)
    {
        var name = t.Name.Length > 0 ? (Phrase)t.Name : c.Words["term." + t.Key];
        if (t.Held) name += "\u00a0*";
        return new([name, Region(c, t.Region), t.Added, t.SigmaSample, t.SigmaLongRun, t.Limit, t.Capability, t.Outside]);
    }

    private static Phrase Region(Composition c, RegionView? region) => region is null ? c.Words["all-regions"] : c.Region(region);
}
