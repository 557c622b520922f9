namespace BandSpec.Files.Yaml;

/// <summary>
/// Finds numbers with a decimal comma inside braces, where YAML takes the comma for the end of the value: <c>{ upper: 2,5 bar }</c> is the key
/// <c>upper</c> with 2, and a key <c>5 bar</c> without a value. It is the most usual slip of those who write a comma, and the two findings that
/// it would make otherwise are hard to understand.
/// </summary>
internal static class SplitNumbers
{
    /// <summary>The entries with each such number joined again, after a finding for it.</summary>
    internal static List<MapEntry> Join(List<MapEntry> entries, FoundFaults faults)
    {
        List<MapEntry> joined = [];
        foreach (MapEntry entry in entries)
        {
            if (joined.Count == 0 || !IsRest(joined[^1].Value, entry))
            {
                joined.Add(entry);
                continue;
            }
            ScalarNode whole = (ScalarNode)joined[^1].Value, rest = entry.Key;
            Extent extent = whole.Extent with { Length = rest.Extent.Column + rest.Extent.Length - whole.Extent.Column };
            faults.Add(
                extent, joined[^1].Key.Text, "number", $"`{whole.Text},{rest.Text}` has a comma, which ends the value here",
                $"a decimal point: {whole.Text}.{rest.Text}");
            joined[^1] = joined[^1] with { Value = new ScalarNode(extent, $"{whole.Text}.{rest.Text}", false) };
        }
        return joined;
    }

    private static bool IsRest(YamlNode before, MapEntry entry) =>
        before is ScalarNode { IsQuoted: false } whole && entry.Value is ScalarNode { Text.Length: 0, IsQuoted: false }
        && whole.Text.Length > 0 && char.IsAsciiDigit(whole.Text[^1]) && char.IsAsciiDigit(entry.Key.Text.FirstOrDefault())
        && entry.Key.Extent.Line == whole.Extent.Line && entry.Key.Extent.Column == whole.Extent.Column + whole.Extent.Length + 1;
}
