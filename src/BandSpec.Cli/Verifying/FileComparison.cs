using System.Security.Cryptography;
using BandSpec.Cli.Opening;
using BandSpec.Files.Json;

namespace BandSpec.Cli.Verifying;

/// <summary>Compares files byte by byte with what they should be.</summary>
internal static class FileComparison
{
    /// <summary>Every file of a folder, the missing and the strange ones too.</summary>
    /// <param name="folder">The folder's full path.</param>
    /// <param name="expected">The files that should be in it, and no others.</param>
    public static IEnumerable<VerifiedPart> OfFolder(string folder, IReadOnlyList<PackageFile> expected)
    {
        foreach (PackageFile file in expected.OrderBy(file => file.Name, StringComparer.Ordinal))
            yield return Read(Path.Combine(folder, file.Name)) is { } bytes ? Of(file.Name, bytes.Span, file.Bytes.Span) : new VerifiedPart(file.Name, "it is missing");
        foreach (string stranger in Directory.EnumerateFileSystemEntries(folder).Select(entry => Path.GetFileName(entry)).Except(expected.Select(file => file.Name)).Order())
            yield return new VerifiedPart(stranger, "it is not a file of the package");
    }

    /// <summary>One file.</summary>
    /// <param name="what">Its name.</param>
    /// <param name="stored">Its bytes.</param>
    /// <param name="expected">What they should be.</param>
    public static VerifiedPart Of(string what, ReadOnlySpan<byte> stored, ReadOnlySpan<byte> expected)
    {
        int same = stored.CommonPrefixLength(expected);
        return new VerifiedPart(what, same == stored.Length && same == expected.Length ? null
            : $"it differs from what its inputs give, first at byte {same}; its SHA-256 is {Convert.ToHexStringLower(SHA256.HashData(stored))}");
    }

    /// <summary>The bytes of a file; null when it cannot be read, or is no file of a package.</summary>
    public static ReadOnlyMemory<byte>? Read(string path)
    {
        try
        {
            return BoundedFile.Read(path);
        }
        catch (Exception unreadable) when (unreadable is IOException or UnauthorizedAccessException)
        {
            return null;
        }
    }
}
