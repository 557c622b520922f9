using System.Text.Json;
using BandSpec.Files.Yaml;

namespace BandSpec.Files.Forms;

/// <summary>A list of values of one form.</summary>
/// <param name="what">What the list is, in words.</param>
/// <param name="item">The form of an item.</param>
/// <param name="fewest">The fewest items.</param>
/// <param name="most">The most items.</param>
internal sealed class ListForm<T>(string what, Form item, int fewest, int most) : Form
    where T : notnull
{
    internal override string Accepted => $"{what}: a list of {fewest} to {most} items";

    internal override object? Read(YamlNode node, string path, Reading reading)
    {
        if (node is not ListNode list)
            return RefuseKind(node, path, reading);
        if (list.Items.Count < fewest || list.Items.Count > most)
        {
            reading.Faults.Add(node.Extent, path, "list-length", $"a list of {list.Items.Count} items", Accepted);
            return null;
        }
        object?[] items = [.. list.Items.Select((value, index) => item.Read(value, $"{path}[{index}]", reading))];
        return items.Contains(null) ? null : (IReadOnlyList<T>)[.. items.Cast<T>()];
    }

    internal override void Describe(Utf8JsonWriter schema)
    {
        schema.WriteString("type", "array");
        schema.WriteNumber("minItems", fewest);
        schema.WriteNumber("maxItems", most);
        schema.WriteStartObject("items");
        item.Describe(schema);
        schema.WriteEndObject();
    }
}

/// <summary>A word that stands for "to be chosen", or a list.</summary>
/// <param name="word">The word.</param>
/// <param name="list">The list.</param>
internal sealed class WordOrListForm<T>(string word, ListForm<T> list) : Form
    where T : notnull
{
    internal override string Accepted => $"`{word}`, or {list.Accepted}";

    /// <summary>The list; the form itself where the word stands.</summary>
    internal override object? Read(YamlNode node, string path, Reading reading) => node switch
    {
        ScalarNode scalar when scalar.Text == word => new WordOrList<T>(null),
        ListNode => list.Read(node, path, reading) is IReadOnlyList<T> items ? new WordOrList<T>(items) : null,
        _ => RefuseKind(node, path, reading),
    };

    internal override void Describe(Utf8JsonWriter schema)
    {
        schema.WriteStartArray("oneOf");
        schema.WriteStartObject();
        schema.WriteString("const", word);
        schema.WriteEndObject();
        schema.WriteStartObject();
        list.Describe(schema);
        schema.WriteEndObject();
        schema.WriteEndArray();
    }
}

/// <summary>A list, or nothing where the word stood.</summary>
/// <param name="Items">The items.</param>
internal sealed record WordOrList<T>(IReadOnlyList<T>? Items);
