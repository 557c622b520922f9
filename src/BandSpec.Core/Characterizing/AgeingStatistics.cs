using BandSpec.Core.Findings;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.Characterizing;

/// <summary>The drift of a sensor family as an ageing test shows it, each figure with its uncertainty.</summary>
public sealed record AgeingStatistics
{
    /// <summary>What was asked for.</summary>
    public required AgeingScope Scope { get; init; }

    /// <summary>How many units the statistics rest on.</summary>
    public required int Units { get; init; }

    /// <summary>How many readings were used.</summary>
    public required int Readings { get; init; }

    /// <summary>Drift of zero at the end of the stated test.</summary>
    public required SpreadEstimate Zero { get; init; }

    /// <summary>Drift of span at the end of the stated test.</summary>
    public required SpreadEstimate Span { get; init; }

    /// <summary>Activation energy in electronvolts; without interval when it was assumed.</summary>
    public required Estimate ActivationEnergy { get; init; }

    /// <summary>Time exponent; without interval when it was assumed.</summary>
    public required Estimate TimeExponent { get; init; }

    /// <summary>
    /// The joint confidence region of energy and exponent: points on its edge in the order of the angle; empty when one of them was assumed.
    /// </summary>
    public required IReadOnlyList<DriftFigures> Region { get; init; }

    /// <summary>Standard deviation of a reading, %FS.</summary>
    public required Estimate Repeatability { get; init; }

    /// <summary>What the readings cannot tell, and what was assumed instead.</summary>
    public required IReadOnlyList<LeftOutTerm> LeftOut { get; init; }

    /// <summary>Standard errors of the drift figures.</summary>
    public required DriftErrors Errors { get; init; }

    /// <summary>What they would be with the planned test besides; <see langword="null"/> when none was asked for.</summary>
    public required DriftErrors? ErrorsWithPlannedTest { get; init; }

    /// <summary>The drift of every unit at every time, for looking at.</summary>
    public required IReadOnlyList<UnitDrift> Drifts { get; init; }

    /// <summary>The statistics as they stand in a platform.</summary>
    public Ageing ToAgeing() => new(
        Spread(Zero), Spread(Span), Scope.TestTemperature, Scope.TestDuration,
        MeaningfulRounding.Of(ActivationEnergy.Value, Errors.ActivationEnergy), MeaningfulRounding.Of(TimeExponent.Value, Errors.TimeExponent));

    /// <summary>Their accuracy as it stands in a platform.</summary>
    public AgeingAccuracy ToAccuracy() => new(
        Units, Accuracy(Zero), Accuracy(Span), MeaningfulRounding.ToDigits(Errors.ActivationEnergy, 4),
        MeaningfulRounding.ToDigits(Errors.TimeExponent, 4));

    /// <summary>Estimates the statistics, or finds why the readings do not suffice.</summary>
    /// <param name="readings">The readings.</param>
    /// <param name="scope">What is asked for.</param>
    public static Checked<AgeingStatistics> Of(IReadOnlyList<DriftReading> readings, AgeingScope scope)
    {
        ArgumentNullException.ThrowIfNull(readings);
        ArgumentNullException.ThrowIfNull(scope);
        IReadOnlyList<StoredUnit> units = StoredUnit.Of(readings);
        IReadOnlyList<Finding> missing = DriftSupport.FindingsIn(units, scope);
        AgeingStatistics? found = missing.Count > 0 ? null : new DriftStatistics(units, scope, isEnergyOpen: false).Estimate();
        if (found is { ActivationEnergy: { Lower: 0, Upper: double.PositiveInfinity } })
        {
            if (scope.AssumedActivationEnergy is null)
                missing = [DriftSupport.OpenEnergy];
            else
                found = new DriftStatistics(units, scope, isEnergyOpen: true).Estimate();
        }

        return Checked<AgeingStatistics>.Of(missing, () => found!);
    }

    private static Spread Spread(SpreadEstimate estimate) => new(
        PercentOfSpan.FromPercent(MeaningfulRounding.Of(estimate.Mean.Value, estimate.MeanError)),
        PercentOfSpan.FromPercent(MeaningfulRounding.Spread(estimate.Sigma.Value, estimate.VarianceError)));

    private static SpreadAccuracy Accuracy(SpreadEstimate estimate) => new(
        PercentOfSpan.FromPercent(MeaningfulRounding.ToDigits(estimate.MeanError, 4)), MeaningfulRounding.ToDigits(estimate.VarianceError, 4));
}

/// <summary>A pair of the drift law's figures.</summary>
/// <param name="ActivationEnergy">Electronvolts.</param>
/// <param name="TimeExponent">The exponent of time.</param>
public readonly record struct DriftFigures(double ActivationEnergy, double TimeExponent);

/// <summary>Standard errors of the drift figures.</summary>
/// <param name="ActivationEnergy">Of the activation energy, electronvolts; 0 when it was assumed.</param>
/// <param name="TimeExponent">Of the time exponent; 0 when it was assumed.</param>
/// <param name="ZeroMean">Of the mean drift of zero at the end of the stated test, %FS.</param>
/// <param name="SpanMean">Of the mean drift of span, %FS.</param>
/// <param name="ZeroSigma">Of the spread of drift of zero, %FS; infinite where the spread was found to be zero.</param>
/// <param name="SpanSigma">Of the spread of drift of span, %FS.</param>
public sealed record DriftErrors(
    double ActivationEnergy, double TimeExponent, double ZeroMean, double SpanMean, double ZeroSigma, double SpanSigma);

/// <summary>The change of one unit since its beginning.</summary>
/// <param name="Unit">Its name.</param>
/// <param name="Storage">Temperature of its storage.</param>
/// <param name="Stored">Time in storage.</param>
/// <param name="PressureFraction">Applied pressure.</param>
/// <param name="Drift">Mean reading less mean reading at the beginning, %FS.</param>
public sealed record UnitDrift(string Unit, Temperature Storage, Duration Stored, double PressureFraction, double Drift);
