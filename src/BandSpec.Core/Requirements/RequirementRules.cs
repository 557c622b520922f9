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
    public static void Judge(Requirement requirement, FileFindings findings)
    {
        IdentityRules.Judge(requirement.Identity, findings);
        JudgePressure(requirement.Pressure, findings);
        OutputRules.Judge(requirement.Output, findings);
        TemperatureRules.Judge(requirement, findings);
        CompensationRules.Judge(requirement, findings);
        findings.InRange("safety-factor", requirement.SafetyFactor, AcceptedRanges.SafetyFactor);
        findings.InRange("capability.sample", requirement.Capability.Sample, AcceptedRanges.Capability);
        findings.InRange("capability.long-run", requirement.Capability.LongRun, AcceptedRanges.Capability);
        TermRules.Judge(requirement, findings);
        JudgeTest(requirement, findings);
        JudgeRounding(requirement, findings);
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

    private static void JudgeTest(Requirement requirement, FileFindings findings)
    {
        findings.InRange("test.guard-band", requirement.Test.GuardBand, AcceptedRanges.GuardBand);
        IReadOnlyList<Temperature> temperatures = requirement.Test.Temperatures ?? [];
        for (int i = 0; i < temperatures.Count; i++)
        {
            Temperature temperature = temperatures[i];
            findings.Require(
                temperature >= requirement.Temperature.Lower && temperature <= requirement.Temperature.Upper, $"test.temperatures[{i}]",
                "test-temperature", $"{temperature} is outside the operating range",
                $"{requirement.Temperature.Lower} to {requirement.Temperature.Upper}");
            findings.Require(
                i == 0 || temperature > temperatures[i - 1], $"test.temperatures[{i}]", "test-temperature",
                $"{temperature} after {temperatures[Math.Max(0, i - 1)]}", "each temperature once, cold to hot");
        }
    }

    private static void JudgeRounding(Requirement requirement, FileFindings findings)
    {
        findings.InRange("rounding.band", requirement.Rounding.Band, AcceptedRanges.RoundingStep);
        findings.InRange("rounding.limit", requirement.Rounding.Limit, AcceptedRanges.RoundingStep);
        double tightest = requirement.AllowedError.Min(region => Math.Min(region.Limit.Percent, (region.LimitAtEnd ?? region.Limit).Percent));
        findings.Require(
            2 * requirement.Rounding.Limit.Percent <= tightest, "rounding.limit", "rounding-coarse",
            $"steps of {requirement.Rounding.Limit} for an allowed error of {PercentOfSpan.FromPercent(tightest)}",
            "at most half the tightest allowed error");
    }
}
