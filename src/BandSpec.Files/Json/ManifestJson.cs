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

    /// <summary>The bytes of the file.</summary>
    /// <param name="identity">The specification.</param>
    /// <param name="inputs">The files it was made from.</param>
    /// <param name="outputs">The other files of the package.</param>
    /// <param name="program">Name and version of the program.</param>
    public static ReadOnlyMemory<byte> Write(
        SpecificationIdentity identity, IReadOnlyList<ManifestInput> inputs, IReadOnlyList<PackageFile> outputs, string program)
    {
        ArgumentNullException.ThrowIfNull(identity);
        return JsonFile.Of(json =>
        {
            json.WriteString("format", Format);
            json.WriteString("program", program);
            json.Identity(identity);
            json.Objects("inputs", inputs, (file, input) =>
            {
                file.WriteString("kind", input.Kind);
                WriteFile(file, input.Name, input.Bytes);
            });
            json.Objects("outputs", outputs.OrderBy(output => output.Name, StringComparer.Ordinal), (file, output) =>
            {
                WriteFile(file, output.Name, output.Bytes);
            });
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
/// <param name="Bytes">Its bytes.</param>
public sealed record ManifestInput(string Kind, string Name, ReadOnlyMemory<byte> Bytes);

/// <summary>A file of a package before it is written.</summary>
/// <param name="Name">Its name in the package's folder.</param>
/// <param name="Bytes">Its bytes.</param>
public sealed record PackageFile(string Name, ReadOnlyMemory<byte> Bytes);
