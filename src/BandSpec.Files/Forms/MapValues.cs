using BandSpec.Files.Yaml;

namespace BandSpec.Files.Forms;

/// <summary>The values of a map that were read, for the record to be built of.</summary>
internal sealed class MapValues(Extent extent, string path, Reading reading)
{
    private readonly Dictionary<Key, (object Value, MapEntry Entry)> values = [];
    private readonly HashSet<Key> wanting = [];

    /// <summary>Whether a complaint was added while the record was built.</summary>
    internal bool HasComplaint { get; private set; }

    /// <summary>The value of a key, or its fallback when it was left out.</summary>
    internal T Of<T>(Key<T> key)
        where T : notnull =>
        values.TryGetValue(key, out (object Value, MapEntry) found) ? (T)found.Value
        : key.Fallback ?? throw new InvalidOperationException($"`{key.Name}` has no value and none to fall back on");

    /// <summary>Whether a key was written and its value read.</summary>
    internal bool Has(Key key) => values.ContainsKey(key);

    /// <summary>The value of a key, its fallback when it was left out, null when it could not be read.</summary>
    internal T? Find<T>(Key<T> key)
        where T : class => Has(key) ? Of(key) : wanting.Contains(key) ? null : key.Fallback;

    /// <summary>The value of a key, null when it was left out or could not be read.</summary>
    internal T? FindValue<T>(Key<T> key)
        where T : struct => Has(key) ? Of(key) : null;

    /// <summary>Reads the value of a key; false when it does not follow its form.</summary>
    internal bool Read(Key key, MapEntry entry)
    {
        object? value = key.Form.Read(entry.Value, Form.Join(path, key.Name), reading);
        if (value is not null)
            values[key] = (value, entry);
        else
            wanting.Add(key);
        return value is not null;
    }

    /// <summary>Adds a finding about the value of a key; about the map when the key was left out.</summary>
    internal void Complain(Key key, string rule, string found, string accepted)
    {
        HasComplaint = true;
        bool written = values.TryGetValue(key, out (object, MapEntry Entry) read);
        Extent place = !written ? extent : read.Entry.Value is ScalarNode scalar ? scalar.Extent : read.Entry.Key.Extent;
        reading.Faults.Add(place, written ? Form.Join(path, key.Name) : path, rule, found, accepted, atKey: !written);
    }
}
