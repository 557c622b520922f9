namespace BandSpec.Files.Yaml;

/// <summary>A node of a YAML document with its place; the tree is plain: no anchors, no aliases, no tags.</summary>
/// <param name="Extent">Where it stands; of a list or a map, where it begins.</param>
internal abstract record YamlNode(Extent Extent);

/// <summary>A single value as it was written.</summary>
/// <param name="Extent">Where it stands.</param>
/// <param name="Text">The text without quotes.</param>
/// <param name="IsQuoted">Whether it was in quotes, or a block of text.</param>
internal sealed record ScalarNode(Extent Extent, string Text, bool IsQuoted) : YamlNode(Extent);

/// <summary>A list.</summary>
/// <param name="Extent">Where it begins.</param>
/// <param name="Items">Its items.</param>
internal sealed record ListNode(Extent Extent, IReadOnlyList<YamlNode> Items) : YamlNode(Extent);

/// <summary>A map; each key is there once.</summary>
/// <param name="Extent">Where it begins.</param>
/// <param name="Entries">Keys and values in the order of the file.</param>
internal sealed record MapNode(Extent Extent, IReadOnlyList<MapEntry> Entries) : YamlNode(Extent)
{
    /// <summary>The entry of a key, if it is there.</summary>
    internal MapEntry? Find(string key) => Entries.FirstOrDefault(entry => entry.Key.Text == key);
}

/// <summary>One key of a map and its value.</summary>
/// <param name="Key">The key.</param>
/// <param name="Value">The value.</param>
internal sealed record MapEntry(ScalarNode Key, YamlNode Value);

/// <summary>A node that was already found at fault while the tree was built, such as an alias: nothing more is said about it.</summary>
/// <param name="Extent">Where it stands.</param>
internal sealed record RefusedNode(Extent Extent) : YamlNode(Extent);
