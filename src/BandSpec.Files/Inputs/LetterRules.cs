using BandSpec.Core.Findings;
using BandSpec.Core.Requirements;

namespace BandSpec.Files.Inputs;

/// <summary>The rule that every text which a document shows can be set with the letters that it has.</summary>
internal static class LetterRules
{
    /// <summary>Judges all texts.</summary>
    internal static IEnumerable<Finding> Judge(
        RequirementParts requirement, PlatformParts platform, StationParts station, Func<string, IReadOnlyList<string>> missing) =>
        from text in TextsOf(requirement).Concat(TextsOf(platform)).Append((FieldPath.InStation("station.name"), station.Name))
        where text.Item2 is not null
        let letters = missing(text.Item2)
        where letters.Count > 0
        select new Finding(
            text.Item1, "letter", $"no font of the documents has {string.Join(", ", letters.Select(Named))}", "Latin, Greek and Cyrillic letters");

    private static IEnumerable<(FieldPath, string?)> TextsOf(RequirementParts requirement)
    {
        if (requirement.Identity is { } identity)
        {
            yield return (FieldPath.InRequirement("specification.title"), identity.Title);
            yield return (FieldPath.InRequirement("specification.customer"), identity.Customer);
            yield return (FieldPath.InRequirement("specification.prepared-by"), identity.PreparedBy);
            for (int i = 0; i < identity.Changes.Count; i++)
                yield return (FieldPath.InRequirement($"specification.changes[{i}].text"), identity.Changes[i].Text);
        }
        for (int i = 0; i < (requirement.FurtherTerms?.Count ?? 0); i++)
            yield return (FieldPath.InRequirement($"further-terms[{i}].name"), requirement.FurtherTerms![i].Name);
    }

    private static IEnumerable<(FieldPath, string?)> TextsOf(PlatformParts platform) =>
        [(FieldPath.InPlatform("platform.name"), platform.Name), (FieldPath.InPlatform("platform.revision"), platform.Revision)];

    private static string Named(string letter) => $"`{letter}` (U+{char.ConvertToUtf32(letter, 0):X4})";
}
