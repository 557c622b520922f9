using Xunit;

namespace BandSpec.Tests.Numerics;

/// <summary>Comparisons of numbers whose tolerance is a relative one; an expected 0 must be met exactly.</summary>
internal static class Close
{
    /// <summary>Relative difference, 0 when both are equal.</summary>
    public static double Error(double expected, double actual) => expected == actual ? 0 : Math.Abs(actual - expected) / Math.Abs(expected);

    /// <summary>Fails, naming what was compared, when the relative difference is above the tolerance or a NaN is met.</summary>
    public static void Relative(double expected, double actual, double tolerance, string what = "")
    {
        double error = Error(expected, actual);
        Assert.True(error <= tolerance, $"{what} expected {expected:R}, got {actual:R}, relative error {error:E2} above {tolerance:E1}");
    }
}
