using System.Text.Json;
using BandSpec.Core.Findings;
using BandSpec.Files.Yaml;

namespace BandSpec.Files.Forms;

/// <summary>A map with known keys.</summary>
/// <param name="what">What the map is, in words.</param>
/// <param name="keys">Its keys in the order in which they are usually written.</param>
/// <param name="build">Makes the record of values that were all read; null when it added a finding.</param>
/// <param name="isLenient">Whether the record is made also when some values could not be read: it then has to ask for each.</param>
internal sealed class MapForm<T>(string what, IReadOnlyList<Key> keys, Func<MapValues, T?> build, bool isLenient = false) : Form
    where T : class
{
    internal override string Accepted => $"{what}: the keys {string.Join(", ", keys.Select(key => key.Name))}";

    internal override object? Read(YamlNode node, string path, Reading reading)
    {
        if (node is not MapNode map)
            return RefuseKind(node, path, reading);
        Dictionary<Key, MapEntry> entries = Match(map, path, reading);
        MapValues values = new(map.Extent, path, reading);
        bool complete = true;
        foreach (Key key in keys)
        {
            if (entries.TryGetValue(key, out MapEntry? entry))
                complete &= values.Read(key, entry);
            else if (key.IsRequired)
                complete = Miss(key, map, path, reading);
        }
        if (!complete && !isLenient)
            return null;
        T? built = build(values);
        return values.HasComplaint && !isLenient ? null : built;
    }

    /// <summary>
    /// Gives each entry to its key. A misspelt key is a finding, and what follows it is read as the value of the key that was meant, so that
    /// one slip is one finding and not also a missing key.
    /// </summary>
    private Dictionary<Key, MapEntry> Match(MapNode map, string path, Reading reading)
    {
        Dictionary<Key, MapEntry> matched = [];
        foreach (MapEntry entry in map.Entries)
        {
            if (keys.FirstOrDefault(key => key.Name == entry.Key.Text) is { } known)
                matched[known] = entry;
        }
        foreach (MapEntry entry in map.Entries.Where(entry => keys.All(key => key.Name != entry.Key.Text)))
        {
            string[] free = [.. keys.Where(key => !matched.ContainsKey(key)).Select(key => key.Name)];
            string? nearest = Spelling.Nearest(entry.Key.Text, free) ?? Spelling.Nearest(entry.Key.Text, keys.Select(key => key.Name));
            reading.Faults.Add(
                entry.Key.Extent, Join(path, entry.Key.Text), "unknown-key", $"unknown key `{Shorten(entry.Key.Text)}`",
                Accepted, nearest, atKey: true);
            if (free.Contains(nearest))
                matched[keys.First(key => key.Name == nearest)] = entry;
        }
        return matched;
    }

    private static bool Miss(Key key, MapNode map, string path, Reading reading)
    {
        reading.Faults.Add(map.Extent, path, "missing-key", $"no key `{key.Name}`", $"`{key.Name}`: {key.Form.Accepted}", atKey: true);
        return false;
    }

    internal override void Describe(Utf8JsonWriter schema)
    {
        schema.WriteString("type", "object");
        schema.WriteStartObject("properties");
        foreach (Key key in keys)
        {
            schema.WriteStartObject(key.Name);
            schema.WriteString("description", key.About);
            key.Form.Describe(schema);
            schema.WriteEndObject();
        }
        schema.WriteEndObject();
        schema.WriteStartArray("required");
        foreach (Key key in keys.Where(key => key.IsRequired))
            schema.WriteStringValue(key.Name);
        schema.WriteEndArray();
        schema.WriteBoolean("additionalProperties", false);
    }
}
