using System.Globalization;
using BandSpec.Core.Findings;
using BandSpec.Core.Requirements;
using BandSpec.Core.Specifying;

namespace BandSpec.Core.Revisions;

/// <summary>What may be released, and what a released revision may no longer be.</summary>
public static class ReleaseRules
{
    private const string RevisionField = "specification.revision";
    private const int LongestName = 100;

    /// <summary>
    /// What keeps a finished specification from being released: it does not fit, its plan is not proven, its revision was released before, or
    /// its revision history says nothing about it.
    /// </summary>
    /// <param name="specification">The finished record.</param>
    /// <param name="earlier">Everything released from the requirement's folder so far.</param>
    public static IReadOnlyList<Finding> FindingsIn(Specification specification, IEnumerable<Release> earlier)
    {
        ArgumentNullException.ThrowIfNull(specification);
        List<Finding> all = [];
        FileFindings findings = new(InputFile.Requirement, all);
        SpecificationIdentity identity = specification.Application.Requirement.Identity;
        findings.Require(
            specification.Feasible, "allowed-error", "release-feasible",
            string.Create(CultureInfo.InvariantCulture, $"no plan fits: the best has a margin of {specification.Bands.Margin:0.0000}"),
            "an application that a plan fits with a margin of at least 1");
        findings.Require(
            specification.Optimum.Proven, "compensation", "release-proven", "a search for the best plan that was ended before it had its proof",
            "a search that comes to its end");
        if (Find(identity, earlier) is { } past)
            findings.Add(RevisionField, "release-new", $"{Told(past)}", "a revision that was not released before");
        findings.Require(
            identity.Changes.Any(change => change.Revision == identity.Revision), "specification.changes", "release-changes",
            $"no line about revision {identity.Revision}", $"a line that says what changed in revision {identity.Revision}");
        return all;
    }

    /// <summary>
    /// What keeps a draft from being made: its number and revision were released with other inputs. One finding for each input that changed.
    /// </summary>
    /// <param name="identity">The draft's number and revision.</param>
    /// <param name="inputs">Its inputs.</param>
    /// <param name="earlier">Everything released from the requirement's folder so far.</param>
    public static IReadOnlyList<Finding> ChangesSince(
        SpecificationIdentity identity, IReadOnlyList<InputDigest> inputs, IEnumerable<Release> earlier)
    {
        if (Find(identity, earlier) is not { } past)
            return [];
        List<Finding> all = [];
        FileFindings findings = new(InputFile.Requirement, all);
        foreach (InputDigest released in past.Inputs)
            if (inputs.FirstOrDefault(input => input.File == released.File) is { } now && now.Digest != released.Digest)
                findings.Add(
                    RevisionField, "released", $"{Told(past)}; since then the {Words.Of(now.File)} has changed, {now.Name}",
                    "a new revision with its line in `changes`, or the inputs as they were released");
        return all;
    }

    /// <summary>The release of a number and revision, if there was one.</summary>
    public static Release? Find(SpecificationIdentity identity, IEnumerable<Release> earlier)
    {
        ArgumentNullException.ThrowIfNull(identity);
        ArgumentNullException.ThrowIfNull(earlier);
        return earlier.FirstOrDefault(release => release.Number == identity.Number && release.Revision == identity.Revision);
    }

    /// <summary>Whether somebody can release under a name: one line of words.</summary>
    public static bool IsName(string name) =>
        !string.IsNullOrWhiteSpace(name) && name.Trim() == name && name.Length <= LongestName && !name.Any(char.IsControl);

    private static string Told(Release release) => string.Create(
        CultureInfo.InvariantCulture, $"{release.Number} revision {release.Revision} was released by {release.By} on {release.At:yyyy-MM-dd}");
}
