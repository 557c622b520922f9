using BandSpec.Core.Findings;

namespace BandSpec.Core.Characterizing;

/// <summary>
/// The statistics of a sensor family as readings of uncompensated units show them, each with its uncertainty, and everything that was decided
/// on the way. Turned into a <see cref="Requirements.Platform"/> together with what readings cannot tell, such as rated pressures.
/// </summary>
public sealed record Characterization
{
    /// <summary>What was asked for.</summary>
    public required CharacterizationScope Scope { get; init; }

    /// <summary>How many units the statistics rest on.</summary>
    public required int Units { get; init; }

    /// <summary>How many lots those are of.</summary>
    public required int Lots { get; init; }

    /// <summary>How many readings were used.</summary>
    public required int Readings { get; init; }

    /// <summary>The coefficients of the raw error, zero first, degrees rising.</summary>
    public required IReadOnlyList<CoefficientEstimate> Coefficients { get; init; }

    /// <summary>Covariance of the estimated means, (%FS)²: row <c>i</c> holds columns 0 … <c>i</c>, in the order of the coefficients.</summary>
    public required IReadOnlyList<IReadOnlyList<double>> MeanCovariance { get; init; }

    /// <summary>The correlated pairs.</summary>
    public required IReadOnlyList<CorrelationEstimate> Correlations { get; init; }

    /// <summary>Pressure hysteresis, full width, positive when falling pressure reads higher; <see langword="null"/> when the readings do not show it.</summary>
    public required SpreadEstimate? PressureHysteresis { get; init; }

    /// <summary>Thermal hysteresis, half width, positive when reached from hotter reads higher; <see langword="null"/> when the readings do not show it.</summary>
    public required SpreadEstimate? ThermalHysteresis { get; init; }

    /// <summary>Standard deviation of a reading about its unit's curve, %FS; the noise of the reading instrument included.</summary>
    public required Estimate Repeatability { get; init; }

    /// <summary>Standard error of its square, (%FS)².</summary>
    public required double RepeatabilityVarianceError { get; init; }

    /// <summary>What the readings cannot speak of.</summary>
    public required IReadOnlyList<LeftOutTerm> LeftOut { get; init; }

    /// <summary>The decisions on degrees.</summary>
    public required IReadOnlyList<DegreeStep> DegreeSteps { get; init; }

    /// <summary>Units that the rest of the family contradicts; left out of the statistics unless the scope keeps them.</summary>
    public required IReadOnlyList<SuspectUnit> SuspectUnits { get; init; }

    /// <summary>Readings that the rest of their unit contradicts; likewise.</summary>
    public required IReadOnlyList<SuspectReading> SuspectReadings { get; init; }

    /// <summary>The curves of the units that were used.</summary>
    public required IReadOnlyList<UnitCurve> Curves { get; init; }

    /// <summary>The curves of the suspect units that were left out, each by its own readings alone; without those whose readings do not suffice.</summary>
    public required IReadOnlyList<UnitCurve> SuspectCurves { get; init; }

    /// <summary>Minus twice the logarithm of the restricted likelihood.</summary>
    public required double Deviance { get; init; }

    /// <summary>Estimates the statistics, or finds why the readings do not suffice.</summary>
    /// <param name="readings">The readings, each unit's in the order of time.</param>
    /// <param name="scope">What is asked for.</param>
    public static Checked<Characterization> Of(IReadOnlyList<UnitReading> readings, CharacterizationScope scope)
    {
        ArgumentNullException.ThrowIfNull(readings);
        ArgumentNullException.ThrowIfNull(scope);
        MeasuredFamily family = MeasuredFamily.Of(readings, scope.Reference).Without(unit => scope.ExcludedUnits.Contains(unit.Name));
        string[] missing = [.. scope.ExcludedUnits.Except(readings.Select(r => r.Unit))];
        return Checked<Characterization>.Of(SampleRules.FindingsIn(family, missing), () => new FamilyStatistics(family, scope).Estimate());
    }
}
