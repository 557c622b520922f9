using MathNet.Numerics.Distributions;

namespace BandSpec.Core.Numerics;

/// <summary>Confidence limits for a fraction from counted items.</summary>
internal static class BinomialInterval
{
    /// <summary>
    /// The interval of Clopper and Pearson (1934, Biometrika 26, 404): two-sided, and never covering less often than
    /// <paramref name="confidence"/>. Relative error of the limits below 1e-7, the library's beta quantile.
    /// </summary>
    public static Interval Of(long found, long of, double confidence)
    {
        double each = (1 - confidence) / 2;
        double lower = found == 0 ? 0 : Beta.InvCDF(found, of - found + 1, each);
        double upper = found == of ? 1 : Beta.InvCDF(found + 1, of - found, 1 - each);
        return new(lower, upper);
    }
}
