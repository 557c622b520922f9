using BandSpec.Documents.Model;
using BandSpec.Documents.Printing;

namespace BandSpec.Documents.Composing;

/// <summary>Why the answer is what it is: what fills the band, what would make a plan fit, and what an improvement buys.</summary>
internal static class DiagnosisChapter
{
    private const string Percent = "%FS";

    public static IEnumerable<Block> Compose(Composition c, int number, DiagnosisView found)
    {
        yield return c.Chapter(number, "diagnosis.heading");
        foreach (var paragraph in c.Words.Paragraphs("diagnosis.text", ("hopeless", found.IsHopeless))) yield return new Paragraph(paragraph);
        yield return c.Table(c.Words["diagnosis.parts"],
            [
                c.Column("term"), c.Column("part", Align.Decimal, Percent, "with-plan"), c.Column("share-of-design", Align.Decimal, "%", "with-plan"),
                c.Column("part", Align.Decimal, Percent, "with-perfect"), c.Column("share-of-design", Align.Decimal, "%", "with-perfect"),
            ],
            found.Parts.Select(p => new Row([Name(c, p), p.Plan, p.PlanShare, p.Floor, p.FloorShare])), c.Words["diagnosis.parts-remark"]);
        foreach (var block in Remedies(c, found)) yield return block;
        if (c.View.LacksGains) yield return new Paragraph(c.Words["diagnosis.gains-left-out"]);
        if (found.Gains.Count == 0) yield break;
        yield return c.Section("diagnosis.gains");
        yield return c.Table(c.Words["diagnosis.gains-table"],
            [c.Column("input"), c.Column("step", Align.Right), c.Column("gain", Align.Decimal)],
            found.Gains.Select(g => new Row([((Phrase)g.Input).In(Lettering.Code), g.Step, g.Gain])), c.Words["diagnosis.gains-remark"]);
    }

    private static IEnumerable<Block> Remedies(Composition c, DiagnosisView found)
    {
        if (found.Remedies.Count == 0) yield break;
        yield return c.Section("diagnosis.remedies");
        yield return new Paragraph(c.Words.Say("diagnosis.remedies-text", ("some", found.AnySuffices), ("complete", found.IsComplete)));
        yield return c.Table(c.Words["diagnosis.remedies-table"],
            [c.Column("figure"), c.Column("now", Align.Right), c.Column("needed", Align.Right), c.Column("remark")],
            found.Remedies.Select(r => Row(c, r)), c.Words["diagnosis.remedies-remark"]);
    }

    private static Row Row(Composition c, RemedyView r)
    {
        var name = c.Words["change." + r.Key];
        if (r.Region is not null) name += $", {c.Region(r.Region)}";
        var remark = r.Suffices ? c.Words.Say("diagnosis.suffices", ("temperatures", r.Plan))
            : r.IsAtEnd ? c.Words["diagnosis.at-end"] : c.Words.Say("diagnosis.never", ("furthest", r.Furthest));
        return new Row([name, r.Before, r.Suffices ? r.After : "\u2013", remark]);
    }

    private static Phrase Name(Composition c, PartView part) => part.Name.Length > 0 ? part.Name : c.Words["term." + part.Key];
}
