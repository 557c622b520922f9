using BandSpec.Core.Requirements;

namespace BandSpec.Core.Revisions;

/// <summary>
/// A part of the inputs that is swapped as one when the cause of a change is looked for: mostly one key of a file. What names the inputs but
/// does not enter the result, such as the title, belongs to no group.
/// </summary>
/// <param name="Subject">The file it is in.</param>
/// <param name="Name">Its path in the file.</param>
/// <param name="Swap">The first inputs with this part of the second.</param>
internal sealed record InputGroup(FigureSubject Subject, string Name, Func<ApplicationInputs, ApplicationInputs, ApplicationInputs> Swap)
{
    /// <summary>All groups in the order of the files.</summary>
    public static IReadOnlyList<InputGroup> All { get; } =
    [
        Of("pressure", (r, o) => r with { Pressure = o.Pressure }),
        Of("output", (r, o) => r with { Output = o.Output }),
        Of("temperature", (r, o) => r with { Temperature = o.Temperature }),
        Of("temperature.profile", (r, o) => r with { Profile = o.Profile }),
        Of("allowed-error", (r, o) => r with { AllowedError = o.AllowedError }),
        Of("safety-factor", (r, o) => r with { SafetyFactor = o.SafetyFactor }),
        Of("capability", (r, o) => r with { Capability = o.Capability }),
        Of("held-terms", (r, o) => r with { HeldTerms = o.HeldTerms }),
        Of("further-terms", (r, o) => r with { FurtherTerms = o.FurtherTerms }),
        Of("compensation", (r, o) => r with { Compensation = o.Compensation }),
        Of("test", (r, o) => r with { Test = o.Test }),
        Of("rounding", (r, o) => r with { Rounding = o.Rounding }),
        OfPlatform("temperature", (p, o) => p with { Temperature = o.Temperature }),
        OfPlatform("pressure", (p, o) => p with { Pressure = o.Pressure }),
        OfPlatform("raw-error", (p, o) => p with { RawError = o.RawError }),
        OfPlatform("raw-error.correlations", (p, o) => p with { Correlations = o.Correlations }),
        OfPlatform("correction", (p, o) => p with { ZeroDegree = o.ZeroDegree, SpanDegree = o.SpanDegree }),
        OfPlatform("pressure-hysteresis", (p, o) => p with { PressureHysteresis = o.PressureHysteresis }),
        OfPlatform("thermal-hysteresis", (p, o) => p with { ThermalHysteresis = o.ThermalHysteresis }),
        OfPlatform("repeatability", (p, o) => p with { Repeatability = o.Repeatability }),
        OfPlatform("ageing", (p, o) => p with { Ageing = o.Ageing }),
        OfPlatform("sample", (p, o) => p with { Sample = o.Sample }),
        OfStation("pressure-standard", (s, o) => s with { StandardZero = o.StandardZero, StandardProportional = o.StandardProportional }),
        OfStation("reading-noise", (s, o) => s with { ReadingNoise = o.ReadingNoise }),
        OfStation("readings-averaged", (s, o) => s with { ReadingsAveraged = o.ReadingsAveraged }),
        OfStation("soak-gradient", (s, o) => s with { SoakGradient = o.SoakGradient }),
        OfStation("pressure-points", (s, o) => s with { PressurePoints = o.PressurePoints }),
        OfStation("test-points", (s, o) => s with { TestPoints = o.TestPoints }),
        OfStation("chamber", (s, o) => s with { Chamber = o.Chamber }),
        OfStation("reject-cost", (s, o) => s with { RejectCost = o.RejectCost }),
    ];

    private static InputGroup Of(string name, Func<Requirement, Requirement, Requirement> swap) =>
        new(FigureSubject.Requirement, name, (into, from) => into with { Requirement = swap(into.Requirement, from.Requirement) });

    private static InputGroup OfPlatform(string name, Func<Platform, Platform, Platform> swap) =>
        new(FigureSubject.Platform, name, (into, from) => into with { Platform = swap(into.Platform, from.Platform) });

    private static InputGroup OfStation(string name, Func<Station, Station, Station> swap) =>
        new(FigureSubject.Station, name, (into, from) => into with { Station = swap(into.Station, from.Station) });
}
