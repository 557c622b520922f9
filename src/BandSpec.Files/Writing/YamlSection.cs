namespace BandSpec.Files.Writing;

/// <summary>Which lines of a YAML file belong to a key.</summary>
internal static class YamlSection
{
    /// <summary>The lines of a key at the margin with the remarks right above it; an empty stretch at the end when the key is not there.</summary>
    public static (int Begin, int End) WithRemarks(List<string> lines, string key)
    {
        (int begin, int end) = Of(lines, key, 0, 0, lines.Count);
        while (begin > 0 && begin < lines.Count && lines[begin - 1].StartsWith('#'))
            begin--;
        return (begin, end);
    }

    /// <summary>The lines of a key and all that belongs to it; an empty stretch at the end when the key is not there.</summary>
    /// <param name="lines">The file.</param>
    /// <param name="key">The key with its colon.</param>
    /// <param name="indent">How far it is indented.</param>
    /// <param name="from">The first line to look at.</param>
    /// <param name="to">The line after the last one to look at.</param>
    public static (int Begin, int End) Of(List<string> lines, string key, int indent, int from, int to)
    {
        int begin = lines.FindIndex(from, to - from, line => line.StartsWith(new string(' ', indent) + key, StringComparison.Ordinal));
        if (begin < 0)
            return (to, to);
        int end = begin + 1;
        for (int line = end; line < to && (IsBetween(lines[line]) || Belongs(lines[line], indent)); line++)
            end = IsBetween(lines[line]) ? end : line + 1;
        return (begin, end);
    }

    /// <summary>An empty line or a remark: belongs to the key when more of it follows.</summary>
    private static bool IsBetween(string line) => line.AsSpan().TrimStart() is var text && (text.IsEmpty || text[0] == '#');

    private static bool Belongs(string line, int indent) =>
        line.StartsWith(new string(' ', indent + 1), StringComparison.Ordinal) || line.AsSpan().TrimStart() is ['}' or ']', ..];
}
