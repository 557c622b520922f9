using BandSpec.Core.Findings;
using BandSpec.Core.Quantities;

namespace BandSpec.Core.Requirements;

/// <summary>Rules of the temperature profile: bins inside the operating range, cold to hot, each with some time.</summary>
internal static class ProfileRules
{
    /// <summary>Judges all of them.</summary>
    public static void Judge(IReadOnlyList<DwellBin> profile, OperatingTemperature range, FileFindings findings)
    {
        for (int i = 0; i < profile.Count; i++)
            JudgeBin(profile, i, range, findings);
        double life = profile.Sum(bin => bin.Dwell.Hours);
        findings.Require(
            AcceptedRanges.Dwell.Holds(life) || profile.Any(bin => !AcceptedRanges.Dwell.Holds(bin.Dwell.Hours)), "temperature.profile",
            "out-of-range", $"dwells of {Duration.FromHours(life)} in all", AcceptedRanges.Dwell.ToString());
    }

    private static void JudgeBin(IReadOnlyList<DwellBin> profile, int index, OperatingTemperature range, FileFindings findings)
    {
        DwellBin bin = profile[index];
        (Temperature lower, Temperature upper) = (range.Lower, range.Upper);
        string path = $"temperature.profile[{index}]";
        foreach ((string key, Temperature end) in new[] { ("from", bin.From), ("to", bin.To) })
            findings.Require(
                end >= lower && end <= upper, $"{path}.{key}", "profile-outside", $"{end} is outside the operating range", $"{lower} to {upper}");
        findings.Require(bin.From <= bin.To, $"{path}.to", "profile-order", $"the bin ends at {bin.To}, below {bin.From}", "the colder end first");
        findings.Require(
            index == 0 || bin.From >= profile[index - 1].To, $"{path}.from", "profile-overlap",
            $"the bin begins at {bin.From}, before the one before it ends", "bins cold to hot, each beginning where the one before ends or later");
        findings.InRange($"{path}.dwell", bin.Dwell.Hours, AcceptedRanges.Dwell);
    }
}
