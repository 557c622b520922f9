using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using BandSpec.Core.Specifying;

namespace BandSpec.Tests.Revisions;

/// <summary>Finished records to compare: close to the first demo, with few candidate plans so that a search takes milliseconds.</summary>
internal static class Drafted
{
    public static Requirement Requirement { get; } = Given.Requirement with
    {
        Compensation = Given.Requirement.Compensation with { CandidateStep = Given.K(25), FewestTemperatures = 4, MostTemperatures = 4 },
    };

    public static Specification First { get; } = Of(Requirement);

    /// <summary>A record each of whose neighbours differs in another part of the inputs; the last differs in nearly all of them.</summary>
    public static IReadOnlyList<Specification> Variants { get; } =
    [
        First,
        Of(Requirement with { SafetyFactor = 1.3 }),
        Of(Requirement with { Test = new VerificationRules(0, [Given.C(0), Given.C(25), Given.C(100)]) }),
        Of(Requirement with { AllowedError = [new(Given.C(-20), Given.C(90), Given.P(1.5), null, 0.02), new(Given.C(90), Given.C(150), Given.P(1.1), Given.P(1.3), 0)] }),
        Of(Requirement with { Output = new OutputSignal(SignalKind.Current, "mA", 20, 4, null, null, null) }),
        Of(Requirement, Given.Platform with { Ageing = Given.Platform.Ageing with { ActivationEnergy = 0.9 } }),
        Of(Requirement, station: Given.Station with { StandardZero = Given.P(0.02), RejectCost = new Money(30, "EUR") }),
        Everything(),
    ];

    public static Specification Of(Requirement requirement, Platform? platform = null, Station? station = null) =>
        SpecificationDraft.Draft(Given.Application(requirement, platform, station));

    private static Specification Everything() => Of(
        Requirement with
        {
            Identity = Requirement.Identity with { Number = "XY-9", Revision = "C", Date = new DateOnly(2027, 1, 5), Changes = [.. Requirement.Identity.Changes, new RevisionNote("C", new DateOnly(2027, 1, 5), "Other skid")] },
            Pressure = new PressureRange(Pressure.From(0, PressureUnit.Psi), Pressure.From(400, PressureUnit.Psi), PressureReference.Absolute),
            Temperature = new OperatingTemperature(Given.C(-10), Given.C(120), Given.C(20)),
            Profile = [new DwellBin(Given.C(-10), Given.C(120), Duration.FromHours(40000))],
            AllowedError = [new(Given.C(-10), Given.C(120), Given.P(2), null, 0)],
            HeldTerms = [],
            FurtherTerms = [],
            Capability = new CapabilityTarget(1.33, 1),
            Rounding = new RoundingSteps(Given.P(0.1), Given.P(0.02)),
        },
        Given.Platform with { Name = "SK-41", RawError = [.. Given.Platform.RawError.Skip(1)], Correlations = [] },
        Given.Station with { TestPoints = new PressureLists([0, 0.4, 1], [0, 1]), Chamber = Given.Station.Chamber with { HourlyRate = new Money(80, "USD") }, RejectCost = new Money(20, "USD") });
}
