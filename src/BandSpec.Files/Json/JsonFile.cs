using System.Buffers;
using System.Text.Encodings.Web;
using System.Text.Json;

namespace BandSpec.Files.Json;

/// <summary>Writes one JSON document: indented, UTF-8, ended by a line feed, the same on every machine.</summary>
internal static class JsonFile
{
    private static readonly JsonWriterOptions Options = new()
    {
        Indented = true,
        NewLine = "\n",
        // The files are read by programs and by people in an editor, never pasted into a web page: µ and ° stay as they are.
        Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping,
    };

    /// <summary>The bytes of a document whose members <paramref name="write"/> writes.</summary>
    internal static ReadOnlyMemory<byte> Of(Action<Utf8JsonWriter> write)
    {
        ArrayBufferWriter<byte> bytes = new();
        using (Utf8JsonWriter json = new(bytes, Options))
        {
            json.WriteStartObject();
            write(json);
            json.WriteEndObject();
        }
        bytes.Write("\n"u8);
        return bytes.WrittenMemory;
    }
}

/// <summary>Members that the documents have in common.</summary>
internal static class JsonMembers
{
    /// <summary>
    /// A number in the shortest form that reads back the same; JSON has no infinity, so that a capability without scatter is <c>null</c>.
    /// </summary>
    internal static void Figure(this Utf8JsonWriter json, string name, double value)
    {
        if (double.IsFinite(value))
            json.WriteNumber(name, value == 0 ? 0 : value);
        else
            json.WriteNull(name);
    }

    /// <summary>An object as a member.</summary>
    internal static void Object(this Utf8JsonWriter json, string name, Action<Utf8JsonWriter> members)
    {
        json.WriteStartObject(name);
        members(json);
        json.WriteEndObject();
    }

    /// <summary>A list of objects as a member.</summary>
    internal static void Objects<T>(this Utf8JsonWriter json, string name, IEnumerable<T> items, Action<Utf8JsonWriter, T> members)
    {
        json.WriteStartArray(name);
        foreach (T item in items)
        {
            json.WriteStartObject();
            members(json, item);
            json.WriteEndObject();
        }
        json.WriteEndArray();
    }

    /// <summary>A list of numbers as a member.</summary>
    internal static void Figures(this Utf8JsonWriter json, string name, IEnumerable<double> values)
    {
        json.WriteStartArray(name);
        foreach (double value in values)
            json.WriteNumberValue(value == 0 ? 0 : value);
        json.WriteEndArray();
    }

    /// <summary>A list of words as a member.</summary>
    internal static void Strings(this Utf8JsonWriter json, string name, IEnumerable<string> values)
    {
        json.WriteStartArray(name);
        foreach (string value in values)
            json.WriteStringValue(value);
        json.WriteEndArray();
    }
}
