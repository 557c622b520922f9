using BandSpec.Core.Findings;

namespace BandSpec.Files.Yaml;

/// <summary>Gathers what is found wrong with one file while it is read.</summary>
internal sealed class FoundFaults(InputFile file)
{
    /// <summary>More findings than this help nobody; a file of noise would otherwise print a page for each line.</summary>
    internal const int MostFindings = 100;

    private readonly List<LocatedFinding> findings = [];

    /// <summary>Everything found so far, in the order in which it was found.</summary>
    internal IReadOnlyList<LocatedFinding> All => findings;

    /// <summary>How many there are.</summary>
    internal int Count => findings.Count;

    /// <summary>Adds a finding about a value; beyond <see cref="MostFindings"/> only the fact that there are more.</summary>
    internal void Add(Extent extent, string path, string rule, string found, string accepted, string? nearest = null, bool atKey = false)
    {
        FieldPath field = new(file, path);
        if (findings.Count < MostFindings)
            findings.Add(new(new Finding(field, rule, found, accepted) { Nearest = nearest, AtKey = atKey }, extent));
        else if (findings.Count == MostFindings)
            findings.Add(new(new Finding(field, "too-many-findings", $"more than {MostFindings} findings", "correct those listed first"), extent));
    }
}

/// <summary>A finding and where in its file it stands.</summary>
/// <param name="Finding">The finding.</param>
/// <param name="Extent">The place a caret points at.</param>
internal sealed record LocatedFinding(Finding Finding, Extent Extent);
