using BandSpec.Core.Findings;

namespace BandSpec.Core.Requirements;

/// <summary>Rules of a specification's identity: its names, its dates and its revision history.</summary>
internal static class IdentityRules
{
    private const int LongestNumber = 60;
    private const int LongestRevision = 12;
    private static readonly DateOnly Earliest = new(1990, 1, 1), Latest = new(2199, 12, 31);

    /// <summary>Judges all of them.</summary>
    public static void Judge(SpecificationIdentity identity, FileFindings findings)
    {
        findings.FitsFolder("specification.number", identity.Number, LongestNumber);
        findings.FitsFolder("specification.revision", identity.Revision, LongestRevision);
        findings.FitsLine("specification.title", identity.Title);
        findings.FitsLine("specification.customer", identity.Customer);
        findings.FitsLine("specification.prepared-by", identity.PreparedBy);
        findings.Require(
            identity.Date >= Earliest && identity.Date <= Latest, "specification.date", "date", Written(identity.Date),
            $"{Written(Earliest)} to {Written(Latest)}");
        for (int i = 0; i < identity.Changes.Count; i++)
            JudgeChange(identity, i, findings);
        JudgeLast(identity, findings);
    }

    private static void JudgeChange(SpecificationIdentity identity, int index, FileFindings findings)
    {
        RevisionNote change = identity.Changes[index];
        string path = $"specification.changes[{index}]";
        findings.FitsLine($"{path}.text", change.Text);
        findings.Require(
            change.Date <= identity.Date, $"{path}.date", "changes-date",
            $"a change on {Written(change.Date)}, after the date of the specification, {Written(identity.Date)}", $"{Written(identity.Date)} or earlier");
        findings.Require(
            index == 0 || change.Date >= identity.Changes[index - 1].Date, $"{path}.date", "changes-order",
            $"{Written(change.Date)} after a line of {Written(identity.Changes[Math.Max(0, index - 1)].Date)}", "the newest change last");
        int first = identity.Changes.ToList().FindIndex(other => other.Revision == change.Revision);
        findings.Require(first == index, $"{path}.revision", "changes-revision", $"revision {change.Revision} a second time", "each revision once");
    }

    private static void JudgeLast(SpecificationIdentity identity, FileFindings findings)
    {
        string? last = identity.Changes.Count == 0 ? null : identity.Changes[^1].Revision;
        findings.Require(
            last == identity.Revision, "specification.changes", "changes-revision",
            last is null ? "an empty revision history" : $"the last line is about revision {last}",
            $"a last line that says what changed in revision {identity.Revision}");
    }

    private static string Written(DateOnly date) => date.ToString("yyyy-MM-dd", null);
}
