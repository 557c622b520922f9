using BandSpec.Core.Characterizing;
using BandSpec.Core.Requirements;
using BandSpec.Documents.Charts;
using BandSpec.Documents.Model;
using BandSpec.Documents.Printing;

namespace BandSpec.Documents.Composing;

/// <summary>The report of a characterization as blocks: what it rests on, the statistics, the curves, what was left out and why.</summary>
internal static class CharacterizationComposer
{
    private const string Percent = "%FS";

    public static Document Compose(Characterization found, ReportHead head) => new(
        head.Frame("Characterization of a sensor family"),
        [
            new TitleBlock("Characterization report", head.Family, "", head.Identity),
            .. Summary(found),
            .. Statistics(found),
            .. Curves(found),
            .. LeftOut(found),
            .. Method(found),
        ]);

    private static IEnumerable<Block> Summary(Characterization found)
    {
        yield return new Headline(
        [
            new KeyFigure("Units", Figures.Whole(found.Units), found.Lots == 1 ? "of 1 lot" : $"of {found.Lots} lots"),
            new KeyFigure("Readings", Figures.Whole(found.Readings), "used"),
            new KeyFigure("Repeatability", $"{Figures.Short(found.Repeatability.Value)} {Percent}", "of a reading, standard deviation"),
            new KeyFigure("Suspects", Figures.Whole(found.SuspectUnits.Count + found.SuspectReadings.Count), found.Scope.KeepSuspects ? "named, kept" : "named, left out"),
        ]);
    }

    private static IEnumerable<Block> Statistics(Characterization found)
    {
        string confidence = Figures.Given(100 * found.Scope.Confidence) + " %";
        yield return new Heading(1, "1", "Statistics");
        yield return new Paragraph(
            $"Coefficients of the raw error in %FS, restricted maximum likelihood; brackets hold {confidence} intervals. "
            + "Means and spreads of lots rest on the number of lots, however many units there are.");
        yield return new Table("Table 1", "Coefficients of the raw error",
            [
                new Column("Coefficient"), new Column("Mean", Align.Left, Percent), new Column("Spread within a lot", Align.Left, Percent),
                new Column("Spread of lots", Align.Left, Percent),
            ],
            [.. found.Coefficients.Select(c => new Row([c.Name.ToString(), Figures.WithRange(c.Units.Mean), Figures.WithRange(c.Units.Sigma), Figures.WithRange(c.LotSigma)]))]);
        yield return new Table("Table 2", "What compensation cannot remove",
            [new Column("Term"), new Column("Mean", Align.Left, Percent), new Column("Spread", Align.Left, Percent)],
            [
                Hysteresis("Pressure hysteresis, full width", found.PressureHysteresis),
                Hysteresis("Thermal hysteresis, half width", found.ThermalHysteresis),
                new Row(["Repeatability", "", Figures.WithRange(found.Repeatability)]),
            ]);
        if (found.Correlations.Count > 0)
            yield return new Table("Table 3", "Correlated coefficients", [new Column("Coefficients"), new Column("Correlation")],
                [.. found.Correlations.Select(c => new Row([$"{c.Pair.First} and {c.Pair.Second}", Figures.WithRange(c.Value)]))]);
    }

    private static Row Hysteresis(string name, SpreadEstimate? estimate) => estimate is null
        ? new Row([name, "not measured", ""])
        : new Row([name, Figures.WithRange(estimate.Mean), Figures.WithRange(estimate.Sigma)]);

    private static IEnumerable<Block> Curves(Characterization found)
    {
        yield return new Heading(1, "2", "Curves and residuals");
        yield return Curve(found, PressureShape.Zero, "Figure 1", "Zero of every unit over temperature", "raw-zero.svg");
        yield return Curve(found, PressureShape.Span, "Figure 2", "Span error of every unit over temperature", "raw-span.svg");
        yield return Residuals(found, r => r.Temperature.Celsius, "temperature", "°C", "Figure 3", "residuals.svg");
        yield return Residuals(found, r => r.PressureFraction, "pressure", "pressure fraction", "Figure 4", "residuals-pressure.svg");
    }

