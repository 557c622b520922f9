using BandSpec.Documents.Model;
using BandSpec.Documents.Printing;

namespace BandSpec.Documents.Composing;

/// <summary>Every decision rule beside the others, what a rule that cannot be met would need, and what accepted units are worth in the field.</summary>
internal static class DecisionSection
{
    private const string Percent = "%FS", PerMillion = "ppm";

    public static IEnumerable<Block> Compose(Composition c, DecisionView decisions)
    {
        yield return c.Section("decision.heading");
        yield return new Paragraph(c.Words["decision.text"]);
        yield return c.Table(c.Words["decision.table"],
            [
                new Column(c.Words["decision.rule"]), new Column(c.Words["decision.guard"], Align.Left, Percent),
                new Column(c.Words["decision.consumer"], Align.Decimal, PerMillion, c.Words.Plain("decision.point")),
                new Column(c.Words["decision.producer"], Align.Decimal, PerMillion, c.Words.Plain("decision.point")),
                new Column(c.Words["decision.consumer"], Align.Decimal, PerMillion, c.Words.Plain("decision.unit")),
                new Column(c.Words["decision.producer"], Align.Decimal, PerMillion, c.Words.Plain("decision.unit")),
                new Column(c.Words["decision.rejected"], Align.Decimal, PerMillion, c.Words.Plain("decision.unit")),
                new Column(c.Words["decision.cost"], Align.Decimal, decisions.Currency),
            ],
            decisions.Rules.Select(r => Row(c, r)), c.Words["decision.remark"]);
        RuleView[] impossible = [.. decisions.Rules.Where(r => r.Impossible.Length > 0)];
        if (impossible.Length > 0)
            yield return new Bullets([.. impossible.Select(r => c.Words.Say(
                "decision.impossible", ("rule", Name(c, r).Plain), ("points", r.Impossible), ("needed", r.Needed)))]);
        yield return c.Section("decision.field-heading");
        yield return new Paragraph(c.Words["decision.field-text"]);
        yield return new Paragraph(c.Words["decision.promise"]);
        yield return new Facts(
        [
            new Fact(c.Words["decision.any"], decisions.AnyUnit),
            new Fact(c.Words["decision.accepted"], decisions.AcceptedUnit.Length > 0 ? decisions.AcceptedUnit : "–"),
            .. decisions.AtLimit is { } limit
                ? [new Fact(c.Words.Say("decision.at-limit", ("point", limit.Point), ("reading", limit.Reading)), limit.Leaving)]
                : Array.Empty<Fact>(),
            new Fact(c.Words["decision.pointwise"], decisions.AtOnePlace),
        ]);
    }

    private static Row Row(Composition c, RuleView r)
    {
        Phrase name = r.Chosen ? Name(c, r).In(Lettering.Bold) : Name(c, r);
        string guard = r.GuardFrom == r.GuardTo ? r.GuardTo : $"{r.GuardFrom} – {r.GuardTo}";
        return new([name, guard, r.PointConsumer, r.PointProducer, r.Consumer, r.Producer, r.Rejected, r.Cost]);
    }

    private static Phrase Name(Composition c, RuleView r) => c.Words.Say("decision." + r.Key, ("parameter", r.Parameter));
}
