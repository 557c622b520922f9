using BandSpec.Core.Characterizing;
using BandSpec.Documents.Charts;
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
            yield return Region(found);
    }

    private static Figure Region(AgeingStatistics found)
    {
        (double least, double most) = (found.Region.Min(p => p.ActivationEnergy), found.Region.Max(p => p.ActivationEnergy));
        (double flattest, double steepest) = (found.Region.Min(p => p.TimeExponent), found.Region.Max(p => p.TimeExponent));
        (Estimate energy, Estimate exponent) = (found.ActivationEnergy, found.TimeExponent);
        return new Figure(
            "Figure 1", $"Activation energy and time exponent: jointly from {Figures.Short(least)} to {Figures.Short(most)} eV and from {Figures.Short(flattest)} to {Figures.Short(steepest)}",
            $"The joint region of both reaches from {Figures.Short(least)} to {Figures.Short(most)} eV and from {Figures.Short(flattest)} to {Figures.Short(steepest)}.",
            new RegionChart(
                new RegionWords(
                    "activation energy, eV", "time exponent", $"joint {Figures.Given(100 * found.Scope.Confidence)} % region", "estimate", "interval of each alone"),
                [.. found.Region.Select(p => new Spot(p.ActivationEnergy, p.TimeExponent))], new Spot(energy.Value, exponent.Value),
                new Spot(energy.Lower, exponent.Lower), new Spot(energy.Upper, exponent.Upper)),
            "region.svg");
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
        double[] fractions = [.. found.Drifts.Select(d => d.PressureFraction).Distinct().Order()];
        if (fractions.Length > 0)
        {
            int before = found.Region.Count > 0 ? 1 : 0;
            yield return Chart(found, fractions[0], before + 1, "drift-low.svg");
            if (fractions.Length > 1)
                yield return Chart(found, fractions[^1], before + 2, "drift-high.svg");
        }

        yield return new Table("Table 3", "Mean drift of the units since their beginning",
            [new Column("Storage"), new Column("Time"), new Column("Pressure fraction", Align.Decimal), new Column("Units", Align.Decimal), new Column("Mean drift", Align.Decimal, Percent)],
            [.. found.Drifts.GroupBy(d => (d.Storage, d.Stored, d.PressureFraction)).OrderBy(g => g.Key.Storage.Celsius).ThenBy(g => g.Key.Stored.Hours)
                .ThenBy(g => g.Key.PressureFraction).Select(g => new Row(
                    [g.Key.Storage.ToString(), g.Key.Stored.ToString(), Figures.Given(g.Key.PressureFraction), Figures.Whole(g.Count()), Figures.Short(g.Average(d => d.Drift))]))]);
    }

    private static Figure Chart(AgeingStatistics found, double fraction, int number, string file)
    {
        IReadOnlyList<StorageDrift> storages = DriftCurves.Of(found, fraction);
        return new Figure(
            $"Figure {number}", $"Mean drift of the stored units at pressure fraction {Figures.Given(fraction)}, and the estimated law",
            $"Mean drift over time at {string.Join(", ", storages.Select(s => s.Label))}; the longest time is {Figures.Given(storages.Max(s => s.Means[^1].X))} h.",
            new DriftChart(new DriftWords("h", $"drift in {Percent}", "mean of the units", "law"), storages), file);
    }
}
