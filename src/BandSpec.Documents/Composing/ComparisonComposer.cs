using System.Text.RegularExpressions;
using BandSpec.Core.Revisions;
using BandSpec.Core.Specifying;
using BandSpec.Documents.Charts;
using BandSpec.Documents.Model;
using BandSpec.Documents.Printing;
using Figure = BandSpec.Documents.Model.Figure;

namespace BandSpec.Documents.Composing;

/// <summary>A comparison as blocks: the answer, what changed, which of it moved most, both bands in one chart, and every figure that moved.</summary>
internal sealed partial class ComparisonComposer(Comparison comparison, IReadOnlyList<Cause> causes)
{
    /// <summary>The file of the chart.</summary>
    public const string ChartFile = "comparison-band.svg";

    /// <summary>Texts up to this many letters, such as a figure with its unit, are not broken across lines.</summary>
    private const int LongestWhole = 12;

    private int chapters;
    private int tables;

    /// <summary>Whether both bands are drawn; Markdown that stands alone has no place for a picture.</summary>
    public bool HasChart { get; init; } = true;

    public Document Compose(string program)
    {
        string old = ComparisonWords.NameOf(comparison.Old), now = ComparisonWords.NameOf(comparison.New);
        string subject = $"Comparison of {old} with {now}";
        Frame frame = new(
            subject, program, subject, "en", comparison.New.Application.Requirement.Identity.Date, $"{old} \u2192 {now}", "Comparison", program,
            "{page} of {pages}", "continued", new Stamp(Standing.Plain, "", ""));
        return new Document(frame, [.. Blocks(program)]);
    }

    private IEnumerable<Block> Blocks(string program)
    {
        yield return new TitleBlock(
            "Comparison", $"{ComparisonWords.NameOf(comparison.Old)} \u2192 {ComparisonWords.NameOf(comparison.New)}",
            comparison.New.Application.Requirement.Identity.Title,
            [new Fact("Old", Dated(comparison.Old)), new Fact("New", Dated(comparison.New)), new Fact("Program", program)]);
        yield return new Callout(
            comparison.LimitsDiffer ? Tone.Caution : Tone.Assurance, comparison.LimitsDiffer ? "Limits differ" : "No limit differs",
            [ComparisonWords.AnswerOf(comparison)]);
        yield return Summary();
        if (comparison.IsEmpty)
            yield break;
        foreach (Block block in Inputs().Concat(Causes()).Concat(Bands()).Concat(Outcome()).Concat(Points()))
            yield return block;
    }

    private static Phrase Dated(Specification specification)
    {
        string date = specification.Application.Requirement.Identity.Date.ToString("yyyy-MM-dd", null);
        return $"{ComparisonWords.NameOf(specification)} of {date}, {(specification.Feasible ? "feasible" : "not feasible")}";
    }

    private Headline Summary()
    {
        (string oldMargin, string margin) = MarginsOf(comparison);
        (string oldBand, string band) = (WidestBand(comparison.Old), WidestBand(comparison.New));
        (string oldPlan, string plan) = (PlanOf(comparison.Old), PlanOf(comparison.New));
        return new Headline(
        [
            new KeyFigure("Margin", Moved(oldMargin, margin), "of the design band, at least 1 is feasible"),
            new KeyFigure("Widest stated band", Moved(oldBand, band) + " %FS", "±, percent of each one's span"),
            new KeyFigure("Compensation temperatures", Moved(oldPlan, plan), "in the plan"),
        ]);
    }

    /// <summary>Both margins with the digits that tell them apart.</summary>
    private static (string Old, string New) MarginsOf(Comparison comparison) =>
        comparison.Outcome.FirstOrDefault(c => c is { Subject: FigureSubject.Margin, Name: "margin" })?.Shown is (string old, string now) ? (old, now)
            : (Figures.Short(comparison.Old.Bands.Margin), Figures.Short(comparison.New.Bands.Margin));

    private static string Moved(string old, string now) => old == now ? now : $"{old} \u2192 {now}";

    private static string WidestBand(Specification specification) => Figures.Short(specification.Bands.Regions.Max(r => r.Stated.Percent));

    private static string PlanOf(Specification specification) => Figures.Whole(specification.Choice.Plan.Temperatures.Count);

