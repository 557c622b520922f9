using BandSpec.Core.Numerics;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.Characterizing;

/// <summary>An estimated figure with its confidence interval. The default is an exact zero.</summary>
/// <param name="Value">The estimate.</param>
/// <param name="Lower">Lower end of the interval.</param>
/// <param name="Upper">Upper end of the interval; infinite when the readings set none.</param>
public readonly record struct Estimate(double Value, double Lower, double Upper)
{
    /// <summary>Whether a value lies in the interval.</summary>
    public bool Covers(double value) => value >= Lower && value <= Upper;

    internal static Estimate Of(double value, Interval interval) => new(value, interval.Lower, interval.Upper);
}

/// <summary>A mean and a spread over production as they were estimated, in %FS.</summary>
/// <param name="Mean">The mean.</param>
/// <param name="MeanError">Standard error of the mean.</param>
/// <param name="Sigma">The standard deviation between units of one lot.</param>
/// <param name="VarianceError">Standard error of its square, (%FS)².</param>
public sealed record SpreadEstimate(Estimate Mean, double MeanError, Estimate Sigma, double VarianceError);

/// <summary>The statistics of one coefficient of the raw error, in %FS.</summary>
/// <param name="Name">Which coefficient.</param>
/// <param name="Units">Mean and spread between units of one lot.</param>
/// <param name="LotSigma">Standard deviation of the lots about the mean.</param>
/// <param name="LotVarianceError">Standard error of its square, (%FS)²; infinite with a single lot.</param>
public sealed record CoefficientEstimate(CoefficientName Name, SpreadEstimate Units, Estimate LotSigma, double LotVarianceError);

/// <summary>A correlation between two coefficients.</summary>
/// <param name="Pair">The coefficients.</param>
/// <param name="Value">The correlation coefficient.</param>
public sealed record CorrelationEstimate(CoefficientPair Pair, Estimate Value);

/// <summary>What one unit's curve was found to be.</summary>
/// <param name="Lot">Its lot.</param>
/// <param name="Unit">Its name.</param>
/// <param name="Coefficients">Its coefficients in the order of <see cref="Characterization.Coefficients"/>, %FS, predicted from its readings and its family.</param>
/// <param name="Residuals">For each of its readings what the curve and its hysteresis leave unexplained.</param>
public sealed record UnitCurve(string Lot, string Unit, IReadOnlyList<double> Coefficients, IReadOnlyList<ReadingResidual> Residuals);

/// <summary>What a unit's curve leaves unexplained of a reading.</summary>
/// <param name="Reading">The reading.</param>
/// <param name="Residual">Reading less curve, %FS.</param>
public sealed record ReadingResidual(UnitReading Reading, double Residual);
