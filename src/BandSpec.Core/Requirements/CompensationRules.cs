using System.Globalization;
using BandSpec.Core.Findings;

namespace BandSpec.Core.Requirements;

/// <summary>Rules of the compensation plans that a requirement lets be considered: that there are some, and not too many to prove the best.</summary>
internal static class CompensationRules
{
    /// <summary>
    /// The most temperature lists that are searched. Up to four plans have each, all are looked at, and one core manages some 10⁵ plans a second:
    /// the largest search is a matter of minutes.
    /// </summary>
    internal const double MostLists = 5e6;

    /// <summary>Judges all of them.</summary>
    public static void Judge(CompensationScope scope, OperatingTemperature range, FileFindings findings)
    {
        findings.InRange("compensation.candidate-step", scope.CandidateStep, AcceptedRanges.CandidateStep);
        findings.InRange("compensation.temperatures", scope.FewestTemperatures, AcceptedRanges.PlanTemperatures);
        if (scope.MostTemperatures != scope.FewestTemperatures)
            findings.InRange("compensation.temperatures", scope.MostTemperatures, AcceptedRanges.PlanTemperatures);
        findings.InRange("compensation.separation", scope.Separation, AcceptedRanges.PlanDistance);
        findings.InRange("compensation.reach", scope.Reach, AcceptedRanges.PlanDistance);
        findings.Require(
            scope.FewestTemperatures <= scope.MostTemperatures, "compensation.temperatures", "plan-count",
            $"{scope.FewestTemperatures}..{scope.MostTemperatures}: the fewest are more than the most", "fewest..most, such as `3..6`");
        if (scope.Pinned is { } pinned)
            PinnedPlanRules.Judge(pinned, range, findings);
        bool isCountable = AcceptedRanges.CandidateStep.Holds(scope.CandidateStep.Kelvin) && range.Lower < range.Upper
            && AcceptedRanges.PlanTemperatures.Holds(scope.FewestTemperatures) && AcceptedRanges.PlanTemperatures.Holds(scope.MostTemperatures);
        if (isCountable)
            JudgeLists(scope, range, findings);
    }

    private static void JudgeLists(CompensationScope scope, OperatingTemperature range, FileFindings findings)
    {
        CandidateLists lists = new(scope, range);
        double width = (range.Upper - range.Lower).Kelvin;
        findings.Require(
            lists.Longest >= scope.FewestTemperatures, "compensation.separation", "plan-none", string.Create(
                CultureInfo.InvariantCulture,
                $"no plan: {scope.FewestTemperatures} candidates at least {scope.Separation} apart do not fit into {width} K"),
            $"a smaller separation, or fewer temperatures: {lists.Longest} fit");
        double count = lists.Count();
        findings.Require(
            count <= MostLists, "compensation.candidate-step", "plan-many",
            string.Create(CultureInfo.InvariantCulture, $"{count / 1e6:0.#} million temperature lists to search"),
            string.Create(CultureInfo.InvariantCulture, $"at most {MostLists / 1e6} million: a coarser step, a larger separation or fewer temperatures"));
    }
}
