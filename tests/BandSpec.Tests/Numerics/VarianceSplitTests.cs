using BandSpec.Core.Numerics;

using Xunit;

namespace BandSpec.Tests.Numerics;

public sealed class VarianceSplitTests
{
    /// <summary>
    /// Dyestuff (R package lme4): mean square between 11271.5 with 5, within 2451.25 with 24 degrees of freedom (found in the package, recomputed;
    /// check-values section 8). The long-run variance is the sum of the components 42.000595233877² and 49.510099979701² that lme4 finds by REML.
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
        Close.Relative((42.000595233877 * 42.000595233877) + (49.510099979701 * 49.510099979701), split.LongRun, 1e-12);
        Close.Relative(11271.5 / 30, split.MeanVariance, 1e-13);
        double between = 11271.5 / 5, within = 2451.25 * 0.8;
        Close.Relative((between + within) * (between + within) / (between * between / 5 + within * within / 24), split.LongRunFreedom, 1e-13);
    }

    [Fact]
    public void One_group_is_one_sample()
    {
        VarianceSplit split = VarianceSplit.Of([Moments.Of([1, 2, 4, 9])]);
        Assert.Equal((3, 3), (split.WithinFreedom, split.LongRunFreedom));
        Assert.Equal(split.LongRun, split.Within);
        Close.Relative(4, split.LongRunCount, 1e-15);
    }

    [Fact]
    public void Groups_of_one_value_each_say_nothing_of_the_scatter_within() =>
        Assert.Equal(2, VarianceSplit.Of([Moments.Of([1]), Moments.Of([2]), Moments.Of([4])]).WithinFreedom);
}
