using BandSpec.Core.Findings;
using BandSpec.Core.Quantities;

namespace BandSpec.Core.Requirements;

/// <summary>Rules that a requirement has to follow whatever the platform and the station.</summary>
internal static class RequirementRules
{
    /// <summary>
    /// The deepest gauge pressure there can be, the negative of the highest atmospheric pressure ever recorded, 1085.7 hPa, rounded up.
    /// </summary>
    private const double DeepestVacuum = -110_000;

    /// <summary>In pascals; the finest differential pressures measured in industry are ten times that.</summary>
    private const double SmallestSpan = 1;

    /// <summary>Judges all of them.</summary>
    public static void Judge(RequirementParts requirement, FileFindings findings)
    {
        if (requirement.Identity is { } identity)
            IdentityRules.Judge(identity, findings);
        if (requirement.Pressure is { } pressure)
            JudgePressure(pressure, findings);
        if (requirement.Output is { } output)
            OutputRules.Judge(output, findings);
        if (requirement.Temperature is { } range)
            JudgeTemperature(range, requirement, findings);
        findings.InRange("safety-factor", requirement.SafetyFactor, AcceptedRanges.SafetyFactor);
        findings.InRange("capability.sample", requirement.Capability?.Sample, AcceptedRanges.Capability);
        findings.InRange("capability.long-run", requirement.Capability?.LongRun, AcceptedRanges.Capability);
        findings.InRange("capability.confidence", requirement.Capability?.Confidence, AcceptedRanges.Confidence);
        if (requirement.FurtherTerms is { } further)
            TermRules.Judge(further, requirement.HeldTerms ?? [], findings);
        findings.InRange("test.guard-band", requirement.Test?.GuardBand, AcceptedRanges.GuardBand);
        findings.InRange("test.risk", requirement.Test?.Risk, AcceptedRanges.Risk);
        JudgeRounding(requirement, findings);
    }

    private static void JudgeTemperature(OperatingTemperature range, RequirementParts requirement, FileFindings findings)
    {
        findings.IsRange("temperature", range);
        if (requirement.Compensation is { } compensation)
            CompensationRules.Judge(compensation, range, findings);
        // Beside a range that is none, everything would be outside it.
        if (range.Lower >= range.Upper)
            return;
        if (requirement.AllowedError is { } regions)
            RegionRules.Judge(regions, range, findings);
        if (requirement.Profile is { } profile)
            ProfileRules.Judge(profile, range, findings);
        JudgeTest(requirement.Test?.Temperatures ?? [], range, findings);
    }

    private static void JudgePressure(PressureRange pressure, FileFindings findings)
    {
        findings.InRange("pressure.lower", pressure.Lower);
        findings.InRange("pressure.upper", pressure.Upper);
        findings.Require(
            pressure.SpanInPascals > 0, "pressure.upper", "pressure-order",
            $"the upper range value {pressure.Upper} is not above the lower, {pressure.Lower}", "upper above lower");
        findings.Require(
            pressure.SpanInPascals is <= 0 or >= SmallestSpan, "pressure.upper", "out-of-range",
            $"a span from {pressure.Lower} to {pressure.Upper}", "a span of at least 1 Pa");
        double deepest = pressure.Reference switch
        {
            PressureReference.Absolute => 0,
            PressureReference.Differential => double.NegativeInfinity,
            _ => DeepestVacuum,
        };
        findings.Require(
            pressure.Lower.Pascals >= deepest, "pressure.lower", "pressure-vacuum", $"{pressure.Lower} is below a perfect vacuum",
            pressure.Reference == PressureReference.Absolute ? "0 or more for an absolute pressure" : "-1.1 bar or more for a gauge pressure");
    }

    private static void JudgeTest(IReadOnlyList<Temperature> temperatures, OperatingTemperature range, FileFindings findings)
    {
        for (int i = 0; i < temperatures.Count; i++)
        {
            Temperature temperature = temperatures[i];
            findings.Require(
                temperature >= range.Lower && temperature <= range.Upper, $"test.temperatures[{i}]",
                "test-temperature", $"{temperature} is outside the operating range", $"{range.Lower} to {range.Upper}");
            findings.Require(
                i == 0 || temperature > temperatures[i - 1], $"test.temperatures[{i}]", "test-temperature",
                $"{temperature} after {temperatures[Math.Max(0, i - 1)]}", "each temperature once, cold to hot");
        }
    }

    private static void JudgeRounding(RequirementParts requirement, FileFindings findings)
    {
        findings.InRange("rounding.band", requirement.Rounding?.Band, AcceptedRanges.RoundingStep);
        findings.InRange("rounding.limit", requirement.Rounding?.Limit, AcceptedRanges.RoundingStep);
        if (requirement.Rounding is not { } rounding || requirement.AllowedError is not { } regions)
            return;
        double tightest = regions.Min(region => Math.Min(region.Limit.Percent, (region.LimitAtEnd ?? region.Limit).Percent));
        findings.Require(
            2 * rounding.Limit.Percent <= tightest, "rounding.limit", "rounding-coarse",
            $"steps of {rounding.Limit} for an allowed error of {PercentOfSpan.FromPercent(tightest)}",
            "at most half the tightest allowed error");
    }
}