    private IEnumerable<Block> Inputs()
    {
        yield return Chapter("What changed");
        yield return comparison.Inputs.Count > 0
            ? Changes("Inputs", "Field", comparison.Inputs.Select(c => Row($"{c.Subject.ToString().ToLowerInvariant()}: {c.Name}", c)))
            : new Paragraph("The inputs are the same.");
        yield return new Paragraph(
            "Tighter for production: harder to make, fewer units pass or more work. Tighter for the customer: less error is promised. "
            + "A figure that only one of the two has, or that says nothing about a side, is neutral.", Voice.Fine);
    }

    private IEnumerable<Block> Causes()
    {
        if (causes.Count == 0)
            yield break;
        yield return Chapter("What moved most");
        yield return new Paragraph(
            "Each changed part swapped alone: the older inputs, solved again with that part of the newer. The figure is that of the band, the margins and the "
            + "acceptance limits that moved farthest.");
        yield return new Table(
            NextTable(), "Changed parts, the one that moved most first", [new Column("Part"), new Column("Moves alone"), new Column("Old"), new Column("New")],
            [.. causes.Select(cause => cause.Largest is { } largest
                ? new Row([ComparisonWords.NameOf(cause), Set(ComparisonWords.NameOf(largest)), Set(largest.Shown.Old), Set(largest.Shown.New)])
                : new Row([ComparisonWords.NameOf(cause), ComparisonWords.EffectOf(cause)!, "", ""]))]);
    }

    private IEnumerable<Block> Bands()
    {
        if (!HasChart)
            yield break;
        yield return Chapter("Both bands");
        bool sameSpan = comparison.Old.Application.Requirement.Pressure == comparison.New.Application.Requirement.Pressure;
        yield return new Figure(
            "Figure 1", "Allowed error and maximum band of both over temperature. Where the old lines run on the new, both are the same."
                + (sameSpan ? "" : " Errors are in percent of each one's own span."),
            $"Maximum band over temperature: at most ±{Widest(comparison.Old)} %FS in the old specification and ±{Widest(comparison.New)} %FS in the new.",
            new TwoBandsChart("temperature in °C", "error in %FS", Charted(comparison.Old), Charted(comparison.New)), ChartFile);
    }

    private static string Widest(Specification specification) => Figures.Short(specification.Bands.Regions.Max(r => r.Maximum.Percent));

    private static ChartedBand Charted(Specification specification) =>
        new(BandCurves.Of(specification), [.. specification.Choice.Plan.Temperatures.Select(t => t.Celsius)]);

    private IEnumerable<Block> Outcome()
    {
        IReadOnlyList<IGrouping<FigureSubject, FigureChange>> groups = ComparisonWords.OutcomeOf(comparison);
        if (groups.Count == 0)
            yield break;
        yield return Chapter("What that did");
        foreach (IGrouping<FigureSubject, FigureChange> changes in groups)
            yield return Changes(ComparisonWords.HeadingOf(changes.Key), "Figure", changes.Select(c => Row(ComparisonWords.NameOf(c), c)));
    }

    private IEnumerable<Block> Points()
    {
        IReadOnlyList<PointChange> points = ComparisonWords.PointsOf(comparison);
        if (points.Count == 0)
            yield break;
        yield return Chapter(ComparisonWords.HeadingOf(FigureSubject.Verification));
        yield return Changes(
            "Acceptance limits of the verification test", "Test point",
            points.Select(p => Row(p.Place, p.Shown.Old, p.Shown.New, p.ForProduction, p.ForCustomer)));
    }

    private Heading Chapter(string text) => new(1, Figures.Whole(++chapters), text);

    private string NextTable() => $"Table {++tables}";

    private Table Changes(string caption, string first, IEnumerable<Row> rows) => new(
        NextTable(), caption,
        [new Column(first), new Column("Old"), new Column("New"), new Column("Production"), new Column("Customer")], [.. rows]);

    private static Row Row(string name, FigureChange change) => Row(name, change.Shown.Old, change.Shown.New, change.ForProduction, change.ForCustomer);

    private static Row Row(string name, string? old, string? now, Bearing production, Bearing customer) =>
        new([Set(name), Set(old), Set(now), ComparisonWords.Of(production), ComparisonWords.Of(customer)]);

    /// <summary>A text with the typesetter's minus before its negative figures, a short one in one piece; a dash where there is none.</summary>
    private static string Set(string? text) => text is null ? "\u2013"
        : Minus().Replace(text.Length <= LongestWhole ? text.Replace(' ', '\u00a0') : text, "\u2212");

    [GeneratedRegex(@"(?<![\w.-])-(?=\d)")]
    private static partial Regex Minus();
}
