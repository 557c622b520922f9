using System.Text;
using BandSpec.Core.Findings;
using BandSpec.Files.Yaml;

namespace BandSpec.Files.Inputs;

/// <summary>
/// One value of an input replaced by another, for what-if questions: <c>station.soak-gradient=0.5</c>. Paths that begin with
/// <c>platform.</c> or <c>station.</c> are in those files, all others in the requirement. The file's text is changed in memory, so that
/// every rule is applied to the change as if it had been written there.
/// </summary>
/// <param name="File">The input that the value is in.</param>
/// <param name="Path">The field's path in it.</param>
/// <param name="Value">The new value as it was written.</param>
public sealed record InputChange(InputFile File, string Path, string Value)
{
    /// <summary>A change from <c>path=value</c>.</summary>
    /// <exception cref="FormatException">There is no path, no value, or no <c>=</c> between them.</exception>
    public static InputChange Parse(string text)
    {
        ArgumentNullException.ThrowIfNull(text);
        int equals = text.IndexOf('=', StringComparison.Ordinal);
        if (equals <= 0 || equals == text.Length - 1)
            throw new FormatException($"`{text}`: a change is written PATH=VALUE, such as station.soak-gradient=0.5");
        return Of(text[..equals].Trim(), text[(equals + 1)..].Trim());
    }

    /// <summary>A change of the value at a path.</summary>
    public static InputChange Of(string path, string value)
    {
        ArgumentNullException.ThrowIfNull(path);
        foreach ((string prefix, InputFile file) in new[] { ("platform.", InputFile.Platform), ("station.", InputFile.Station), ("requirement.", InputFile.Requirement) })
            if (path.StartsWith(prefix, StringComparison.Ordinal))
                return new InputChange(file, path[prefix.Length..], value);
        return new InputChange(InputFile.Requirement, path, value);
    }

    /// <summary>The path with its file, as it is written on a command line.</summary>
    public string Name => File == InputFile.Requirement ? Path : $"{(File == InputFile.Platform ? "platform" : "station")}.{Path}";

    /// <summary>
    /// The content with the change made; a bare number keeps the unit of the number that it replaces.
    /// </summary>
    /// <exception cref="FormatException">There is no single value at the path.</exception>
    public InputContent In(InputContent content)
    {
        ArgumentNullException.ThrowIfNull(content);
        if (content.Refusal is not null)
            return content;
        FoundFaults faults = new(File);
        SourceText text = SourceText.Decode(content.Bytes.Span, faults);
        YamlNode? root = faults.Count == 0 ? TreeReading.Read(text, faults) : null;
        if (root is null || faults.Count > 0)
            return content; // what keeps it from being read is a finding when it is read
        ScalarNode old = Locating.Value(root, Path) as ScalarNode
            ?? throw new FormatException($"`{Name}`: there is no single value at this path in {content.Name}");
        string[] lines = [.. text.Lines];
        string line = lines[old.Extent.Line - 1];
        int start = old.Extent.Column - 1;
        lines[old.Extent.Line - 1] = string.Concat(line.AsSpan(0, start), Replacement(old), line.AsSpan(start + old.Extent.Length));
        return InputContent.Of(content.Name, Encoding.UTF8.GetBytes(string.Join('\n', lines)));
    }

    private string Replacement(ScalarNode old)
    {
        int unit = old.Text.IndexOf(' ', StringComparison.Ordinal);
        string value = unit > 0 && double.TryParse(Value, System.Globalization.CultureInfo.InvariantCulture, out _) ? Value + old.Text[unit..] : Value;
        return old.IsQuoted ? $"\"{value}\"" : value;
    }
}
