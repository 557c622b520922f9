using BandSpec.Documents.Fonts;
using BandSpec.Files.Inputs;

namespace BandSpec.Cli.Opening;

/// <summary>
/// Opens a requirement and the files that it names. Those have to be inside the project: a requirement from somebody else cannot make the program
/// read, and print a line of, any file of this machine. Symbolic links are followed before that is judged.
/// </summary>
internal sealed class InputFolder
{
    /// <summary>One byte more than an input may have shows that it is too large, whatever comes after.</summary>
    private const int MostBytes = (1 << 20) + 1;

    private readonly string shownFolder;
    private readonly string folder;
    private readonly string root;

    private InputFolder(string shownFile, string path, string? root)
    {
        shownFolder = Path.GetDirectoryName(shownFile) ?? "";
        folder = Path.GetDirectoryName(path) ?? path;
        this.root = RealPath.Of(root ?? ProjectOf(folder));
    }

    /// <summary>Reads a requirement with its platform and station.</summary>
    /// <param name="file">The requirement as the user named it.</param>
    /// <param name="root">The folder that the others have to be in; null to find it.</param>
    /// <param name="workingFolder">The folder that relative paths are counted from.</param>
    /// <param name="changes">Values to be read as if they were written otherwise; null for none.</param>
    public static InputSet Read(string file, string? root, string workingFolder, IReadOnlyList<InputChange>? changes = null)
    {
        string path = Path.GetFullPath(file, workingFolder);
        InputFolder inputs = new(file, path, root is null ? null : Path.GetFullPath(root, workingFolder));
        return InputReading.Read(OpenedContent.Open(path, file, MostBytes), inputs.Follow, Letters.Missing, changes);
    }

    /// <summary>The folder of the project that a folder belongs to: the nearest above with <c>.git</c> in it, or the folder itself.</summary>
    internal static string ProjectOf(string folder)
    {
        for (DirectoryInfo? above = new(folder); above is not null; above = above.Parent)
        {
            if (Path.Exists(Path.Combine(above.FullName, ".git")))
                return above.FullName;
        }
        return folder;
    }

    private InputContent Follow(string written)
    {
        string shown = Path.Combine(shownFolder, written);
        if (written.Contains('\0', StringComparison.Ordinal))
            return InputContent.Refused(shown, "it is not a path");
        string path = Path.GetFullPath(written, folder);
        return RealPath.IsInside(RealPath.Of(path), root)
            ? OpenedContent.Open(path, shown, MostBytes)
            : InputContent.Refused(shown, $"it is outside the project, {root}; `--root` gives another");
    }
}
