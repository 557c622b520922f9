using BandSpec.Core.Numerics;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.Bands;

/// <summary>How uncertain the figures of a node are because the platform's statistics come from a sample.</summary>
/// <param name="MeanVariance">Variance of the estimate of <c>M</c>, (%FS)².</param>
/// <param name="SampleVarianceError">Standard error of the estimate of <c>σ_w²</c>, (%FS)².</param>
/// <param name="LongRunVarianceError">Standard error of the estimate of <c>σ_t²</c>, (%FS)².</param>
internal readonly record struct NodeAccuracy(double MeanVariance, double SampleVarianceError, double LongRunVarianceError)
{
    /// <summary>What readings or degrees of freedom beyond this number add is told by normal quantiles; the exact law would only cost time.</summary>
    private const double Plenty = 1e4;

    /// <summary>The lower bound on a node's margin at a one-sided confidence.</summary>
    /// <remarks>Of the two criteria the one that a first guess finds lower by more than a tenth is not worth a second look at the other.</remarks>
    public double Margin(BandNode node, CapabilityTarget target, double confidence)
    {
        (double sample, double longRun) = RoughMargins(node, target, NormalDistribution.Quantile(confidence));
        double lowest = double.PositiveInfinity;
        if (!(sample > longRun + (0.1 * Math.Abs(longRun))))
            lowest = Limit(node.CpkSample, node.SigmaSample.Percent, MeanVariance, SampleVarianceError, confidence) / target.Sample;
        if (!(longRun > sample + (0.1 * Math.Abs(sample))))
            lowest = Math.Min(
                lowest, Limit(node.CpkLongRun, node.SigmaLongRun.Percent, MeanVariance, LongRunVarianceError, confidence) / target.LongRun);
        return lowest;
    }

    /// <summary>About the same by normal quantiles, for ranking: <c>Ĉ − z√(1/(9n) + Ĉ²/(2ν))</c> (Bissell 1990, Appl. Statist. 39, 331-340).</summary>
    public double RoughMargin(BandNode node, CapabilityTarget target, double quantile)
    {
        (double sample, double longRun) = RoughMargins(node, target, quantile);
        return Math.Min(sample, longRun);
    }

    /// <summary>
    /// The lower bound on a capability index whose mean and variance are sums of independent estimates. The variance counts as one with
    /// <c>ν = 2σ⁴/Var(σ̂²)</c> degrees of freedom (Satterthwaite 1946, Biometrics Bull. 2, 110-114), the mean as one of <c>n = σ²/Var(M̂)</c>
    /// readings; <c>3√n·Ĉ</c> is then noncentral t. With a single term this is the one-sided tolerance factor of ISO 16269-6, exactly.
    /// </summary>
    public static double Limit(double index, double sigma, double meanVariance, double varianceError, double confidence)
    {
        if (!double.IsFinite(index))
            return index;
        (double readings, double freedom) = Counts(sigma, meanVariance, varianceError);
        (double few, double fewFree) = (Math.Min(Plenty, readings), Math.Min(Plenty, freedom));
        double quantile = NormalDistribution.Quantile(confidence);
        return CapabilityLaw.OneSidedLimit(index, few, fewFree, confidence) + HalfWidth(index, few, fewFree, quantile) - HalfWidth(index, readings, freedom, quantile);
    }

    private (double Sample, double LongRun) RoughMargins(BandNode node, CapabilityTarget target, double quantile) => (
        Rough(node.CpkSample, node.SigmaSample.Percent, SampleVarianceError, quantile) / target.Sample,
        Rough(node.CpkLongRun, node.SigmaLongRun.Percent, LongRunVarianceError, quantile) / target.LongRun);

    private double Rough(double index, double sigma, double varianceError, double quantile)
    {
        if (!double.IsFinite(index))
            return index;
        (double readings, double freedom) = Counts(sigma, MeanVariance, varianceError);
        return index - HalfWidth(index, readings, freedom, quantile);
    }

    private static double HalfWidth(double index, double readings, double freedom, double quantile) =>
        quantile * Math.Sqrt((1 / (9 * readings)) + (index * index / (2 * freedom)));

    private static (double Readings, double Freedom) Counts(double sigma, double meanVariance, double varianceError)
    {
        double variance = sigma * sigma;
        return (variance / meanVariance, Math.Max(1, 2 * variance * variance / (varianceError * varianceError)));
    }
}
