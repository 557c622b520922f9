using BandSpec.Core.Characterizing;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using BandSpec.Tests.Numerics;
using Xunit;

namespace BandSpec.Tests.Characterizing;

/// <summary>Drift statistics from simulated storage tests of known truth.</summary>
public sealed class AgeingStatisticsTests(ITestOutputHelper output)
{
    private const double Repeatability = 0.01;

    private static readonly Ageing Truth = new(
        Given.Spread(0.06, 0.03), Given.Spread(-0.05, 0.025), Given.C(125), Duration.FromHours(1000), 0.6, 0.5);

    private static readonly AgeingScope Scope = new() { TestTemperature = Given.C(125), TestDuration = Duration.FromHours(1000) };

    [Fact]
    public void The_truth_lies_inside_the_intervals_of_most_tests()
    {
        const int Repetitions = 24;
        int[] hits = new int[6];
        for (int seed = 0; seed < Repetitions; seed++)
        {
            AgeingStatistics found = Of(new SimulatedStorage(Truth, Repeatability, 100 + seed).Readings(12, 105, 125, 150), Scope);
            bool[] inside =
            [
                found.ActivationEnergy.Covers(0.6), found.TimeExponent.Covers(0.5), found.Zero.Mean.Covers(0.06),
                found.Span.Mean.Covers(-0.05), found.Zero.Sigma.Covers(0.03), found.Span.Sigma.Covers(0.025),
            ];
            for (int i = 0; i < hits.Length; i++)
                hits[i] += inside[i] ? 1 : 0;
        }

        output.WriteLine($"inside of {Repetitions}: {string.Join(", ", hits)}");

        // 95 % of 24 is 23; fewer than 20 of 24 has a probability of 0.6 % for each figure.
        Assert.All(hits, hit => Assert.InRange(hit, 20, Repetitions));
    }

    [Fact]
    public void The_region_surrounds_the_estimate_and_lies_on_one_level()
    {
        AgeingStatistics found = Of(new SimulatedStorage(Truth, Repeatability, 3).Readings(12, 105, 125, 150), Scope);
        Assert.Equal(48, found.Region.Count);
        Assert.InRange(found.ActivationEnergy.Value, found.Region.Min(p => p.ActivationEnergy), found.Region.Max(p => p.ActivationEnergy));
        Assert.True(found.Region.Max(p => p.TimeExponent) > found.TimeExponent.Upper, "the joint region reaches beyond each interval");
    }

    [Fact]
    public void Drift_that_hardly_shows_leaves_the_figures_wide_open()
    {
        Ageing faint = Truth with { Zero = Given.Spread(0.004, 0.002), Span = Given.Spread(0, 0.002) };
        AgeingStatistics found = Of(new SimulatedStorage(faint, Repeatability, 2).Readings(8, 105, 125), Scope);
        Assert.True(found.ActivationEnergy.Covers(0.6), found.ActivationEnergy.ToString());
        Assert.True(found.ActivationEnergy.Upper - found.ActivationEnergy.Lower > 0.5);
    }

    /// <summary>No drift at all: every activation energy agrees, so that one has to be assumed.</summary>
    [Fact]
    public void Drift_that_does_not_show_needs_an_activation_energy_to_assume()
    {
        Ageing none = Truth with { Zero = Given.Spread(0, 0), Span = Given.Spread(0, 0) };
        List<DriftReading> readings = new SimulatedStorage(none, Repeatability, 9).Readings(4, 105, 125);
        Assert.Equal("open-energy", Assert.Single(AgeingStatistics.Of(readings, Scope).Findings).Rule);
        AgeingStatistics found = Of(readings, Scope with { AssumedActivationEnergy = 0.7 });
        Assert.Equal(new Estimate(0.7, 0.7, 0.7), found.ActivationEnergy);
        Assert.Equal("the readings set no limits to it; 0.7 eV is assumed", Assert.Single(found.LeftOut).Reason);
        Assert.True(found.Zero.Mean.Covers(0), found.Zero.Mean.ToString());
    }

    [Fact]
    public void One_storage_temperature_needs_an_activation_energy_to_assume()
    {
        List<DriftReading> readings = new SimulatedStorage(Truth, Repeatability, 4).Readings(20, 125);
        Assert.Equal("one-temperature", Assert.Single(AgeingStatistics.Of(readings, Scope).Findings).Rule);
        AgeingStatistics found = Of(readings, Scope with { AssumedActivationEnergy = 0.7 });
        Assert.Equal(new Estimate(0.7, 0.7, 0.7), found.ActivationEnergy);
        Assert.Equal("all units were stored at one temperature; 0.7 eV is assumed", Assert.Single(found.LeftOut).Reason);
        Assert.True(found.TimeExponent.Covers(0.5));
        Assert.Empty(found.Region);
    }

    [Fact]
    public void A_planned_test_at_another_temperature_sharpens_the_activation_energy_most()
    {
        List<DriftReading> readings = new SimulatedStorage(Truth, Repeatability, 5).Readings(12, 125, 150);
        AgeingStatistics cold = WithTestAt(readings, 85), hot = WithTestAt(readings, 125);
        Assert.Equal(cold.Errors, hot.Errors);
        Assert.True(cold.ErrorsWithPlannedTest!.ActivationEnergy < hot.ErrorsWithPlannedTest!.ActivationEnergy);
        Assert.True(hot.ErrorsWithPlannedTest.ActivationEnergy < hot.Errors.ActivationEnergy);
    }

    [Fact]
    public void The_same_test_made_twice_halves_every_variance()
    {
        List<DriftReading> readings = new SimulatedStorage(Truth, Repeatability, 6).Readings(12, 125);
        AgeingScope scope = Scope with
        {
            AssumedActivationEnergy = 0.6,
            PlannedTest = new PlannedAgeingTest(
                12, Given.C(125), [Duration.FromHours(168), Duration.FromHours(500), Duration.FromHours(1000)], [0, 0.5, 1]),
        };
        AgeingStatistics found = Of(readings, scope);
        (DriftErrors now, DriftErrors then) = (found.Errors, found.ErrorsWithPlannedTest!);
        Close.Relative(now.TimeExponent / Math.Sqrt(2), then.TimeExponent, 1e-9);
        Close.Relative(now.ZeroMean / Math.Sqrt(2), then.ZeroMean, 1e-9);
        Close.Relative(now.SpanSigma / Math.Sqrt(2), then.SpanSigma, 1e-9);
    }

    private static AgeingStatistics WithTestAt(List<DriftReading> readings, double celsius) => Of(readings, Scope with
    {
        PlannedTest = new PlannedAgeingTest(12, Given.C(celsius), [Duration.FromHours(1000), Duration.FromHours(3000)], [0, 1]),
    });

    private static AgeingStatistics Of(List<DriftReading> readings, AgeingScope scope) => AgeingStatistics.Of(readings, scope).Value!;
}
