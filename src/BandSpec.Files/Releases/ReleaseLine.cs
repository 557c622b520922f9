using System.Globalization;
using System.Security.Cryptography;
using System.Text;
using System.Text.Encodings.Web;
using System.Text.Json;
using BandSpec.Core.Findings;
using BandSpec.Core.Revisions;

namespace BandSpec.Files.Releases;

/// <summary>
/// One line of the release record: a JSON object that ends with the digest of the line before it, <c>previous</c>, and its own,
/// <c>digest</c>: the SHA-256 of everything that stands before the comma in front of it. There is one spelling of a release, so that a line is
/// whole exactly when writing what was read gives the same bytes.
/// </summary>
internal static class ReleaseLine
{
    private const string Format = "bandspec/release/1";
    private const string TimePattern = "yyyy-MM-dd'T'HH:mm:ss'Z'";

    private static readonly JsonWriterOptions Written = new() { Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping };

    /// <summary>What stands for the digest of the line before the first.</summary>
    public static string NoDigest { get; } = new('0', 64);

    /// <summary>The line of a release, without its end.</summary>
    public static string Write(Release release, string previous)
    {
        string content = Content(release, previous);
        return $"{content},\"digest\":\"{DigestOf(content)}\"}}";
    }

    /// <summary>The release of a line and its digest; <see langword="null"/> when it is not such a line, or was changed.</summary>
    public static ChainedRelease? Read(string line, string previous)
    {
        try
        {
            using JsonDocument document = JsonDocument.Parse(line, new JsonDocumentOptions { MaxDepth = 4 });
            Release release = ReleaseOf(document.RootElement);
            return Write(release, previous) == line ? new ChainedRelease(release, DigestOf(Content(release, previous))) : null;
        }
        catch (Exception fault) when (fault is JsonException or KeyNotFoundException or InvalidOperationException or FormatException or ArgumentException)
        {
            return null;
        }
    }

    private static string DigestOf(string content) => Convert.ToHexStringLower(SHA256.HashData(Encoding.UTF8.GetBytes(content)));

    /// <summary>The object up to its own digest, without the brace that closes it.</summary>
    private static string Content(Release release, string previous)
    {
        using MemoryStream stream = new();
        using (Utf8JsonWriter json = new(stream, Written))
        {
            json.WriteStartObject();
            json.WriteString("format", Format);
            json.WriteString("number", release.Number);
            json.WriteString("revision", release.Revision);
            json.WriteString("by", release.By);
            json.WriteString("at", release.At.UtcDateTime.ToString(TimePattern, CultureInfo.InvariantCulture));
            json.WriteString("program", release.Program);
            json.WriteStartArray("inputs");
            foreach (InputDigest input in release.Inputs)
                WriteInput(json, input);
            json.WriteEndArray();
            json.WriteString("limits", release.LimitsDigest);
            json.WriteString("previous", previous);
            json.WriteEndObject();
        }

        return Encoding.UTF8.GetString(stream.GetBuffer(), 0, (int)stream.Length - 1);
    }

    private static void WriteInput(Utf8JsonWriter json, InputDigest input)
    {
        json.WriteStartObject();
        json.WriteString("file", FileWord(input.File));
        json.WriteString("name", input.Name);
        json.WriteString("sha256", input.Digest);
        json.WriteEndObject();
    }

    private static Release ReleaseOf(JsonElement line) => new()
    {
        Number = Text(line, "number"),
        Revision = Text(line, "revision"),
        By = Text(line, "by"),
        At = DateTimeOffset.ParseExact(Text(line, "at"), TimePattern, CultureInfo.InvariantCulture, DateTimeStyles.AssumeUniversal),
        Program = Text(line, "program"),
        Inputs = [.. line.GetProperty("inputs").EnumerateArray().Select(i => new InputDigest(FileOf(Text(i, "file")), Text(i, "name"), Text(i, "sha256")))],
        LimitsDigest = Text(line, "limits"),
    };

    private static string Text(JsonElement element, string name) => element.GetProperty(name).GetString() ?? throw new FormatException(name);

    private static string FileWord(InputFile file) => file switch
    {
        InputFile.Requirement => "requirement",
        InputFile.Platform => "platform",
        InputFile.Station => "station",
        _ => throw new ArgumentOutOfRangeException(nameof(file), file, "only inputs are released"),
    };

    private static InputFile FileOf(string word) => word switch
    {
        "requirement" => InputFile.Requirement,
        "platform" => InputFile.Platform,
        "station" => InputFile.Station,
        _ => throw new FormatException(word),
    };
}
