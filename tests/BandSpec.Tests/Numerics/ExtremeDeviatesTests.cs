using BandSpec.Core.Numerics;

using Xunit;

namespace BandSpec.Tests.Numerics;

public sealed class ExtremeDeviatesTests
{
    /// <summary>
    /// Rosner (1983), 54 values, as shown in the NIST handbook 1.3.5.17.3: three outliers, 5.34, 5.42 and 6.01 (data and outcome from memory, not
    /// found; the first deviate 3.118906 remembered from there confirms the data).
    /// </summary>
    [Fact]
    public void Three_outliers_that_mask_each_other()
    {
        double[] values =
        [
            -0.25, 0.68, 0.94, 1.15, 1.20, 1.26, 1.26, 1.34, 1.38, 1.43, 1.49, 1.49, 1.55, 1.56, 1.58, 1.65, 1.69, 1.70, 1.76, 1.77, 1.81, 1.91,
            1.94, 1.96, 1.99, 2.06, 2.09, 2.10, 2.14, 2.15, 2.23, 2.24, 2.26, 2.35, 2.37, 2.40, 2.47, 2.54, 2.62, 2.64, 2.90, 2.92, 2.92, 2.93,
            3.21, 3.26, 3.30, 3.59, 3.68, 4.30, 4.64, 5.34, 5.42, 6.01,
        ];
        Moments moments = Moments.Of(values);
        Assert.Equal(3.118906, (6.01 - moments.Mean) / moments.StandardDeviation, 6e-7);
        Assert.Equal((0, 3), Test(values));
    }

    /// <summary>In normal samples something is found about as often as the level says.</summary>
    [Theory]
    [InlineData(10)]
    [InlineData(50)]
    [InlineData(400)]
    public void Finds_nothing_in_normal_samples_but_for_the_level(int n)
    {
        var random = new Random(11);
        int found = 0;
        for (int k = 0; k < 500; k++)
        {
            double[] values = [.. Enumerable.Range(0, n).Select(_ => Draws.Normal(random)).Order()];
            found += Test(values) == (0, 0) ? 0 : 1;
        }
        Assert.InRange(found / 500.0, 0.02, 0.08);
    }

    [Fact]
    public void Finds_outliers_on_both_sides()
    {
        var random = new Random(2);
        double[] values = [.. Enumerable.Range(0, 200).Select(_ => Draws.Normal(random)).Concat([-9, 8, 9.5]).Order()];
        Assert.Equal((1, 2), Test(values));
    }

    [Fact]
    public void Equal_values_have_no_outlier() => Assert.Equal((0, 0), Test([3, 3, 3, 3, 3]));

    private static (int, int) Test(double[] sorted) => ExtremeDeviates.Of(
        Moments.Of(sorted), sorted.AsSpan(0, Math.Min(10, sorted.Length)), [.. sorted.Reverse().Take(10)], 0.05);
}
