namespace BandSpec.Core.Requirements;

/// <summary>
/// A requirement as far as it could be read: what is missing or cannot be read is <see langword="null"/>, so that the rules of the rest can be
/// judged all the same. Unlike a <see cref="Requirement"/> it is of no use to anything but the rules.
/// </summary>
public sealed record RequirementParts
{
    /// <summary>See <see cref="Requirement.Identity"/>.</summary>
    public SpecificationIdentity? Identity { get; init; }

    /// <summary>See <see cref="Requirement.Pressure"/>.</summary>
    public PressureRange? Pressure { get; init; }

    /// <summary>See <see cref="Requirement.Output"/>.</summary>
    public OutputSignal? Output { get; init; }

    /// <summary>See <see cref="Requirement.Temperature"/>.</summary>
    public OperatingTemperature? Temperature { get; init; }

    /// <summary>See <see cref="Requirement.Profile"/>.</summary>
    public IReadOnlyList<DwellBin>? Profile { get; init; }

    /// <summary>See <see cref="Requirement.AllowedError"/>.</summary>
    public IReadOnlyList<AllowedErrorRegion>? AllowedError { get; init; }

    /// <summary>See <see cref="Requirement.SafetyFactor"/>.</summary>
    public double? SafetyFactor { get; init; }

    /// <summary>See <see cref="Requirement.Capability"/>.</summary>
    public CapabilityTarget? Capability { get; init; }

    /// <summary>See <see cref="Requirement.HeldTerms"/>.</summary>
    public IReadOnlyList<HeldTerm>? HeldTerms { get; init; }

    /// <summary>See <see cref="Requirement.FurtherTerms"/>.</summary>
    public IReadOnlyList<FurtherTerm>? FurtherTerms { get; init; }

    /// <summary>See <see cref="Requirement.Compensation"/>.</summary>
    public CompensationScope? Compensation { get; init; }

    /// <summary>See <see cref="Requirement.Test"/>.</summary>
    public VerificationRules? Test { get; init; }

    /// <summary>See <see cref="Requirement.Rounding"/>.</summary>
    public RoundingSteps? Rounding { get; init; }

    /// <summary>All parts of a whole requirement.</summary>
    internal static RequirementParts Of(Requirement whole) => new()
    {
        Identity = whole.Identity, Pressure = whole.Pressure, Output = whole.Output, Temperature = whole.Temperature, Profile = whole.Profile,
        AllowedError = whole.AllowedError, SafetyFactor = whole.SafetyFactor, Capability = whole.Capability, HeldTerms = whole.HeldTerms,
        FurtherTerms = whole.FurtherTerms, Compensation = whole.Compensation, Test = whole.Test, Rounding = whole.Rounding,
    };
}
