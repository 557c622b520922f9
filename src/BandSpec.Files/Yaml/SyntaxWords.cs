using YamlDotNet.Core;

namespace BandSpec.Files.Yaml;

/// <summary>Turns the parser's words for a syntax error into a finding's.</summary>
internal static class SyntaxWords
{
    /// <summary>What is accepted instead of any syntax error.</summary>
    internal const string Accepted = "YAML: `key: value` lines, lists with `- `, indented by spaces, brackets closed";

    /// <summary>A sentence without a full stop.</summary>
    internal static string Of(YamlException fault)
    {
        string words = fault.Message.Trim().TrimEnd('.');
        if (words.Contains("tab", StringComparison.Ordinal))
            return "a tab where only spaces can indent";
        return words.Length == 0 ? "no sense can be made of this" : char.ToLowerInvariant(words[0]) + words[1..];
    }
}

/// <summary>Ends the reading of a file that no tree can be made of; caught in the same room, where it becomes a finding.</summary>
internal sealed class UnreadableException(Extent extent, string rule, string found, string accepted) : Exception(found)
{
    internal Extent Extent { get; } = extent;

    internal string Rule { get; } = rule;

    internal string Accepted { get; } = accepted;
}
