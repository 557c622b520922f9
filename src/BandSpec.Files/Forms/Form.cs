using System.Text.Json;
using BandSpec.Files.Yaml;

namespace BandSpec.Files.Forms;

/// <summary>
/// What may stand at a place of an input file: one description from which a node is read and a JSON Schema is written, so that the two cannot
/// come apart.
/// </summary>
internal abstract class Form
{
    /// <summary>What is accepted, in the words of a finding: <c>a temperature with its unit, such as `25 °C`</c>.</summary>
    internal abstract string Accepted { get; }

    /// <summary>Reads a node. Null, and at least one finding, when it does not follow the form.</summary>
    internal abstract object? Read(YamlNode node, string path, Reading reading);

    /// <summary>Writes the members of the JSON Schema that describe the form, into an object that is already open.</summary>
    internal abstract void Describe(Utf8JsonWriter schema);

    /// <summary>The path of a key below another.</summary>
    internal static string Join(string path, string key) => path.Length == 0 ? key : $"{path}.{key}";

    /// <summary>Adds the finding that a list or a map stands where something else is accepted, or the other way round.</summary>
    private protected object? RefuseKind(YamlNode node, string path, Reading reading)
    {
        string? found = node switch
        {
            ListNode => "a list",
            MapNode => "keys with values",
            ScalarNode { Text.Length: 0 } => "nothing is written here",
            ScalarNode scalar => $"`{Shorten(scalar.Text)}`",
            _ => null,
        };
        if (found is not null)
            reading.Faults.Add(node.Extent, path, "kind", found, Accepted);
        return null;
    }

    /// <summary>A text as it is repeated in a finding: not longer than a line.</summary>
    internal static string Shorten(string text) => text.Length <= 60 ? text : string.Concat(text.AsSpan(0, 57), "...");
}

/// <summary>What a form needs besides the node: where findings go, and the span for errors that are written as a pressure.</summary>
internal sealed class Reading(FoundFaults faults, double? spanInPascals)
{
    /// <summary>Where findings go.</summary>
    internal FoundFaults Faults { get; } = faults;

    /// <summary>The calibrated span of the requirement in pascals; <see langword="null"/> when the requirement does not give one.</summary>
    internal double? SpanInPascals { get; } = spanInPascals;

    /// <summary>Whether a span was needed and not there: what was read is then not to be used, although nothing is wrong with it.</summary>
    internal bool SpanIsMissed { get; set; }
}
