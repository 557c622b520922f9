using BandSpec.Core.Characterizing;
using BandSpec.Documents.Model;
using BandSpec.Documents.Printing;

namespace BandSpec.Documents.Composing;

/// <summary>The report of an ageing test as blocks.</summary>
internal static class AgeingComposer
{
    private const string Percent = "%FS";

    public static Document Compose(AgeingStatistics found, ReportHead head) => new(
        head.Frame("Drift of a sensor family"),
        [
            new TitleBlock("Ageing report", head.Family, "", head.Identity),
            new Headline(
            [
                new KeyFigure("Units", Figures.Whole(found.Units), "stored"),
                new KeyFigure("Readings", Figures.Whole(found.Readings), "used"),
                new KeyFigure("Activation energy", $"{Figures.Short(found.ActivationEnergy.Value)} eV", "Arrhenius"),
                new KeyFigure("Time exponent", Figures.Short(found.TimeExponent.Value), "of the time law"),
            ]),
            .. Drift(found),
            .. Planned(found),
            .. Units(found),
        ]);

    private static IEnumerable<Block> Drift(AgeingStatistics found)
    {
        yield return new Heading(1, "1", "Drift");
        yield return new Paragraph(
            $"Drift after {found.Scope.TestDuration} at {found.Scope.TestTemperature}; brackets hold {Figures.Given(100 * found.Scope.Confidence)} % intervals.");
        yield return new Table("Table 1", "Drift of the family",
            [new Column("Figure"), new Column("Mean"), new Column("Spread")],
            [
                new Row([$"Zero, {Percent}", Figures.WithRange(found.Zero.Mean), Figures.WithRange(found.Zero.Sigma)]),
                new Row([$"Span, {Percent}", Figures.WithRange(found.Span.Mean), Figures.WithRange(found.Span.Sigma)]),
                new Row(["Activation energy, eV", Figures.WithRange(found.ActivationEnergy), ""]),
                new Row(["Time exponent", Figures.WithRange(found.TimeExponent), ""]),
                new Row([$"Repeatability, {Percent}", "", Figures.WithRange(found.Repeatability)]),
            ]);
        if (found.LeftOut.Count > 0)
            yield return new Bullets([.. found.LeftOut.Select(term => (Phrase)$"{term.Term}: {term.Reason}.")]);
        if (found.Region.Count > 0)
            yield return new Paragraph(
                $"Jointly, the activation energy reaches from {Figures.Short(found.Region.Min(p => p.ActivationEnergy))} to {Figures.Short(found.Region.Max(p => p.ActivationEnergy))} eV "
                + $"and the time exponent from {Figures.Short(found.Region.Min(p => p.TimeExponent))} to {Figures.Short(found.Region.Max(p => p.TimeExponent))}.");
    }

    private static IEnumerable<Block> Planned(AgeingStatistics found)
    {
        if (found is not { Scope.PlannedTest: { } planned, ErrorsWithPlannedTest: { } then })
            yield break;
        yield return new Heading(1, "2", "What the planned test would add");
        yield return new Paragraph(
            $"{planned.Units} units at {planned.Storage}, read after {string.Join(", ", planned.Times)}: standard errors now and then.");
        DriftErrors now = found.Errors;
        Row Of(string name, double before, double after) => new([name, Figures.Short(before), Figures.Short(after)]);
        yield return new Table("Table 2", "Standard errors", [new Column("Figure"), new Column("Now", Align.Decimal), new Column("Then", Align.Decimal)],
            [
                Of("Activation energy, eV", now.ActivationEnergy, then.ActivationEnergy),
                Of("Time exponent", now.TimeExponent, then.TimeExponent),
                Of($"Mean drift of zero, {Percent}", now.ZeroMean, then.ZeroMean),
                Of($"Mean drift of span, {Percent}", now.SpanMean, then.SpanMean),
            ]);
    }

    private static IEnumerable<Block> Units(AgeingStatistics found)
    {
        yield return new Heading(1, found.ErrorsWithPlannedTest is null ? "2" : "3", "Drift by storage");
        yield return new Table("Table 3", "Mean drift of the units since their beginning",
            [new Column("Storage"), new Column("Time"), new Column("Pressure fraction", Align.Decimal), new Column("Units", Align.Decimal), new Column("Mean drift", Align.Decimal, Percent)],
            [.. found.Drifts.GroupBy(d => (d.Storage, d.Stored, d.PressureFraction)).OrderBy(g => g.Key.Storage.Celsius).ThenBy(g => g.Key.Stored.Hours)
                .ThenBy(g => g.Key.PressureFraction).Select(g => new Row(
                    [g.Key.Storage.ToString(), g.Key.Stored.ToString(), Figures.Given(g.Key.PressureFraction), Figures.Whole(g.Count()), Figures.Short(g.Average(d => d.Drift))]))]);
    }
}
