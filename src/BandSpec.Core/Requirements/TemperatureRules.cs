using BandSpec.Core.Findings;
using BandSpec.Core.Quantities;

namespace BandSpec.Core.Requirements;

/// <summary>Rules of the operating range, of the regions of allowed error that cover it and of the profile inside it.</summary>
internal static class TemperatureRules
{
    /// <summary>Judges all of them.</summary>
    public static void Judge(Requirement requirement, FileFindings findings)
    {
        findings.IsRange("temperature", requirement.Temperature);
        // Beside a range that is none, everything would be outside it.
        if (requirement.Temperature.Lower >= requirement.Temperature.Upper)
            return;
        JudgeRegions(requirement, findings);
        for (int i = 0; i < requirement.AllowedError.Count; i++)
            JudgeLimits(requirement.AllowedError[i], $"allowed-error[{i}]", findings);
        for (int i = 0; i < requirement.Profile.Count; i++)
            JudgeBin(requirement, i, findings);
        double life = requirement.Profile.Sum(bin => bin.Dwell.Hours);
        findings.Require(
            AcceptedRanges.Dwell.Holds(life) || requirement.Profile.Any(bin => !AcceptedRanges.Dwell.Holds(bin.Dwell.Hours)), "temperature.profile", "out-of-range", $"dwells of {Duration.FromHours(life)} in all",
            AcceptedRanges.Dwell.ToString());
    }

    private static void JudgeRegions(Requirement requirement, FileFindings findings)
    {
        IReadOnlyList<AllowedErrorRegion> regions = requirement.AllowedError;
        Temperature reached = requirement.Temperature.Lower;
        for (int i = 0; i < regions.Count; i++)
        {
            string path = $"allowed-error[{i}]";
            findings.Require(
                regions[i].From <= reached, $"{path}.from", "region-gap", $"nothing is allowed between {reached} and {regions[i].From}",
                i == 0 ? $"begin at the lower operating temperature, {reached}" : $"begin where the region before ends, {reached}");
            findings.Require(
                regions[i].From >= reached, $"{path}.from", "region-overlap",
                i == 0 ? $"the region begins at {regions[i].From}, below the operating range" : $"the region begins before {reached}, where the one before ends",
                $"begin at {reached}");
            findings.Require(
                regions[i].To > regions[i].From, $"{path}.to", "region-order", $"the region ends at {regions[i].To}, where it begins or below",
                "the colder end first");
            reached = Temperature.Max(reached, regions[i].To);
        }
        Temperature upper = requirement.Temperature.Upper;
        findings.Require(
            reached == upper, $"allowed-error[{regions.Count - 1}].to", reached < upper ? "region-gap" : "region-overlap",
            reached < upper ? $"nothing is allowed between {reached} and {upper}" : $"the last region ends at {reached}, above the operating range",
            $"end at the upper operating temperature, {upper}");
    }

    private static void JudgeLimits(AllowedErrorRegion region, string path, FileFindings findings)
    {
        findings.InRange($"{path}.limit", region.Limit, AcceptedRanges.Limit);
        if (region.LimitAtEnd is { } end)
            findings.InRange($"{path}.limit-at-end", end, AcceptedRanges.Limit);
        findings.InRange($"{path}.of-reading", 100 * region.OfReading, AcceptedRanges.OfReading);
    }

    private static void JudgeBin(Requirement requirement, int index, FileFindings findings)
    {
        DwellBin bin = requirement.Profile[index];
        (Temperature lower, Temperature upper) = (requirement.Temperature.Lower, requirement.Temperature.Upper);
        string path = $"temperature.profile[{index}]";
        foreach ((string key, Temperature end) in new[] { ("from", bin.From), ("to", bin.To) })
            findings.Require(
                end >= lower && end <= upper, $"{path}.{key}", "profile-outside", $"{end} is outside the operating range", $"{lower} to {upper}");
        findings.Require(bin.From <= bin.To, $"{path}.to", "profile-order", $"the bin ends at {bin.To}, below {bin.From}", "the colder end first");
        findings.Require(
            index == 0 || bin.From >= requirement.Profile[index - 1].To, $"{path}.from", "profile-overlap",
            $"the bin begins at {bin.From}, before the one before it ends", "bins cold to hot, each beginning where the one before ends or later");
        findings.InRange($"{path}.dwell", bin.Dwell.Hours, AcceptedRanges.Dwell);
    }
}
