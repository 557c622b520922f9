using BandSpec.Documents.Model;
using BandSpec.Documents.Printing;

namespace BandSpec.Documents.Composing;

/// <summary>How a unit is accepted: the decision rule, the criteria, and the limits in the output's unit.</summary>
internal static class TestChapter
{
    private const string Percent = "%FS", PerMillion = "ppm";

    public static IEnumerable<Block> Compose(Composition c, int number)
    {
        yield return c.Chapter(number, "test.heading");
        yield return new Callout(Tone.Note, c.Words["test.rule-title"], [c.Words["test.rule"]]);
        yield return c.Section("test.criteria");
        yield return new Paragraph(c.Words["test.criteria-text"]);
        yield return c.View.Points.Count == 0 ? new Paragraph(c.Words["test.none"]) : Limits(c);
        if (c.View.LacksDecisions) yield return new Paragraph(c.Words["test.decisions-left-out"]);
        foreach (Block block in c.View.Decisions is { } decisions ? DecisionSection.Compose(c, decisions) : [])
            yield return block;
    }

    private static Table Limits(Composition c)
    {
        var unit = c.View.Output.Unit;
        return c.Table(c.Words["test.table"],
            [
                c.Column("point"), c.Column("temperature", Align.Decimal, "°C"), c.Column("pressure", Align.Decimal, c.View.Range.Unit),
                c.Column("direction"),
                c.Column("lower", Align.Decimal, unit, "limits"), c.Column("nominal", Align.Decimal, unit, "limits"),
                c.Column("upper", Align.Decimal, unit, "limits"),
                c.Column("tolerance", Align.Decimal, "±" + Percent), c.Column("guard-band", Align.Decimal, Percent),
                c.Column("consumer", Align.Decimal, PerMillion, "risk"), c.Column("producer", Align.Decimal, PerMillion, "risk"),
            ],
            c.View.Points.Select(p => Row(c, p)), c.Words["test.table-remark"]);
    }

    private static Row Row(Composition c, PointView p) => new(
    [
        p.Id, c.Shown(p.Temperature), c.Shown(p.Pressure), c.Words["direction." + p.Direction], c.Shown(p.Lower), c.Shown(p.Nominal),
        c.Shown(p.Upper),
        c.Shown(p.Tolerance), c.Shown(p.GuardBand), c.Shown(p.ConsumerRisk), c.Shown(p.ProducerRisk),
    ]);
}
