using System.Text.Json;
using BandSpec.Core.Requirements;
using BandSpec.Core.Residuals;
using BandSpec.Core.Specifying;
using BandSpec.Core.TestLimits;

namespace BandSpec.Files.Json;

/// <summary>
/// Writes <c>limits.json</c> for the test system: the points of the verification test with their acceptance limits, already rounded inward. A
/// point whose upper limit is below its lower one accepts nothing.
/// </summary>
public static class LimitsJson
{
    /// <summary>The format's name; it changes when a member is renamed or removed.</summary>
    public const string Format = "bandspec/limits/1";

    /// <summary>The bytes of the file.</summary>
    public static ReadOnlyMemory<byte> Write(Specification specification)
    {
        ArgumentNullException.ThrowIfNull(specification);
        Requirement requirement = specification.Application.Requirement;
        return JsonFile.Of(json =>
        {
            json.WriteString("format", Format);
            json.Identity(requirement.Identity);
            json.WriteBoolean("feasible", specification.Feasible);
            json.Object("decision-rule", rule => WriteRule(rule, requirement.Test));
            json.Figure("sample-criterion", requirement.Capability.Sample);
            json.Figure("long-run-criterion", requirement.Capability.LongRun);
            json.Figure("reference-temperature", requirement.Temperature.Reference.Celsius);
            json.Objects("derived-limits", DerivedLimits(specification), (one, limit) => WriteDerived(one, limit, requirement));
            json.Objects("points", specification.VerificationPoints, (point, tested) => WritePoint(point, tested, requirement.Output.Unit));
        });
    }

    /// <summary>The direction's word in files.</summary>
    internal static string Word(PressureDirection direction) => direction == PressureDirection.Rising ? "rising" : "falling";

    /// <summary>The derived limits, and the limit of pressure hysteresis where the allocation has one: full width, like what a tester measures.</summary>
    private static IEnumerable<DerivedLimit> DerivedLimits(Specification specification) =>
        specification.DerivedLimits.Concat(specification.Allocation.Terms
            .Where(share => share.Term == ErrorTerm.PressureHysteresis)
            .Select(share => new DerivedLimit("hysteresis", null, share.Limit)));

    private static void WriteRule(Utf8JsonWriter json, VerificationRules rules)
    {
        json.WriteString("rule", JudgementJson.Word(rules.Rule));
        if (rules.Rule == DecisionRule.Guarded)
            json.Figure("guard-band", rules.GuardBand);
        if (rules.Risk is { } risk)
            json.Figure("risk", risk);
        json.WriteString("promise", JudgementJson.Word(rules.Promise));
    }

    private static void WriteDerived(Utf8JsonWriter json, DerivedLimit limit, Requirement requirement)
    {
        json.WriteString("name", limit.Name);
        if (limit.Region is { } region)
        {
            json.Figure("from", requirement.AllowedError[region].From.Celsius);
            json.Figure("to", requirement.AllowedError[region].To.Celsius);
        }

        json.Figure("limit", limit.Limit.Percent);
    }

    private static void WritePoint(Utf8JsonWriter json, VerificationPoint point, string outputUnit)
    {
        json.WriteString("id", point.Id);
        json.Figure("temperature", point.Temperature.Celsius);
        json.Figure("pressure", point.Pressure.Value);
        json.WriteString("pressure-unit", point.Pressure.Unit.Symbol);
        json.Figure("pressure-fraction", point.PressureFraction);
        json.WriteString("direction", Word(point.Direction));
        json.Figure("nominal", point.Nominal);
        json.Figure("lower", point.Lower);
        json.Figure("upper", point.Upper);
        json.WriteString("output-unit", outputUnit);
        json.Figure("tolerance", point.Tolerance.Percent);
        json.Figure("guard-band", point.GuardBand.Percent);
        json.Figure("uncertainty", point.Uncertainty.Percent);
        json.Figure("consumer-risk", point.ConsumerRisk);
        json.Figure("producer-risk", point.ProducerRisk);
    }
}
