using BandSpec.Core.Requirements;
using BandSpec.Files.Forms;

namespace BandSpec.Files.Inputs;

/// <summary>The form of a requirement file.</summary>
internal static class RequirementForm
{
    private static readonly Key<SpecificationIdentity> Identity = new(
        "specification", IdentityForm.Form, "What the specification is called and who stands behind it.");

    /// <summary>The platform's file.</summary>
    internal static Key<string> PlatformFile { get; } = new(
        "platform", new TextForm("the path of a platform file"), "Platform file, relative to this one.");

    /// <summary>The station's file.</summary>
    internal static Key<string> StationFile { get; } = new(
        "station", new TextForm("the path of a station file"), "Station file, relative to this one.");

    /// <summary>The pressure range, which is read first: the errors need its span.</summary>
    internal static Key<PressureRange> Pressure { get; } = new("pressure", PressureForm.Form, "Calibrated pressure range.");

    /// <summary>The compensation plans to consider, or the plan that is pinned.</summary>
    internal static Key<CompensationScope> Compensation { get; } = new(
        "compensation", DesignForms.Compensation, "Compensation plans to consider, and which of them is best.");

    private static readonly Key<OutputSignal> Output = new("output", OutputForm.Form, "Output signal over the pressure range.");
    private static readonly Key<TemperatureSection> Temperature = new(
        "temperature", TemperatureForm.Form, "Operating temperatures and the time spent at them.");
    private static readonly Key<IReadOnlyList<AllowedErrorRegion>> AllowedError = new(
        "allowed-error", ErrorForms.Regions, "Error that may not be exceeded, by temperature region.");
    private static readonly Key<double> SafetyFactor = new(
        "safety-factor", new NumberForm(AcceptedRanges.SafetyFactor), "The allowed error is divided by this before anything is designed into it.");
    private static readonly Key<CapabilityTarget> Capability = new(
        "capability", DesignForms.Capability, "Capability that the design has to reach.");
    private static readonly Key<IReadOnlyList<HeldTerm>> HeldTerms = Key.Optional<IReadOnlyList<HeldTerm>>(
        "held-terms", ErrorForms.Held, [], "Terms whose limit the customer has fixed.");
    private static readonly Key<IReadOnlyList<FurtherTerm>> FurtherTerms = Key.Optional<IReadOnlyList<FurtherTerm>>(
        "further-terms", ErrorForms.FurtherTerms, [], "Error sources outside the platform.");
    private static readonly Key<VerificationRules> Test = new("test", TestForm.Form, "How the verification test decides.");
    private static readonly Key<RoundingSteps> Rounding = new(
        "rounding", DesignForms.Rounding, "Steps to which printed and tested values are rounded.");

    /// <summary>The form.</summary>
    internal static MapForm<RequirementParts> Form { get; } = new(
        "a requirement",
        [
            Identity, PlatformFile, StationFile, Pressure, Output, Temperature, AllowedError, SafetyFactor, Capability,
            HeldTerms, FurtherTerms, Compensation, Test, Rounding,
        ],
        v => new RequirementParts
        {
            Identity = v.Find(Identity), Pressure = v.Find(Pressure), Output = v.Find(Output),
            Temperature = v.Find(Temperature)?.Range, Profile = v.Find(Temperature)?.Profile,
            AllowedError = v.Find(AllowedError), SafetyFactor = v.FindValue(SafetyFactor), Capability = v.Find(Capability),
            HeldTerms = v.Find(HeldTerms), FurtherTerms = v.Find(FurtherTerms),
            Compensation = v.Find(Compensation), Test = v.Find(Test), Rounding = v.Find(Rounding),
        },
        isLenient: true);

    /// <summary>The requirement whose parts were all read.</summary>
    internal static Requirement Whole(RequirementParts parts, string platformFile, string stationFile) => new()
    {
        Identity = parts.Identity!, PlatformFile = platformFile, StationFile = stationFile, Pressure = parts.Pressure!, Output = parts.Output!,
        Temperature = parts.Temperature!, Profile = parts.Profile!, AllowedError = parts.AllowedError!,
        SafetyFactor = parts.SafetyFactor!.Value, Capability = parts.Capability!,
        HeldTerms = parts.HeldTerms!, FurtherTerms = parts.FurtherTerms!,
        Compensation = parts.Compensation!, Test = parts.Test!, Rounding = parts.Rounding!,
    };
}
