using BandSpec.Core.LotJudging;
using BandSpec.Core.Numerics;
using BandSpec.Tests.Numerics;

using Xunit;

namespace BandSpec.Tests.LotJudging;

public sealed class CapabilityTests
{
    [Fact]
    public void Indices_are_those_of_the_plain_formulas()
    {
        var random = new Random(1);
        (double Error, string Lot)[] values = [.. Enumerable.Range(0, 120).Select(i => (0.1 + (i / 40 * 0.15) + (0.15 * Draws.Normal(random)), $"L{i / 40}"))];
        CharacteristicJudgement judged = Lots.JudgeOne(values);
        double mean = values.Average(v => v.Error);
        double within = Math.Sqrt(values.GroupBy(v => v.Lot).Sum(lot => lot.Sum(v => Math.Pow(v.Error - lot.Average(w => w.Error), 2))) / 117);
        double between = values.GroupBy(v => v.Lot).Sum(lot => 40 * Math.Pow(lot.Average(v => v.Error) - mean, 2)) / 2;
        double overall = Math.Sqrt((within * within) + ((between - (within * within)) / 40));
        Close.Relative(mean, judged.Mean, 1e-12);
        Close.Relative(1 / (3 * within), judged.Within!.Spread, 1e-12);
        Close.Relative((1 - mean) / (3 * within), judged.Within.Nearer, 1e-12);
        Close.Relative(1 / (3 * overall), judged.Overall!.Spread, 1e-12);
        Close.Relative((1 - mean) / (3 * overall), judged.Overall.Nearer, 1e-12);
        Assert.Equal((120, 3, 117), (judged.Count, judged.Lots, judged.Within.DegreesOfFreedom));
        Close.Relative(CapabilityLaw.SpreadLimit(judged.Within.Spread, 117, 0.95), judged.Within.SpreadLower, 1e-12);
    }

    /// <summary>Without lots the figures are those of check-values section 5: n = 30, index 1.67 has the lower limit 1.290691 (recomputed).</summary>
    [Fact]
    public void Lower_limit_of_one_lot()
    {
        double[] shape = [.. Enumerable.Range(1, 30).Select(i => NormalDistribution.Quantile((i - 0.5) / 30))];
        double s = Moments.Of(shape).StandardDeviation, sigma = 1 / (3 * 1.67);
        CharacteristicJudgement judged = Lots.JudgeOne(shape.Select(z => (z / s * sigma, "")));
        Assert.Equal(1.67, judged.Within!.Nearer, 1e-9);
        Assert.Equal(1.290691, judged.Within.NearerLower, 6e-7);
        Assert.Equal(1.348570, judged.Within.NearerLowerHere, 6e-7);
        Assert.True(judged.NormalityOverall!.IsPlausible);
    }

    /// <summary>When lots differ, the overall limit has far fewer degrees of freedom than readings, and covers as it says.</summary>
    [Fact]
    public void Lots_that_differ_widen_the_overall_limit()
    {
        const int Runs = 500, LotCount = 8, Each = 20;
        var random = new Random(4);
        double trueIndex = 1 / (3 * Math.Sqrt(0.01 + 0.01));
        int covered = 0;
        for (int run = 0; run < Runs; run++)
        {
            Moments[] lots = [.. Enumerable.Range(0, LotCount).Select(_ => Draws.Normal(random) * 0.1)
                .Select(shift => Moments.Of([.. Enumerable.Range(0, Each).Select(_ => shift + (0.1 * Draws.Normal(random)))]))];
            VarianceSplit split = VarianceSplit.Of(lots);
            var all = new Moments(0);
            foreach (Moments lot in lots)
                all.Add(lot);
            double z = (1 - Math.Abs(all.Mean)) / Math.Sqrt(split.LongRun) / 3;
            covered += CapabilityLaw.OneSidedLimit(z, split.LongRunCount, split.LongRunFreedom, 0.95) <= trueIndex ? 1 : 0;
        }
        Assert.InRange(covered / (double)Runs, 0.92, 0.99);
    }

    [Fact]
    public void Values_that_do_not_differ_are_infinitely_capable_or_not_at_all()
    {
        Assert.Equal(double.PositiveInfinity, Lots.JudgeOne([(0.5, ""), (0.5, "")]).Within!.Nearer);
        Assert.Equal(double.NegativeInfinity, Lots.JudgeOne([(1.5, ""), (1.5, "")]).Within!.Nearer);
        Assert.Null(Lots.JudgeOne([(0.5, "")]).Within);
    }

    [Fact]
    public void Units_to_add_are_just_enough()
    {
        CharacteristicJudgement judged = Lots.JudgeOne(Ideal(30, 2.0));
        CriterionJudgement sample = judged.Sample!;
        Assert.Equal(Standing.Met, sample.Standing);
        long n = 30 + sample.MoreUnits!.Value;
        Assert.True(CapabilityLaw.OneSidedLimit(2, n, 29.0 * n / 30, 0.95) >= 1.67);
        Assert.True(CapabilityLaw.OneSidedLimit(2, n - 1, 29.0 * (n - 1) / 30, 0.95) < 1.67);
        Assert.Equal((Standing.Proven, 0L), Standing0(Lots.JudgeOne(Ideal(400, 2.0)).Sample!));
        Assert.Equal((Standing.Missed, null), Standing0(Lots.JudgeOne(Ideal(30, 1.6)).Sample!));
        Assert.Equal((Standing.Refuted, null), Standing0(Lots.JudgeOne(Ideal(300, 1.0)).Sample!));
    }

    [Fact]
    public void Without_lots_nothing_is_proven_over_lots()
    {
        CharacteristicJudgement judged = Lots.JudgeOne(Ideal(400, 2.0));
        Assert.Equal((Standing.Met, null), Standing0(judged.LongRun!));
        CharacteristicJudgement inLots = Lots.JudgeOne(Ideal(400, 2.0).Select((v, i) => (v.Item1, $"L{i % 4}")));
        Assert.Equal(Standing.Proven, inLots.LongRun!.Standing);
    }

    private static (Standing, long?) Standing0(CriterionJudgement judgement) => (judgement.Standing, judgement.MoreUnits);

    /// <summary>Values spaced like a normal law, scaled to an exact index.</summary>
    private static IEnumerable<(double, string)> Ideal(int n, double index)
    {
        double[] shape = [.. Enumerable.Range(1, n).Select(i => NormalDistribution.Quantile((i - 0.5) / n))];
        double s = Moments.Of(shape).StandardDeviation;
        return shape.Select(z => (z / s / (3 * index), ""));
    }
}
