using System.Globalization;
using System.Text;
using System.Text.Json;
using BandSpec.Core.Requirements;
using BandSpec.Core.VirtualLots;
using BandSpec.Files.Inputs;

namespace BandSpec.Files.Json;

/// <summary>
/// Writes and reads the result of a part of an order of virtual lots. The file carries its three inputs as text, so that parts from many
/// machines can be put together and reported on without anything else at hand.
/// </summary>
public static class LotPartJson
{
    /// <summary>The format's name; it changes when a member is renamed or removed.</summary>
    public const string Format = "bandspec/lot-part/1";

    /// <summary>The bytes of the file.</summary>
    /// <param name="result">The result.</param>
    /// <param name="identity">The specification it is about.</param>
    /// <param name="inputs">The inputs it was made from.</param>
    public static ReadOnlyMemory<byte> Write(LotResult result, SpecificationIdentity identity, IReadOnlyList<InputSource> inputs)
    {
        ArgumentNullException.ThrowIfNull(result);
        ArgumentNullException.ThrowIfNull(identity);
        return JsonFile.Of(json =>
        {
            json.WriteString("format", Format);
            json.Identity(identity);
            json.WriteString("fingerprint", result.Fingerprint.ToString("x16", CultureInfo.InvariantCulture));
            json.WriteNumber("units", result.Order.Units);
            json.WriteNumber("lot-size", result.Order.LotSize);
            json.WriteNumber("seed", result.Order.Seed);
            json.Figures("part", [result.Order.Part, result.Order.Parts]);
            json.Objects("lots", result.Ranges, (range, lots) =>
            {
                range.WriteNumber("first", lots.First);
                range.WriteNumber("end", lots.End);
            });
            json.Objects("inputs", inputs, (input, source) =>
            {
                input.WriteString("name", source.Name);
                input.WriteString("text", Encoding.UTF8.GetString(source.Bytes.Span));
            });
            json.WriteStartArray("figures");
            foreach (Int128 figure in result.Figures)
                json.WriteStringValue(figure.ToString(CultureInfo.InvariantCulture));
            json.WriteEndArray();
        });
    }

    /// <summary>What stands in such a file, not yet held against its inputs.</summary>
    /// <exception cref="FormatException">It is not such a file; the message says why.</exception>
    public static LotPartFile Read(ReadOnlyMemory<byte> bytes)
    {
        try
        {
            using JsonDocument document = JsonDocument.Parse(bytes);
            JsonElement root = document.RootElement;
            if (root.ValueKind != JsonValueKind.Object || !root.TryGetProperty("format", out JsonElement format) || format.GetString() != Format)
                throw new FormatException($"it is no part of virtual lots: its format is not `{Format}`");
            return new LotPartFile(
                OrderOf(root), ulong.Parse(Text(root, "fingerprint"), NumberStyles.HexNumber, CultureInfo.InvariantCulture),
                [.. root.GetProperty("lots").EnumerateArray().Select(r => new LotRange(r.GetProperty("first").GetInt64(), r.GetProperty("end").GetInt64()))],
                [.. root.GetProperty("figures").EnumerateArray().Select(f => Int128.Parse(f.GetString()!, CultureInfo.InvariantCulture))],
                [.. root.GetProperty("inputs").EnumerateArray().Select(i => InputContent.Of(Text(i, "name"), Encoding.UTF8.GetBytes(Text(i, "text"))))]);
        }
        catch (Exception broken) when (broken is JsonException or KeyNotFoundException or InvalidOperationException or ArgumentException or OverflowException)
        {
            throw new FormatException($"it is damaged: {broken.Message}", broken);
        }
    }

    private static LotOrder OrderOf(JsonElement root)
    {
        JsonElement part = root.GetProperty("part");
        return LotOrder.For(root.GetProperty("units").GetInt64(), root.GetProperty("lot-size").GetInt32(), root.GetProperty("seed").GetUInt64())
            .InPart(part[0].GetInt32(), part[1].GetInt32());
    }

    private static string Text(JsonElement element, string name) =>
        element.GetProperty(name).GetString() ?? throw new FormatException($"it is damaged: `{name}` is empty");
}

/// <summary>A part of an order of virtual lots as it stands in a file.</summary>
/// <param name="Order">The order and which part of it.</param>
/// <param name="Fingerprint">The fingerprint that the result had.</param>
/// <param name="Ranges">The lots that were made.</param>
/// <param name="Figures">Every sum.</param>
/// <param name="Inputs">Requirement, platform and station as they were.</param>
public sealed record LotPartFile(
    LotOrder Order, ulong Fingerprint, IReadOnlyList<LotRange> Ranges, IReadOnlyList<Int128> Figures, IReadOnlyList<InputContent> Inputs)
{
    /// <summary>Reads the inputs that the part carries.</summary>
    public InputSet ReadInputs()
    {
        if (Inputs.Count != 3)
            throw new FormatException("it is damaged: it should carry a requirement, a platform and a station");
        int next = 1;
        return InputReading.Read(Inputs[0], _ => Inputs[next++]);
    }
}
