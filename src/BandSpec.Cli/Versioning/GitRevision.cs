using BandSpec.Files.Inputs;

namespace BandSpec.Cli.Versioning;

/// <summary>The files of a repository as they were at one revision, such as <c>rev-a</c> or <c>HEAD~2</c>; read from git, nothing is checked out.</summary>
internal sealed class GitRevision
{
    /// <summary>No input is larger; a file that is does not get into memory.</summary>
    private const int MostBytes = 4 << 20;

    private readonly string revision;
    private readonly string top;
    private readonly string requirement;

    private GitRevision(string revision, string top, string requirement) => (this.revision, this.top, this.requirement) = (revision, top, requirement);

    /// <summary>Reads a requirement with its platform and station at a revision.</summary>
    /// <param name="written">Revision and path with a colon between them, as git writes it; the path is counted from the working folder.</param>
    /// <param name="folder">The working folder.</param>
    /// <exception cref="RefusalException">There is no git, or the folder is in no repository.</exception>
    public static InputSet Read(string written, string folder)
    {
        int colon = written.IndexOf(':', StringComparison.Ordinal);
        (string revision, string path) = (written[..colon], written[(colon + 1)..]);
        GitAnswer top = Git.Call(folder, MostBytes, "rev-parse", "--show-toplevel");
        if (!top.Succeeded)
            throw new RefusalException($"{written} is a revision of git, and {folder} is in no repository", ExitCode.Findings);
        // Git gives the folder without symbolic links; the working folder may be written with them.
        string root = top.Text.TrimEnd('\n', '\r');
        string real = Opening.RealPath.Of(Path.GetFullPath(path, folder));
        GitRevision at = new(revision, root, Path.GetRelativePath(root, real));
        return InputReading.Read(at.Open(at.requirement), at.Follow);
    }

    private InputContent Follow(string written) => written.Contains('\0', StringComparison.Ordinal)
        ? InputContent.Refused(written, "it is not a path")
        : Open(Path.GetRelativePath(top, Path.GetFullPath(written, Path.GetDirectoryName(Path.Combine(top, requirement))!)));

    /// <summary>Opens a file by its path from the top of the repository.</summary>
    private InputContent Open(string path)
    {
        string name = path.Replace(Path.DirectorySeparatorChar, '/'), shown = $"{revision}:{name}";
        if (name.StartsWith("../", StringComparison.Ordinal) || name == ".." || Path.IsPathRooted(path))
            return InputContent.Refused(shown, $"it is outside the repository, {top}");
        GitAnswer answer = Git.Call(top, MostBytes, "cat-file", "blob", "--end-of-options", shown);
        return answer.Succeeded ? InputContent.Of(shown, answer.Output) : InputContent.Refused(shown, $"git has no such file: {answer.Message}");
    }
}
