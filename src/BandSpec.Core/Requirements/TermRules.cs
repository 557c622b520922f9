using BandSpec.Core.Findings;

namespace BandSpec.Core.Requirements;

/// <summary>Rules of the terms that a requirement holds and of those that it adds.</summary>
internal static class TermRules
{
    private const int LongestName = 60;

    /// <summary>Terms that have a share of the allowed error, so that their limit can be fixed.</summary>
    internal static IReadOnlyList<string> Holdable { get; } =
    [
        "zero-residue", "span-residue", "linearity-residue", "carried-noise", "pressure-hysteresis", "thermal-hysteresis", "repeatability", "ageing",
    ];

    /// <summary>Terms that are what they are: nobody can share anything out to them.</summary>
    internal static IReadOnlyList<string> Fixed { get; } = ["pressure-standard", "resolution"];

    /// <summary>Judges all of them.</summary>
    public static void Judge(IReadOnlyList<FurtherTerm> further, IReadOnlyList<HeldTerm> heldTerms, FileFindings findings)
    {
        for (int i = 0; i < further.Count; i++)
            JudgeFurther(further, i, findings);
        string[] names = [.. Holdable, .. further.Select(term => term.Name)];
        foreach (HeldTerm held in heldTerms)
            JudgeHeld(held, names, findings);
    }

    private static void JudgeFurther(IReadOnlyList<FurtherTerm> further, int index, FileFindings findings)
    {
        FurtherTerm term = further[index];
        string path = $"further-terms[{index}]";
        findings.FitsLine($"{path}.name", term.Name, LongestName);
        findings.InRange($"{path}.bound", term.Bound, AcceptedRanges.Spread);
        findings.InRange($"{path}.sigma", term.Sigma, AcceptedRanges.Spread);
        findings.Require(
            term.Bound.Percent != 0 || term.Sigma.Percent != 0, $"{path}.sigma", "further-term-empty", "a term that neither adds nor scatters",
            "a bound or a sigma above 0");
        bool isTaken = Holdable.Concat(Fixed).Concat(further.Take(index).Select(other => other.Name))
            .Contains(term.Name, StringComparer.OrdinalIgnoreCase);
        findings.Require(!isTaken, $"{path}.name", "further-term-name", $"`{term.Name}` is already the name of a term", "a name of its own");
    }

    private static void JudgeHeld(HeldTerm held, string[] names, FileFindings findings)
    {
        string path = $"held-terms.{held.Term}";
        findings.InRange(path, held.Limit, AcceptedRanges.Limit);
        if (Fixed.Contains(held.Term))
            findings.Add(path, "held-fixed", $"`{held.Term}` cannot be held: it has no share to limit", string.Join(", ", names), atKey: true);
        else if (!names.Contains(held.Term))
            findings.Add(
                path, "held-unknown", $"`{NameRules.Cut(held.Term)}` is not the name of a term", string.Join(", ", names),
                Spelling.Nearest(held.Term, names), atKey: true);
    }
}
