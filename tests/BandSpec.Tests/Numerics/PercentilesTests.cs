using BandSpec.Core.Numerics;

using Xunit;

namespace BandSpec.Tests.Numerics;

public sealed class PercentilesTests
{
    [Theory]
    [InlineData(0.5, 25)]
    [InlineData(0.2, 10)]
    [InlineData(0.3, 15)]
    [InlineData(0.001, 10)]
    [InlineData(0.999, 40)]
    public void Ranks_are_interpolated(double p, double expected) => Assert.Equal(expected, Percentiles.Of([10, 20, 30, 40], p), 1e-12);

    [Fact]
    public void One_reading_is_every_percentile() => Assert.Equal(7, Percentiles.Of([7], 0.3));

    /// <summary>On an ideal normal sample the percentile method is the normal formula: Pp 4/3, Ppk 1.</summary>
    [Fact]
    public void Normal_readings_give_the_normal_indices()
    {
        double[] sorted = [.. Enumerable.Range(1, 20_001).Select(i => NormalDistribution.Quantile(i / 20_002.0))];
        (double pp, double ppk) = Percentiles.Capability(
            Percentiles.Of(sorted, Percentiles.Low), Percentiles.Of(sorted, 0.5), Percentiles.Of(sorted, Percentiles.High), new(-5, 3));
        Assert.Equal(4.0 / 3, pp, 1e-4);
        Assert.Equal(1, ppk, 1e-4);
    }

    /// <summary>An exponential law with known percentiles: the lower side has room, the upper decides.</summary>
    [Fact]
    public void Skewed_readings_are_judged_by_their_own_tails()
    {
        double low = -Math.Log(1 - Percentiles.Low), median = Math.Log(2), high = -Math.Log(Percentiles.Low);
        (double pp, double ppk) = Percentiles.Capability(low, median, high, new(-1, 10));
        Assert.Equal(11 / (high - low), pp, 1e-12);
        Assert.Equal((10 - median) / (high - median), ppk, 1e-12);
    }

    [Fact]
    public void Outer_percentiles_need_740_readings() => Assert.Equal(740, Percentiles.SmallestSample);
}
