using System.Security.Cryptography;
using System.Text.Json;
using BandSpec.Core.Requirements;

namespace BandSpec.Files.Json;

/// <summary>
/// Writes <c>manifest.json</c>: the SHA-256 of every input and of every other file of the package, so that anyone can tell with a common tool
/// whether a package is whole and what it was made from.
/// </summary>
public static class ManifestJson
{
    /// <summary>The format's name; it changes when a member is renamed or removed.</summary>
    public const string Format = "bandspec/manifest/1";

    /// <summary>The format's name of the part that a PDF carries: the same without outputs, of which it is one.</summary>
    public const string ProvenanceFormat = "bandspec/provenance/1";

    /// <summary>The bytes of the file.</summary>
    /// <param name="identity">The specification.</param>
    /// <param name="making">How the package was made.</param>
    /// <param name="inputs">The files it was made from.</param>
    /// <param name="outputs">The other files of the package.</param>
    public static ReadOnlyMemory<byte> Write(
        SpecificationIdentity identity, PackageMaking making, IReadOnlyList<ManifestInput> inputs, IReadOnlyList<PackageFile> outputs) =>
        JsonFile.Of(json =>
        {
            WriteMaking(json, Format, identity, making, inputs);
            json.Objects("outputs", outputs.OrderBy(output => output.Name, StringComparer.Ordinal), (file, output) =>
            {
                WriteFile(file, output.Name, output.Bytes);
            });
        });

    /// <summary>The bytes of the part that a PDF carries, from which it can be made again.</summary>
    /// <param name="identity">The specification.</param>
    /// <param name="making">How the package was made.</param>
    /// <param name="inputs">The files it was made from.</param>
    public static ReadOnlyMemory<byte> WriteProvenance(
        SpecificationIdentity identity, PackageMaking making, IReadOnlyList<ManifestInput> inputs) =>
        JsonFile.Of(json => WriteMaking(json, ProvenanceFormat, identity, making, inputs));

    private static void WriteMaking(
        Utf8JsonWriter json, string format, SpecificationIdentity identity, PackageMaking making, IReadOnlyList<ManifestInput> inputs)
    {
        json.WriteString("format", format);
        json.WriteString("program", making.Program);
        json.WriteString("paper", making.Paper);
        json.WriteString("language", making.Language);
        if (making.Diagnosed)
            json.WriteBoolean("diagnosed", true);
        if (making.ReleaseDigest is { } release)
            json.WriteString("release", release);
        json.Identity(identity);
        json.Objects("inputs", inputs, (file, input) =>
        {
            file.WriteString("kind", input.Kind);
            WriteFile(file, input.Name, input.Bytes);
            file.WriteString("attached-as", input.AttachedAs);
        });
    }

    private static void WriteFile(Utf8JsonWriter json, string name, ReadOnlyMemory<byte> bytes)
    {
        json.WriteString("name", name);
        json.WriteNumber("bytes", bytes.Length);
        json.WriteString("sha256", Convert.ToHexStringLower(SHA256.HashData(bytes.Span)));
    }
}

/// <summary>A file that a package was made from.</summary>
/// <param name="Kind">What it is: <c>requirement</c>, <c>platform</c>, <c>station</c> or <c>template</c>.</param>
/// <param name="Name">Its name, without the folders above it.</param>
/// <param name="AttachedAs">The name under which the PDF carries it.</param>
/// <param name="Bytes">Its bytes.</param>
public sealed record ManifestInput(string Kind, string Name, string AttachedAs, ReadOnlyMemory<byte> Bytes);

/// <summary>What besides its inputs a package's bytes depend on.</summary>
/// <param name="Program">Name and version of the program.</param>
/// <param name="Paper">The paper of the PDF.</param>
/// <param name="Language">The language of the documents.</param>
/// <param name="ReleaseDigest">The digest of its line in the release record; <see langword="null"/> for a draft.</param>
/// <param name="Diagnosed">Whether a diagnosis was asked for; without being asked for it is there only when no plan fits.</param>
public sealed record PackageMaking(string Program, string Paper, string Language, string? ReleaseDigest, bool Diagnosed = false);

/// <summary>A file of a package before it is written.</summary>
/// <param name="Name">Its name in the package's folder.</param>
/// <param name="Bytes">Its bytes.</param>
public sealed record PackageFile(string Name, ReadOnlyMemory<byte> Bytes);
