using BandSpec.Core.Findings;
using BandSpec.Core.Quantities;

namespace BandSpec.Core.Requirements;

/// <summary>Rules of the regions of allowed error: they cover the operating range, without a gap and without an overlap.</summary>
internal static class RegionRules
{
    /// <summary>Judges all of them.</summary>
    public static void Judge(IReadOnlyList<AllowedErrorRegion> regions, OperatingTemperature range, FileFindings findings)
    {
        JudgeCover(regions, range, findings);
        for (int i = 0; i < regions.Count; i++)
            JudgeLimits(regions[i], $"allowed-error[{i}]", findings);
    }

    private static void JudgeCover(IReadOnlyList<AllowedErrorRegion> regions, OperatingTemperature range, FileFindings findings)
    {
        Temperature reached = range.Lower;
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
        Temperature upper = range.Upper;
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
}
