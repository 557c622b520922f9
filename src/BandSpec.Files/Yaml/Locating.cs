namespace BandSpec.Files.Yaml;

/// <summary>Turns a field's path into its place in the tree.</summary>
internal static class Locating
{
    /// <summary>
    /// Where a field stands; where the nearest thing around it stands when the field itself was left out.
    /// </summary>
    /// <param name="root">The root of the file's tree.</param>
    /// <param name="path">Keys joined by points, list items as <c>[2]</c>; a key may itself have points and brackets.</param>
    /// <param name="atKey">Whether the key is meant, not its value.</param>
    internal static Extent Find(YamlNode root, string path, bool atKey)
    {
        (YamlNode node, Extent extent) = (root, root.Extent);
        while (path.Length > 0)
        {
            (YamlNode Node, Extent Extent, int Length)? step = node switch
            {
                MapNode map => IntoMap(map, path, atKey),
                ListNode list => IntoList(list, path),
                _ => null,
            };
            if (step is not { } taken)
                break;
            (node, extent) = (taken.Node, taken.Extent);
            path = path[taken.Length..].TrimStart('.');
        }
        return extent;
    }

    /// <summary>The node at a path; null when there is none.</summary>
    internal static YamlNode? Value(YamlNode root, string path)
    {
        YamlNode node = root;
        while (path.Length > 0)
        {
            (YamlNode Node, Extent Extent, int Length)? step = node switch
            {
                MapNode map => IntoMap(map, path, atKey: false),
                ListNode list => IntoList(list, path),
                _ => null,
            };
            if (step is not { } taken)
                return null;
            node = taken.Node;
            path = path[taken.Length..].TrimStart('.');
        }
        return node;
    }

    private static (YamlNode Node, Extent Extent, int Length)? IntoMap(MapNode map, string path, bool atKey)
    {
        MapEntry? entry = map.Entries
            .Where(candidate => path.StartsWith(candidate.Key.Text, StringComparison.Ordinal) && EndsKey(path, candidate.Key.Text.Length))
            .MaxBy(candidate => candidate.Key.Text.Length);
        return entry is null ? null
            : (entry.Value, atKey || entry.Value is not ScalarNode ? entry.Key.Extent : entry.Value.Extent, entry.Key.Text.Length);
    }

    private static (YamlNode Node, Extent Extent, int Length)? IntoList(ListNode list, string path)
    {
        int end = path.IndexOf(']', StringComparison.Ordinal);
        if (path[0] != '[' || end < 2 || !int.TryParse(path.AsSpan(1, end - 1), out int index) || index < 0 || index >= list.Items.Count)
            return null;
        return (list.Items[index], list.Items[index].Extent, end + 1);
    }

    private static bool EndsKey(string path, int length) => length == path.Length || path[length] is '.' or '[';
}
