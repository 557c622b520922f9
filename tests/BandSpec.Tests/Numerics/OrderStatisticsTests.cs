using BandSpec.Core.Numerics;

using Xunit;

namespace BandSpec.Tests.Numerics;

public sealed class OrderStatisticsTests
{
    /// <summary>The largest of n lies above the p-quantile with probability 1 − pⁿ: 97.5 % for 99.865 % takes 2731 values.</summary>
    [Fact]
    public void The_largest_bounds_an_outer_percentile_from_2731_values_on()
    {
        Assert.Null(OrderStatistics.UpperRank(2730, Percentiles.High, 0.975));
        Assert.Equal(2731, OrderStatistics.UpperRank(2731, Percentiles.High, 0.975));
        Assert.Equal(1, OrderStatistics.LowerRank(2731, Percentiles.Low, 0.975));
    }

    /// <summary>Median of ten: P(at most 8 of 10 below) = 0.98926, of 7 = 0.94531 (binomial, by hand), so the 9th value at 97.5 %.</summary>
    [Fact]
    public void Median_of_ten() => Assert.Equal((9, 2), (OrderStatistics.UpperRank(10, 0.5, 0.975), OrderStatistics.LowerRank(10, 0.5, 0.975)));
}
