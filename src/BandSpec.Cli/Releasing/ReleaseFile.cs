using BandSpec.Files.Inputs;
using BandSpec.Files.Releases;

namespace BandSpec.Cli.Releasing;

/// <summary>The release record beside a requirement.</summary>
internal static class ReleaseFile
{
    /// <summary>The record's name as the user would write it.</summary>
    /// <param name="requirement">The requirement as the user named it.</param>
    public static string NameFor(string requirement) => Path.Combine(Path.GetDirectoryName(requirement) ?? "", ReleaseRecord.FileName);

    /// <summary>Reads the record beside a requirement; an empty one when nothing was released yet.</summary>
    /// <param name="requirement">The requirement as the user named it.</param>
    /// <param name="workingFolder">The folder that relative paths are counted from.</param>
    /// <param name="finding">Why there is no record; null exactly when there is one.</param>
    public static ReleaseRecord? Read(string requirement, string workingFolder, out PlacedFinding? finding) =>
        Open(NameFor(requirement), workingFolder, out finding);

    /// <summary>Reads a record by its own name.</summary>
    public static ReleaseRecord? Open(string name, string workingFolder, out PlacedFinding? finding)
    {
        finding = null;
        string path = Path.GetFullPath(name, workingFolder);
        if (!Path.Exists(path))
            return ReleaseRecord.Empty;
        return ReleaseRecord.Read(Content(name, path), out finding);
    }

    private static InputContent Content(string name, string path)
    {
        try
        {
            // What is larger than a record may be is refused by its length, and need not be in memory for that.
            long length = Math.Min(new FileInfo(path).Length, ReleaseRecord.LargestFile + 1L);
            if (length == 0)
                return InputContent.Of(name, Array.Empty<byte>());
            using FileStream stream = File.OpenRead(path);
            byte[] bytes = new byte[length];
            stream.ReadExactly(bytes);
            return InputContent.Of(name, bytes);
        }
        catch (Exception refused) when (refused is IOException or UnauthorizedAccessException)
        {
            return InputContent.Refused(name, "it cannot be read");
        }
    }
}
