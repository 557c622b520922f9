using BandSpec.Documents.Model;
using BandSpec.Documents.Printing;

namespace BandSpec.Documents.Composing;

/// <summary>The band by region, and over pressure where the margin is smallest.</summary>
internal static class BandChapter
{
    private const string Percent = "%FS", Celsius = "°C";

    public static IEnumerable<Block> Compose(Composition c, int number)
    {
        yield return c.Chapter(number, "band.heading");
        yield return new Paragraph(c.Words["band.text"]);
        IReadOnlyList<Column> columns =
        [
            c.Column("region"), c.Column("allowed", Align.Decimal, "±" + Percent, "band"),
            c.Column("maximum", Align.Decimal, "±" + Percent, "band"), c.Column("typical", Align.Decimal, "±" + Percent, "band"),
            c.Column("margin", Align.Decimal), c.Column("worst-pressure", Align.Decimal, c.View.Range.Unit, "least-margin"),
            c.Column("worst-temperature", Align.Decimal, Celsius, "least-margin"), c.Column("holds", Align.Centre),
        ];
        yield return c.Table(c.Words["band.table"], columns, c.View.Regions.Select(r => Row(c, r)), c.Words["band.table-remark"]);
        yield return c.Figure("band.pressure-figure", c.Charts.Pressure, "error-over-pressure.svg");
    }

    private static Row Row(Composition c, RegionView r)
    {
        var allowed = r.AllowedAtEnd.Length == 0 ? r.Allowed : $"{r.AllowedAtStart} … {r.AllowedAtEnd}";
        var holds = c.Words[r.Holds ? "word.yes" : "word.no"];
        return new Row([c.Region(r), allowed, r.Maximum, r.Typical, r.Margin, r.WorstPressure, r.WorstTemperature, holds]);
    }
}
