using BandSpec.Core.Characterizing;
using BandSpec.Core.Findings;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using BandSpec.Core.TestLimits;
using Xunit;

namespace BandSpec.Tests.Characterizing;

/// <summary>What a characterization decides: degrees, correlations, what is left out, who does not belong.</summary>
public sealed class CharacterizationTests
{
    [Fact]
    public void The_degrees_that_the_family_has_are_found()
    {
        Characterization found = Of(new SimulatedFamily(Families.Curved, 7) { Gaps = 0.1 }.Readings(3, 16));
        Assert.Equal(
            ["zero.0", "zero.1", "zero.2", "zero.3", "span.0", "span.1", "span.2", "bow.0"],
            found.Coefficients.Select(c => c.Name.ToString()));
        Assert.NotNull(found.PressureHysteresis);
        Assert.NotNull(found.ThermalHysteresis);
        Assert.Empty(found.SuspectUnits);
        Assert.Empty(found.SuspectReadings);
        Assert.All(found.DegreeSteps, step => Assert.Equal(step.Kept, step.Gain > 0));
        Assert.Contains(found.LeftOut, term => term.Term == "bow.1" && term.Reason.EndsWith("by Schwarz' criterion", StringComparison.Ordinal));
    }

    [Fact]
    public void A_shape_that_no_unit_was_read_for_is_left_out_with_the_reason()
    {
        Characterization found = Of(new SimulatedFamily(Families.Plain, 8).Readings(2, 6));
        Assert.Contains(
            new LeftOutTerm("s-shape.0", "no unit was read at 4 pressures or more, and a spread needs at least 3"), found.LeftOut);
    }

    [Fact]
    public void Hysteresis_that_was_not_looked_for_is_left_out_with_the_reason()
    {
        var rising = new SimulatedFamily(Families.Plain, 9).Readings(2, 6).Where(r => r.Direction == PressureDirection.Rising).ToList();
        Characterization found = Of(rising);
        Assert.Null(found.PressureHysteresis);
        Assert.Contains(found.LeftOut, term => term.Term == "pressure-hysteresis"
            && term.Reason == "no unit was read with rising and with falling pressure, and a spread needs at least 3");
    }

    [Fact]
    public void A_degree_beyond_the_temperatures_that_were_read_is_left_out()
    {
        double[] two = [25, 95];
        var readings = new SimulatedFamily(Families.Plain, 10).Readings(2, 8).Where(r => two.Contains(r.Temperature.Celsius)).ToList();
        Characterization found = Of(readings);
        Assert.Contains(found.LeftOut, term => term.Term == "zero.2"
            && term.Reason == "no unit was read at 3 temperatures or more, and a spread needs at least 3");
        Assert.Equal(1, found.Coefficients.Max(c => c.Name.Degree));
    }

    [Fact]
    public void One_lot_says_nothing_about_lots()
    {
        Characterization found = Of(new SimulatedFamily(Families.Plain, 11).Readings(1, 20), Families.PlainScope);
        Assert.Contains(new LeftOutTerm("lot-sigma", "all units are of one lot"), found.LeftOut);
        Assert.All(found.Coefficients, c => Assert.Equal(0, c.LotSigma.Value));
    }

    [Fact]
    public void A_clear_correlation_is_taken_in_and_nothing_else()
    {
        Platform linked = Families.Plain with { Correlations = [new CoefficientCorrelation(Families.Pair.First, Families.Pair.Second, 0.8)] };
        Characterization found = Of(new SimulatedFamily(linked, 12).Readings(3, 16));
        CorrelationEstimate only = Assert.Single(found.Correlations);
        Assert.Equal(Families.Pair, only.Pair);
        Assert.InRange(only.Value.Value, 0.65, 0.9);
    }