    /// <summary>At each setting the units stand side by side in their order, so that one that scatters more is seen.</summary>
    private static Figure Residuals(Characterization found, Func<UnitReading, double> at, string word, string across, string label, string file)
    {
        double[] settings = [.. found.Curves.SelectMany(c => c.Residuals).Select(r => at(r.Reading)).Distinct().Order()];
        double width = 0.6 * settings.Zip(settings.Skip(1), (low, high) => high - low).DefaultIfEmpty(1).Min();
        List<Spot> residuals = [.. found.Curves.SelectMany((curve, i) => curve.Residuals.Select(r => new Spot(
            at(r.Reading) + (width * (((i + 0.5) / found.Curves.Count) - 0.5)), r.Residual)))];
        return new Figure(
            label, $"What the curves leave of the readings, over {word}: at each setting the units side by side; dashed: two standard deviations of a reading",
            $"{residuals.Count} residuals over {word} with a standard deviation of {Figures.Short(found.Repeatability.Value)} {Percent}.",
            new ResidualChart(across, $"residual in {Percent}", residuals, found.Repeatability.Value), file);
    }

    private static Figure Curve(Characterization found, PressureShape shape, string label, string caption, string file)
    {
        FamilyCurves curves = FamilyCurves.Of(found, shape);
        return new Figure(
            label, caption, $"{curves.Units.Count} curves from {Figures.Given(curves.Mean[0].X)} to {Figures.Given(curves.Mean[^1].X)} °C; the mean runs from "
                + $"{Figures.Short(curves.Mean[0].Y)} to {Figures.Short(curves.Mean[^1].Y)} {Percent}.",
            new CurvesChart(
                new CurvesWords("°C", $"error in {Percent}", "units", "left out", "mean", "mean ± 3 standard deviations over lots"),
                curves.Units, curves.LeftOut, curves.Mean, curves.Above, curves.Below), file);
    }

    private static IEnumerable<Block> LeftOut(Characterization found)
    {
        yield return new Heading(1, "3", "What was left out, and why");
        List<Phrase> items = [.. LeftOutTerm.Grouped(found.LeftOut).Select(term => (Phrase)$"{term.Term}: {term.Reason}.")];
        items.AddRange(found.SuspectUnits.Select(unit => (Phrase)(
            $"Unit {unit.Unit}{(unit.Lot.Length > 0 ? $" of lot {unit.Lot}" : "")}: {unit.Term} is off by {Figures.Short(unit.Multiple)} standard deviations of the others; "
            + $"with it that spread would be {Figures.Short(unit.SpreadWith)} instead of {Figures.Short(unit.SpreadWithout)} {Percent}.")));
        items.AddRange(found.SuspectReadings.Select(slip => (Phrase)(
            $"Line {slip.Reading.Line}, unit {slip.Reading.Unit} at {slip.Reading.Temperature}: {Figures.Short(slip.Residual)} {Percent} from what the unit's other readings "
            + $"say, {Figures.Short(slip.Multiple)} standard deviations; it would move the unit's curve by {Figures.Short(slip.Shift)} {Percent}.")));
        items.AddRange(found.Scope.ExcludedUnits.Select(unit => (Phrase)$"Unit {unit}: left out by name."));
        yield return items.Count > 0 ? new Bullets(items) : new Paragraph("Nothing.");
    }

    private static IEnumerable<Block> Method(Characterization found)
    {
        yield return new Heading(1, "4", "How the degrees were chosen");
        if (found.DegreeSteps.Count == 0)
        {
            yield return new Paragraph("All degrees in temperature were fixed beforehand.");
            yield break;
        }

        yield return new Paragraph("Schwarz' criterion, units counted: a coefficient stays when minus twice the logarithm of the likelihood falls by more than ln(units) for each mean and spread.");
        yield return new Table("Table 4", "Decisions in order",
            [new Column("Shape"), new Column("Up to degree", Align.Decimal), new Column("Gain", Align.Decimal), new Column("Kept")],
            [.. found.DegreeSteps.Select(step => new Row(
                [new CoefficientName(step.Shape, 0).Word, Figures.Whole(step.Degree), Figures.Whole((long)Math.Round(step.Gain)), step.Kept ? "yes" : "no"]))]);
    }
}
