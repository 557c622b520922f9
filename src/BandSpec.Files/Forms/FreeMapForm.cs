using System.Text.Json;
using BandSpec.Files.Yaml;

namespace BandSpec.Files.Forms;

/// <summary>A map whose keys are names that the form does not know, such as the terms that are held.</summary>
/// <param name="what">What the map is, in words.</param>
/// <param name="item">The form of every value.</param>
/// <param name="build">Makes an item of its name and value.</param>
internal sealed class FreeMapForm<TValue, T>(string what, Form item, Func<string, TValue, T> build) : Form
    where T : notnull
{
    internal override string Accepted => what;

    internal override object? Read(YamlNode node, string path, Reading reading)
    {
        if (node is not MapNode map)
            return RefuseKind(node, path, reading);
        object?[] values = [.. map.Entries.Select(entry => item.Read(entry.Value, Join(path, entry.Key.Text), reading))];
        if (values.Contains(null))
            return null;
        return (IReadOnlyList<T>)[.. map.Entries.Zip(values, (entry, value) => build(entry.Key.Text, (TValue)value!))];
    }

    internal override void Describe(Utf8JsonWriter schema)
    {
        schema.WriteString("type", "object");
        schema.WriteStartObject("additionalProperties");
        item.Describe(schema);
        schema.WriteEndObject();
    }
}
