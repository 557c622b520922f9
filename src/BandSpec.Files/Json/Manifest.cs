using System.Text.Json;

namespace BandSpec.Files.Json;

/// <summary>A manifest that was read, or the part of it that a PDF carries. Nothing is known yet about the files that it lists.</summary>
public sealed record Manifest
{
    /// <summary>The package folder's name, number and revision; as it was read, not to be trusted as a path.</summary>
    public required string FolderName { get; init; }

    /// <summary>How the package was made.</summary>
    public required PackageMaking Making { get; init; }

    /// <summary>The files it was made from.</summary>
    public required IReadOnlyList<ListedInput> Inputs { get; init; }

    /// <summary>The other files of the package; empty for what a PDF carries.</summary>
    public required IReadOnlyList<ListedOutput> Outputs { get; init; }

    /// <summary>The manifest in a file; <see langword="null"/> when the bytes are not one of this format.</summary>
    public static Manifest? Read(ReadOnlyMemory<byte> bytes)
    {
        try
        {
            using JsonDocument document = JsonDocument.Parse(bytes, new JsonDocumentOptions { MaxDepth = 8 });
            JsonElement root = document.RootElement;
            return Text(root, "format") is ManifestJson.Format or ManifestJson.ProvenanceFormat ? ManifestOf(root) : null;
        }
        catch (Exception fault) when (fault is JsonException or KeyNotFoundException or InvalidOperationException or FormatException)
        {
            return null;
        }
    }

    private static Manifest ManifestOf(JsonElement root) => new()
    {
        FolderName = $"{Text(root.GetProperty("specification"), "number")}-{Text(root.GetProperty("specification"), "revision")}",
        Making = new PackageMaking(
            Text(root, "program"), Text(root, "paper"), Text(root, "language"), root.TryGetProperty("release", out JsonElement digest) ? digest.GetString() : null,
            root.TryGetProperty("diagnosed", out JsonElement diagnosed) && diagnosed.GetBoolean()),
        Inputs = [.. root.GetProperty("inputs").EnumerateArray().Select(
            i => new ListedInput(Text(i, "kind"), Text(i, "name"), Text(i, "attached-as"), Text(i, "sha256")))],
        Outputs = root.TryGetProperty("outputs", out JsonElement outputs)
            ? [.. outputs.EnumerateArray().Select(o => new ListedOutput(Text(o, "name"), o.GetProperty("bytes").GetInt64(), Text(o, "sha256")))] : [],
    };

    private static string Text(JsonElement element, string name) => element.GetProperty(name).GetString() ?? throw new FormatException(name);
}

/// <summary>An input that a manifest lists.</summary>
/// <param name="Kind">What it is: <c>requirement</c>, <c>platform</c>, <c>station</c> or <c>template</c>.</param>
/// <param name="Name">Its name.</param>
/// <param name="AttachedAs">The name under which the PDF carries it.</param>
/// <param name="Digest">The SHA-256 of its bytes.</param>
public sealed record ListedInput(string Kind, string Name, string AttachedAs, string Digest);

/// <summary>An output that a manifest lists.</summary>
/// <param name="Name">Its name in the folder.</param>
/// <param name="Length">Its length in bytes.</param>
/// <param name="Digest">The SHA-256 of its bytes.</param>
public sealed record ListedOutput(string Name, long Length, string Digest);
