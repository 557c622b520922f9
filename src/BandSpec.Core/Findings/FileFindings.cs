namespace BandSpec.Core.Findings;

/// <summary>Gathers what the rules find in one input.</summary>
/// <param name="file">The input.</param>
/// <param name="findings">Where the findings of all inputs go.</param>
internal sealed class FileFindings(InputFile file, List<Finding> findings)
{
    /// <summary>Adds a finding unless a rule holds.</summary>
    /// <param name="holds">Whether the rule holds.</param>
    /// <param name="path">The field.</param>
    /// <param name="rule">The rule's name.</param>
    /// <param name="found">What was found.</param>
    /// <param name="accepted">What is accepted instead.</param>
    public void Require(bool holds, string path, string rule, string found, string accepted)
    {
        if (!holds)
            Add(path, rule, found, accepted);
    }

    /// <summary>Adds a finding.</summary>
    public void Add(string path, string rule, string found, string accepted, string? nearest = null, bool atKey = false) =>
        findings.Add(new Finding(new FieldPath(file, path), rule, found, accepted) { Nearest = nearest, AtKey = atKey });
}
