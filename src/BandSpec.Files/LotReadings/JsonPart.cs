using System.Text.Json;

namespace BandSpec.Files.LotReadings;

/// <summary>One object of a JSON file, read key by key; it knows where it stands, so that a fault can say it.</summary>
internal readonly struct JsonPart(JsonElement element, string path)
{
    /// <summary>Where the object stands: keys joined by points, list items counted from zero; empty for the file.</summary>
    public string Path { get; } = path;

    public string Text(string key) => OptionalText(key) ?? throw Lacking(key, "text");

    public string? OptionalText(string key)
    {
        try
        {
            return Find(key) is { ValueKind: JsonValueKind.String } value ? value.GetString() : null;
        }
        catch (InvalidOperationException)
        {
            // The bytes of a string are looked at only when it is asked for.
            throw new JsonPartException($"`{Join(key)}` has bytes that are not UTF-8, or half a letter", "text in UTF-8");
        }
    }

    public double Number(string key) => OptionalNumber(key) ?? throw Lacking(key, "a number");

    public double? OptionalNumber(string key) =>
        Find(key) is { ValueKind: JsonValueKind.Number } value && value.TryGetDouble(out double number) && double.IsFinite(number) ? number : null;

    public double Positive(string key) => Number(key) is > 0 and var number ? number : throw Lacking(key, "a number above 0");

    public JsonPart Part(string key) =>
        Find(key) is { ValueKind: JsonValueKind.Object } value ? new(value, Join(key)) : throw Lacking(key, "an object");

    public IEnumerable<JsonPart> List(string key) =>
        Find(key) is { ValueKind: JsonValueKind.Array } ? OptionalList(key) : throw Lacking(key, "a list");

    public IEnumerable<JsonPart> OptionalList(string key)
    {
        string here = Join(key);
        return Find(key) is { ValueKind: JsonValueKind.Array } value ? value.EnumerateArray().Select((item, i) => new JsonPart(item, $"{here}[{i}]")) : [];
    }

    /// <summary>The fault that a key is not what it has to be.</summary>
    public JsonPartException Lacking(string key, string accepted) => new($"`{Join(key)}` is missing or of another kind", accepted);

    private JsonElement? Find(string key) =>
        element.ValueKind == JsonValueKind.Object && element.TryGetProperty(key, out JsonElement value) ? value : null;

    private string Join(string key) => Path.Length == 0 ? key : $"{Path}.{key}";
}

/// <summary>A JSON file does not hold what was asked for.</summary>
/// <param name="found">What was found, with its path.</param>
/// <param name="accepted">What is accepted instead.</param>
internal sealed class JsonPartException(string found, string accepted) : Exception(found)
{
    /// <summary>What is accepted instead.</summary>
    public string Accepted { get; } = accepted;
}
