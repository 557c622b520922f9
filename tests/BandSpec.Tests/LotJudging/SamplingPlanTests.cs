using BandSpec.Core.LotJudging;
using BandSpec.Tests.Numerics;

using Xunit;

namespace BandSpec.Tests.LotJudging;

public sealed class SamplingPlanTests
{
    /// <summary>Index to observe for a 95 % lower limit of 4/3 and 5/3: recomputed (check-values section 5).</summary>
    [Theory]
    [InlineData(10, 2.224821, 2.767205)]
    [InlineData(30, 1.724019, 2.147189)]
    [InlineData(200, 1.460661, 1.822848)]
    public void Index_to_observe(int units, double fourThirds, double fiveThirds)
    {
        Assert.Equal(fourThirds, SamplingStep.Of(units, 4.0 / 3, 0.95).Observe, 6e-7);
        Assert.Equal(fiveThirds, SamplingStep.Of(units, 5.0 / 3, 0.95).Observe, 6e-7);
    }

    /// <summary>The chance to pass, against 20 000 samples of a centred process.</summary>
    [Fact]
    public void Chance_to_pass_agrees_with_sampling()
    {
        SamplingStep step = SamplingStep.Of(30, 1.67, 0.95, expected: 2.2);
        var random = new Random(9);
        int passed = 0;
        for (int k = 0; k < 20_000; k++)
        {
            BandSpec.Core.Numerics.Moments m = new(0);
            for (int i = 0; i < 30; i++)
                m.Add(Draws.Normal(random));
            passed += ((3 * 2.2) - Math.Abs(m.Mean)) / (3 * m.StandardDeviation) >= step.Observe ? 1 : 0;
        }
        Assert.Equal(step.Chance!.Value, passed / 20_000.0, 0.015);
    }

    [Fact]
    public void The_smallest_sample_is_the_smallest()
    {
        SamplingStep step = SamplingStep.Smallest(1.67, 0.95, expected: 2.2, chance: 0.9)!;
        Assert.True(step.Chance >= 0.9);
        Assert.True(SamplingStep.Of(step.Units - 1, 1.67, 0.95, 2.2).Chance < 0.9);
        Assert.Null(SamplingStep.Smallest(1.67, 0.95, expected: 1.67, chance: 0.9));
        Assert.Null(SamplingStep.Smallest(1.67, 0.95, expected: 1.6701, chance: 0.9));
    }

    [Fact]
    public void Numbers_out_of_range_are_refused()
    {
        Assert.Throws<ArgumentOutOfRangeException>(() => SamplingStep.Of(1, 1.67, 0.95));
        Assert.Throws<ArgumentOutOfRangeException>(() => SamplingStep.Of(10, 0, 0.95));
        Assert.Throws<ArgumentOutOfRangeException>(() => SamplingStep.Of(10, 1.67, 1));
    }
}
