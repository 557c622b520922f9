using BandSpec.Documents.Charts;
using BandSpec.Documents.Judging;
using BandSpec.Tests.Numerics;
using Xunit;

namespace BandSpec.Tests.Documents;

/// <summary>Histograms of a lot.</summary>
public sealed class ValueBinsTests
{
    [Fact]
    public void Every_value_is_in_a_bin_and_bins_join()
    {
        var random = new Random(3);
        double[] values = [.. Enumerable.Range(0, 1000).Select(_ => 0.3 * Draws.Normal(random))];
        IReadOnlyList<ValueBin> bins = ValueBins.Of(values, reach: 10);
        Assert.Equal(100, bins.Sum(b => b.Share), 1e-9);
        Assert.All(bins, b => Assert.Equal(100.0 * values.Count(v => v >= b.From && v < b.To) / 1000, b.Share, 1e-9));
        Assert.All(bins.Zip(bins.Skip(1)), pair => Assert.Equal(pair.First.To, pair.Second.From, 1e-12));
        // Freedman and Diaconis for a normal law: 2·1.349σ/∛n.
        Assert.Equal(2 * 1.349 * 0.3 / 10, bins[0].To - bins[0].From, 0.01);
    }

    [Fact]
    public void Steps_of_the_output_make_no_comb()
    {
        // Every step of 0.1 holds as many values: so has every bin but the last, whatever the width.
        double[] values = [.. Enumerable.Range(0, 1200).Select(i => 0.1 * (i % 60))];
        IReadOnlyList<ValueBin> bins = ValueBins.Of(values, reach: 10);
        Assert.True(bins.Count > 5);
        Assert.All(bins.SkipLast(1), b => Assert.Equal(bins[0].Share, b.Share, 1e-9));
    }

    [Theory]
    [InlineData(new double[] { 0.4 })]
    [InlineData(new[] { 0.4, 0.4, 0.4 })]
    public void Values_that_are_all_alike_fill_one_bin(double[] values) => Assert.Equal(100, Assert.Single(ValueBins.Of(values, 1)).Share);

    [Fact]
    public void Values_beyond_the_reach_count_in_the_shares_but_have_no_bin() =>
        Assert.Equal(75, ValueBins.Of([0, 0.1, 0.2, 50], reach: 1).Sum(b => b.Share), 1e-9);
}
