using BandSpec.Core.LotJudging;
using BandSpec.Tests.Numerics;

using Xunit;

namespace BandSpec.Tests.LotJudging;

public sealed class ShapeTests
{
    /// <summary>An output in steps of a fifth of the spread: its ties alone would look non-normal at 2000 readings.</summary>
    [Fact]
    public void Steps_of_the_output_are_not_taken_for_another_law()
    {
        var random = new Random(8);
        double[] stepped = [.. Enumerable.Range(0, 2000).Select(_ => Math.Round(Draws.Normal(random) * 5) / 5 / 10)];
        CharacteristicJudgement judged = Lots.JudgeOne(stepped.Select(v => (v, "")));
        Assert.True(judged.NormalityOverall!.IsPlausible);
        Assert.True(BandSpec.Core.Numerics.AndersonDarling.Of([.. stepped.Order()])!.Value.Probability < 0.001);
    }

    [Fact]
    public void Skewed_values_are_judged_by_percentiles()
    {
        var random = new Random(6);
        CharacteristicJudgement judged = Lots.JudgeOne(Enumerable.Range(0, 300).Select(_ => (-0.1 * Math.Log(1 - random.NextDouble()), "")));
        Assert.False(judged.NormalityOverall!.IsPlausible);
        Assert.True(judged.Sample!.ByPercentiles);
        Assert.Equal(judged.ByPercentiles!.Nearer, judged.Sample.Observed);
        Assert.True(judged.ByPercentiles.ExtremesStand);
        Assert.Null(judged.ByPercentiles.NearerLower);
    }

    /// <summary>With enough readings order statistics prove what no normal formula may: the true percentile index is 1.41 here.</summary>
    [Fact]
    public void Many_skewed_values_can_prove_a_capability()
    {
        var random = new Random(6);
        IEnumerable<(double, string)> values = Enumerable.Range(0, 6000).Select(i => (-0.1 * Math.Log(1 - random.NextDouble()), $"L{i % 3}"));
        CharacteristicJudgement judged = Lots.JudgeOne(values);
        double trueIndex = (1 - (0.1 * Math.Log(2))) / (0.1 * (-Math.Log(BandSpec.Core.Numerics.Percentiles.Low) - Math.Log(2)));
        Assert.InRange(judged.ByPercentiles!.NearerLower!.Value, 1.2, trueIndex);
        Assert.InRange(judged.ByPercentiles.Nearer, 1.3, 1.7);
    }

    [Fact]
    public void Lots_that_differ_are_normal_within_and_not_over_all()
    {
        var random = new Random(12);
        CharacteristicJudgement judged = Lots.JudgeOne(Enumerable.Range(0, 200).Select(i => ((i % 2 * 0.6) + (0.05 * Draws.Normal(random)), $"L{i % 2}")));
        Assert.True(judged.NormalityWithin!.IsPlausible);
        Assert.False(judged.NormalityOverall!.IsPlausible);
        Assert.True(judged.LongRun!.ByPercentiles);
        Assert.False(judged.Sample!.ByPercentiles);
    }

    [Fact]
    public void Outliers_are_named_and_stay()
    {
        var random = new Random(3);
        CharacteristicJudgement judged = Lots.JudgeOne([.. Enumerable.Range(0, 99).Select(_ => (0.1 * Draws.Normal(random), "")), (1.2, "")]);
        Outlier outlier = Assert.Single(judged.Outliers);
        Assert.Equal("U100", outlier.Serial);
        Assert.Equal(1.2, outlier.Value, 1e-9);
        Assert.Equal((100, 1), (judged.Count, judged.OutsideCount));
        Assert.InRange(judged.OutsideFraction.Lower, 0.0002, 0.0003);
    }

    [Fact]
    public void A_bounded_sample_is_drawn_evenly()
    {
        var kept = new KeptValues(1000);
        for (int i = 0; i < 100_000; i++)
            kept.Add(i, 0);
        Assert.Equal((1000, 100_000, false), (kept.Values.Count, kept.Met, kept.IsComplete));
        // A mean of 1000 ranks scatters by 100 000/√12/√1000 = 913.
        Assert.Equal(50_000, kept.Values.Average(), 3 * 913.0);
        Assert.Equal(1000, kept.Values.Distinct().Count());
    }

    [Fact]
    public void A_run_chart_condenses_without_losing_values()
    {
        var chart = new RunChart();
        for (int i = 1; i <= 10_000; i++)
            chart.Add(i);
        Assert.InRange(chart.Stretches.Count, RunChart.MostStretches / 2, RunChart.MostStretches);
        Assert.Equal(10_000, chart.Stretches.Sum(s => s.Count));
        Assert.Equal((1, 10_000), (chart.Stretches[0].Smallest, chart.Stretches[^1].Largest));
        Assert.Equal(5000.5, chart.Stretches.Sum(s => s.Count * s.Mean) / 10_000, 1e-9);
        Assert.Empty(new RunChart().Stretches);
    }
}
