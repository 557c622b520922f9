using BandSpec.Core.Allocating;
using BandSpec.Core.Bands;
using BandSpec.Core.Numerics;
using BandSpec.Core.Requirements;
using BandSpec.Core.TestLimits;
using Xunit;

namespace BandSpec.Tests.TestLimits;

public sealed class VerificationPointTests
{
    private static readonly CompensationPlan Plan = CompensationPlan.Of(
        [Given.C(-20), Given.C(25), Given.C(90), Given.C(150)], 3, 3, Given.C(25), Given.Station.PressurePoints);

    [Fact]
    public void The_test_visits_reference_ends_and_the_worst_temperature_rising_then_falling()
    {
        IReadOnlyList<VerificationPoint> points = PointsOf(Given.Requirement);
        double[] temperatures = [.. points.Select(p => p.Temperature.Celsius).Distinct()];
        Assert.Equal(temperatures.Order(), temperatures);
        Assert.Subset(temperatures.ToHashSet(), new HashSet<double> { -20, 25, 150 });
        Assert.Equal(
            [0, 0.25, 0.5, 0.75, 1, 0.75, 0.5, 0.25, 0],
            points.Where(p => p.Temperature == Given.C(25)).Select(p => p.PressureFraction));
        Assert.Equal(points.Count, points.Select(p => p.Id).Distinct().Count());
    }

    [Fact]
    public void Acceptance_limits_lie_inside_the_guarded_tolerance_and_on_the_outputs_steps()
    {
        OutputSignal output = Given.Requirement.Output;
        foreach (VerificationPoint p in PointsOf(Given.Requirement))
        {
            double half = (p.Tolerance.Percent - p.GuardBand.Percent) * output.Span / 100;
            Assert.True(p.Lower >= p.Nominal - half - 1e-12 && p.Upper <= p.Nominal + half + 1e-12);
            // One step of 0.01 %FS and one of the output is all that rounding may cost.
            double lost = (0.01 * output.Span / 100) + output.Step!.Value;
            Assert.True(p.Lower <= p.Nominal - half + lost + 1e-12 && p.Upper >= p.Nominal + half - lost - 1e-12);
            Assert.Equal(0, Math.IEEERemainder(p.Lower, output.Step.Value), 1e-12);
            Assert.Equal(0, Math.IEEERemainder(p.Upper, output.Step.Value), 1e-12);
        }
    }

    [Fact]
    public void A_continuous_output_gets_limits_in_whole_steps_of_the_span()
    {
        Requirement requirement = Given.Requirement with
        {
            Output = new OutputSignal(SignalKind.Current, "mA", 4, 20, null, null, null),
        };
        foreach (VerificationPoint p in PointsOf(requirement))
            Assert.Equal(0, Math.IEEERemainder((p.Upper - p.Nominal) * 100 / 16, 0.01), 1e-9);
    }

    [Fact]
    public void A_falling_output_has_the_same_limits_turned_over()
    {
        Requirement rising = Given.Requirement with { Output = new OutputSignal(SignalKind.Current, "mA", 4, 20, null, null, null) };
        Requirement falling = Given.Requirement with { Output = new OutputSignal(SignalKind.Current, "mA", 20, 4, null, null, null) };
        foreach ((VerificationPoint up, VerificationPoint down) in PointsOf(rising).Zip(PointsOf(falling)))
        {
            Assert.Equal(24, up.Nominal + down.Nominal, 1e-12);
            Assert.Equal(24, up.Lower + down.Upper, 1e-12);
            Assert.Equal(up.ConsumerRisk, down.ConsumerRisk, 1e-12);
        }
    }

    [Fact]
    public void A_guard_band_trades_consumers_for_producers_risk()
    {
        IReadOnlyList<VerificationPoint> simple = PointsOf(Given.Requirement with { Test = new VerificationRules(0, null) });
        IReadOnlyList<VerificationPoint> guarded = PointsOf(Given.Requirement with { Test = new VerificationRules(1, null) });
        foreach ((VerificationPoint s, VerificationPoint g) in simple.Zip(guarded))
        {
            Assert.Equal(s.Tolerance, g.Tolerance);
            Assert.True(g.ConsumerRisk <= s.ConsumerRisk);
            Assert.True(g.ProducerRisk >= s.ProducerRisk);
        }
    }

    /// <summary>A guard band wider than the tolerance leaves an empty interval, and an empty interval accepts nothing.</summary>
    [Fact]
    public void Limits_turned_over_accept_nothing()
    {
        (decimal lower, decimal upper) = AcceptanceLimits.Of(Given.Requirement, 0.5, -0.2);
        Assert.True(lower > upper);
        Interval accepted = AcceptanceLimits.InPercent(Given.Requirement.Output, 0.5, lower, upper);
        Assert.True(accepted.IsEmpty);
        Assert.Equal(0, ConformityRisk.Of(0, 0.1, 0.02, Interval.Symmetric(0.5), accepted).Consumer);
    }

    private static IReadOnlyList<VerificationPoint> PointsOf(Requirement requirement)
    {
        Application application = Given.Application(requirement);
        BandMap bands = BandMap.Of(application, Plan);
        return VerificationPoint.AllOf(application, Plan, bands, Allocation.Of(application, Plan, bands));
    }
}