    /// <summary>Degrees that cannot describe the family: slopes at zero correlation promise much that no fit confirms.</summary>
    [Fact]
    public void A_correlation_that_no_fit_confirms_stays_out()
    {
        Characterization found = Of(DemoReadings.Family(), Families.OpenScope with
        {
            PinnedDegrees = new Dictionary<PressureShape, int>
            {
                [PressureShape.Zero] = 7, [PressureShape.Span] = 2, [PressureShape.Bow] = -1, [PressureShape.SShape] = -1,
            },
        });
        CorrelationEstimate only = Assert.Single(found.Correlations);
        Assert.Equal(Families.Pair, only.Pair);
        Assert.InRange(only.Value.Value, 0.2, 0.8);
    }

    [Fact]
    public void A_spoiled_unit_and_a_slip_are_named_and_left_out()
    {
        List<UnitReading> readings = [.. new SimulatedFamily(Families.Plain, 13).Readings(3, 16)];
        List<UnitReading> spoiled = [.. readings.Select(r => r.Unit == "005"
            ? r with { Error = PercentOfSpan.FromPercent(r.Error.Percent + (0.09 * (r.Temperature.Celsius - 25))) }
            : r)];
        int slip = spoiled.FindIndex(r => r.Unit == "020");
        spoiled[slip] = spoiled[slip] with { Error = PercentOfSpan.FromPercent(spoiled[slip].Error.Percent + 0.5) };
        Characterization found = Of(spoiled);
        SuspectUnit unit = Assert.Single(found.SuspectUnits);
        Assert.Equal(("005", "zero.1"), (unit.Unit, unit.Term));
        Assert.True(unit.SpreadWith > unit.SpreadWithout);
        SuspectReading reading = Assert.Single(found.SuspectReadings);
        Assert.Equal(spoiled[slip], reading.Reading);
        Assert.InRange(reading.Residual, 0.4, 0.6);
        Assert.Equal(47, found.Units);
        UnitCurve strange = Assert.Single(found.SuspectCurves);
        Assert.Equal("005", strange.Unit);
        Assert.InRange(strange.Coefficients[1] - found.Coefficients[1].Units.Mean.Value, 4, 14);
        Assert.Equal(spoiled.Count(r => r.Unit != "005") - 1, found.Readings);
        Assert.Equal(48, Of(spoiled, Families.OpenScope with { KeepSuspects = true }).Units);
    }

    [Fact]
    public void Too_few_units_are_a_finding()
    {
        Checked<Characterization> found = Characterization.Of(new SimulatedFamily(Families.Plain, 14).Readings(1, 2), Families.OpenScope);
        Finding finding = Assert.Single(found.Findings);
        Assert.Equal("few-units", finding.Rule);
    }

    [Fact]
    public void The_answer_does_not_depend_on_the_order_of_the_units()
    {
        IReadOnlyList<UnitReading> readings = new SimulatedFamily(Families.Plain, 15).Readings(3, 8);
        Characterization forward = Of(readings, Families.PlainScope);
        Characterization backward = Of([.. readings.GroupBy(r => r.Unit).Reverse().SelectMany(unit => unit)], Families.PlainScope);
        Assert.Equal(forward.Deviance, backward.Deviance, 6);
    }

    [Fact]
    public void Thermal_sides_are_known_only_where_a_temperature_was_reached_from_both()
    {
        double[] visits = [25, -40, 25, 125, 25, 60];
        UnitReading[] readings = [.. visits.Select(celsius => new UnitReading
        {
            Lot = "", Unit = "1", Temperature = Temperature.FromCelsius(celsius), PressureFraction = 0, Direction = null, Cycle = 1,
            Error = PercentOfSpan.FromPercent(0), Line = 1,
        })];
        Assert.Equal([0, 0, -1, 0, 1, 0], ThermalHistory.Sides(readings, Temperature.FromCelsius(25)));
    }

    private static Characterization Of(IReadOnlyList<UnitReading> readings, CharacterizationScope? scope = null) =>
        Characterization.Of(readings, scope ?? Families.OpenScope).Value!;
}
