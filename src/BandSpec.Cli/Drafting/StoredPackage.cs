using System.Security.Cryptography;
using BandSpec.Cli.Opening;
using BandSpec.Files.Json;

namespace BandSpec.Cli.Drafting;

/// <summary>A package as it lies on the disk.</summary>
internal sealed class StoredPackage
{
    private readonly string folder;

    private StoredPackage(string folder, Manifest manifest) => (this.folder, Manifest) = (folder, manifest);

    /// <summary>Its manifest.</summary>
    public Manifest Manifest { get; }

    /// <summary>The names of its files, the manifest's own included, in order.</summary>
    public IReadOnlyList<string> Names => [.. Manifest.Outputs.Select(output => output.Name), PackageNames.Manifest];

    /// <summary>The package in a folder; null when there is none.</summary>
    public static StoredPackage? Read(string folder)
    {
        string path = Path.Combine(folder, PackageNames.Manifest);
        return File.Exists(path) && Manifest.Read(BoundedFile.Read(path)) is { } manifest ? new StoredPackage(folder, manifest) : null;
    }

    /// <summary>
    /// Whether drafting again would give the same files: made by the same program from the same inputs in the same way, and every file is
    /// there as it was written.
    /// </summary>
    public bool IsOf(PackageSource source) =>
        Manifest.FolderName == source.Identity.FolderName
        && Manifest.Making == source.Making
        && Manifest.Inputs.SequenceEqual(source.Inputs.Select(input => new ListedInput(input.Kind, input.Name, input.AttachedAs, DigestOf(input.Bytes.Span))))
        && Manifest.Outputs.All(IsThere)
        && Directory.EnumerateFileSystemEntries(folder).Count() == Names.Count;

    /// <summary>
    /// The verdict that its records tell; null when they do not, or when the search was ended early: drafting again may find a better plan.
    /// </summary>
    public Verdict? Verdict()
    {
        try
        {
            return Drafting.Verdict.Read(BoundedFile.Read(Path.Combine(folder, PackageNames.Result))) is { Proven: true } verdict ? verdict : null;
        }
        catch (IOException)
        {
            return null;
        }
    }

    private bool IsThere(ListedOutput output)
    {
        string path = Path.Combine(folder, output.Name);
        return Path.GetFileName(output.Name) == output.Name && File.Exists(path) && new FileInfo(path).Length == output.Length
            && DigestOf(BoundedFile.Read(path)) == output.Digest;
    }

    private static string DigestOf(ReadOnlySpan<byte> bytes) => Convert.ToHexStringLower(SHA256.HashData(bytes));
}
