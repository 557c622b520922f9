using BandSpec.Core.Numerics;

using Xunit;

namespace BandSpec.Tests.Numerics;

public sealed class BinomialIntervalTests
{
    /// <summary>Clopper-Pearson 95 %: scipy.stats.beta.ppf, SciPy 1.10.1, recomputed.</summary>
    [Theory]
    [InlineData(0, 30, 0, 0.11570330822)]
    [InlineData(1, 30, 0.00084357092663, 0.17216945563)]
    [InlineData(30, 30, 0.88429669178, 1)]
    [InlineData(7, 1000, 0.0028188587596, 0.0143691949789)]
    [InlineData(40, 10_000_000, 2.85766013351e-6, 5.44686075596e-6)]
    public void Exact_interval(long found, long of, double lower, double upper)
    {
        Interval interval = BinomialInterval.Of(found, of, 0.95);
        Assert.Equal(lower, interval.Lower, 1e-6 * lower);
        Assert.Equal(upper, interval.Upper, 1e-6 * upper);
    }
}
