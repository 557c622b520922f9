using BandSpec.Core.Numerics;

using Xunit;

namespace BandSpec.Tests.Numerics;

public sealed class VarianceSplitTests
{
    /// <summary>
    /// Dyestuff (R package lme4): mean square between 11271.5 with 5, within 2451.25 with 24 degrees of freedom (found in the package, recomputed;
    /// check-values section 8). The overall variance follows as (5·11271.5 + 24·2451.25)/29.
    /// </summary>
    [Fact]
    public void Dyestuff()
    {
        double[][] batches =
        [
            [1545, 1440, 1440, 1520, 1580], [1540, 1555, 1490, 1560, 1495], [1595, 1550, 1605, 1510, 1560],
            [1445, 1440, 1595, 1465, 1545], [1595, 1630, 1515, 1635, 1625], [1520, 1455, 1450, 1480, 1445],
        ];
        VarianceSplit split = VarianceSplit.Of([.. batches.Select(batch => Moments.Of(batch))]);
        Close.Relative(2451.25, split.Within, 1e-13);
        Assert.Equal(24, split.WithinFreedom);
        Close.Relative((5 * 11271.5 + 24 * 2451.25) / 29, split.Overall, 1e-13);
        Close.Relative(11271.5 / 30, split.MeanVariance, 1e-13);
        double a = 5 * 11271.5, b = 24 * 2451.25;
        Close.Relative((a + b) * (a + b) / (a * a / 5 + b * b / 24), split.OverallFreedom, 1e-13);
    }

    [Fact]
    public void One_group_is_one_sample()
    {
        VarianceSplit split = VarianceSplit.Of([Moments.Of([1, 2, 4, 9])]);
        Assert.Equal((3, 3), (split.WithinFreedom, split.OverallFreedom));
        Assert.Equal(split.Overall, split.Within);
        Close.Relative(4, split.OverallCount, 1e-15);
    }

    [Fact]
    public void Groups_of_one_value_each_say_nothing_of_the_scatter_within() =>
        Assert.Equal(2, VarianceSplit.Of([Moments.Of([1]), Moments.Of([2]), Moments.Of([4])]).WithinFreedom);
}
