using System.Globalization;
using BandSpec.Documents.Model;

namespace BandSpec.Documents.Composing;

/// <summary>Where each unit is read for compensation, and the chamber run that takes.</summary>
internal static class PlanChapter
{
    public static IEnumerable<Block> Compose(Composition c, int number)
    {
        yield return c.Chapter(number, "plan.heading");
        yield return new Paragraph(c.Words["plan.text"]);
        yield return new Facts([c.Fact("points"), c.Fact("degrees"), c.Fact("chamber"), c.Fact("station"), c.Fact("search")]);
        yield return c.Table(c.Words["plan.table"],
            [
                c.Column("temperature", Align.Decimal, "°C"), c.Column("pressures", unit: c.View.Range.Unit),
                c.Column("readings", Align.Right),
            ],
            c.View.Plan.Stays.Select(s => new Row([s.Temperature, s.Pressures, s.Count.ToString(CultureInfo.InvariantCulture)])));
        yield return c.Figure("plan.figure", c.Charts.Chamber, "chamber-run.svg");
    }
}
