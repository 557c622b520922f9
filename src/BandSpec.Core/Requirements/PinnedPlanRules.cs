using BandSpec.Core.Findings;
using BandSpec.Core.Quantities;

namespace BandSpec.Core.Requirements;

/// <summary>Rules of a plan that the requirement fixes.</summary>
internal static class PinnedPlanRules
{
    private const string Place = "compensation.plan";

    /// <summary>Judges what can be judged without the platform and the station.</summary>
    public static void Judge(PinnedPlan plan, OperatingTemperature range, FileFindings findings)
    {
        AcceptedRange counts = AcceptedRanges.PlanTemperatures;
        findings.Require(
            counts.Holds(plan.Temperatures.Count), Place, "pinned-count", $"a plan of {plan.Temperatures.Count} temperatures",
            $"{counts.Least} to {counts.Most} temperatures; degrees go with a plan");
        for (int i = 0; i < plan.Temperatures.Count; i++)
        {
            Temperature temperature = plan.Temperatures[i];
            findings.Require(
                i == 0 || temperature > plan.Temperatures[i - 1], $"{Place}[{i}]", "pinned-order",
                $"{temperature} after {plan.Temperatures[Math.Max(0, i - 1)]}", "each temperature once, cold to hot");
            findings.Require(
                temperature >= range.Lower && temperature <= range.Upper, $"{Place}[{i}]", "pinned-range",
                $"{temperature} is outside the operating range", $"{range.Lower} to {range.Upper}");
        }

        JudgeDegree("zero-degree", plan.ZeroDegree, plan.Temperatures.Count - 1, "the plan's temperatures", findings);
        JudgeDegree("span-degree", plan.SpanDegree, plan.Temperatures.Count - 1, "the plan's temperatures", findings);
    }

    /// <summary>Judges how the plan fits the platform's correction.</summary>
    public static void JudgeWith(PinnedPlan plan, PlatformParts platform, FileFindings findings)
    {
        if (platform.ZeroDegree is { } zero)
            JudgeDegree("zero-degree", plan.ZeroDegree, zero, "the platform's correction", findings);
        if (platform.SpanDegree is { } span)
            JudgeDegree("span-degree", plan.SpanDegree, span, "the platform's correction", findings);
    }

    private static void JudgeDegree(string key, int? degree, int most, string source, FileFindings findings)
    {
        if (degree is { } d)
            findings.Require(
                d >= 1 && d <= Math.Max(1, most), $"compensation.{key}", "pinned-degree", $"degree {d}", $"1 to {Math.Max(1, most)}, by {source}");
    }
}
