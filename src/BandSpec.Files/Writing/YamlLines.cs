using System.Text;

namespace BandSpec.Files.Writing;

/// <summary>Lines of a YAML file with remarks beside or above them.</summary>
/// <param name="remarks">What is said about which key; the first remark stands beside a line when it fits, the others above.</param>
internal sealed class YamlLines(IReadOnlyDictionary<string, IReadOnlyList<string>> remarks)
{
    /// <summary>Where remarks begin, unless the line is longer.</summary>
    private const int RemarkColumn = 70;

    private readonly StringBuilder text = new();

    /// <summary>Adds a line with its remark.</summary>
    public void Add(string line, string key = "")
    {
        IReadOnlyList<string> said = remarks.GetValueOrDefault(key) ?? [];
        text.Append(said.Count > 0 ? $"{line.PadRight(RemarkColumn)} # {string.Join("; ", said)}" : line).Append('\n');
    }

    /// <summary>Adds remarks as lines of their own.</summary>
    public void Above(string key)
    {
        foreach (string remark in remarks.GetValueOrDefault(key) ?? [])
            text.Append("# ").Append(remark).Append('\n');
    }

    /// <summary>A text as it has to be written: in quotes where YAML would read it as something else.</summary>
    public static string Text(string value)
    {
        bool plain = value.Length > 0 && (char.IsLetter(value[0]) || int.TryParse(value, out _))
            && value.AsSpan().IndexOfAny(":#{}[],&*!|>'\"%@`\\") < 0 && value.Trim() == value && !value.Any(char.IsControl)
            && value.ToLowerInvariant() is not ("true" or "false" or "null" or "yes" or "no" or "on" or "off");
        return plain ? value : $"\"{value.Replace("\\", "\\\\", StringComparison.Ordinal).Replace("\"", "\\\"", StringComparison.Ordinal)}\"";
    }

    /// <summary>The whole text.</summary>
    public override string ToString() => text.ToString();
}
