using BandSpec.Core.Quantities;

namespace BandSpec.Core.Requirements;

/// <summary>
/// What a platform's statistics rest on: how many units of how many lots were measured, and how uncertain each figure is for that. It is
/// about the figures of the file, not about the sensors: it shrinks with every further unit measured.
/// </summary>
public sealed record PlatformSample
{
    /// <summary>How many units were measured, at least 3.</summary>
    public required int Units { get; init; }

    /// <summary>Of how many lots they were, at least 1.</summary>
    public required int Lots { get; init; }

    /// <summary>How many readings were used.</summary>
    public required int Readings { get; init; }

    /// <summary>The coefficients' accuracy, each coefficient of the raw error once.</summary>
    public required IReadOnlyList<CoefficientAccuracy> Coefficients { get; init; }

    /// <summary>Accuracy of the pressure hysteresis; <see langword="null"/> when its figures do not come from the sample.</summary>
    public SpreadAccuracy? PressureHysteresis { get; init; }

    /// <summary>Accuracy of the thermal hysteresis; <see langword="null"/> when its figures do not come from the sample.</summary>
    public SpreadAccuracy? ThermalHysteresis { get; init; }

    /// <summary>Standard error of the square of the repeatability, (%FS)².</summary>
    public double RepeatabilityVarianceError { get; init; }

    /// <summary>Accuracy of the drift figures; <see langword="null"/> when they do not come from a sample.</summary>
    public AgeingAccuracy? Ageing { get; init; }

    /// <summary>What the accuracy would be with further units like those measured, in lots of the same size: errors fall with the root of the number.</summary>
    /// <param name="more">How many further units, not negative.</param>
    internal PlatformSample With(int more)
    {
        double factor = (Units + more) / (double)Units, root = Math.Sqrt(factor);
        SpreadAccuracy? Better(SpreadAccuracy? accuracy) => accuracy is null ? null : new SpreadAccuracy(
            PercentOfSpan.FromPercent(accuracy.MeanError.Percent / root), accuracy.VarianceError / root);
        return this with
        {
            Units = Units + more,
            Lots = (int)Math.Round(Lots * factor),
            Readings = (int)Math.Round(Readings * factor),
            Coefficients = [.. Coefficients.Select(c => new CoefficientAccuracy(
                c.Name, c.VarianceError / root, c.LotVarianceError / root, [.. c.MeanCovariance.Select(v => v / factor)]))],
            PressureHysteresis = Better(PressureHysteresis),
            ThermalHysteresis = Better(ThermalHysteresis),
            RepeatabilityVarianceError = RepeatabilityVarianceError / root,
        };
    }
}

/// <summary>How uncertain the statistics of one coefficient are.</summary>
/// <param name="Name">Which coefficient.</param>
/// <param name="VarianceError">Standard error of <c>σ²</c>, (%FS)², not negative.</param>
/// <param name="LotVarianceError">Standard error of <c>σ_lot²</c>, (%FS)²; 0 when the sample cannot tell lots apart.</param>
/// <param name="MeanCovariance">
/// Covariances of its estimated mean with those of the coefficients before it in the list, and last the variance of its own, (%FS)².
/// </param>
public sealed record CoefficientAccuracy(
    CoefficientName Name, double VarianceError, double LotVarianceError, IReadOnlyList<double> MeanCovariance);

/// <summary>How uncertain a mean and a spread are.</summary>
/// <param name="MeanError">Standard error of the mean.</param>
/// <param name="VarianceError">Standard error of the square of the standard deviation, (%FS)².</param>
public sealed record SpreadAccuracy(PercentOfSpan MeanError, double VarianceError);

/// <summary>How uncertain the drift figures are.</summary>
/// <param name="Units">How many units the ageing test had.</param>
/// <param name="Zero">Drift of zero.</param>
/// <param name="Span">Drift of span.</param>
/// <param name="ActivationEnergyError">Standard error of the activation energy, electronvolts; 0 when it was assumed.</param>
/// <param name="TimeExponentError">Standard error of the time exponent; 0 when it was assumed.</param>
public sealed record AgeingAccuracy(
    int Units, SpreadAccuracy Zero, SpreadAccuracy Span, double ActivationEnergyError, double TimeExponentError);
