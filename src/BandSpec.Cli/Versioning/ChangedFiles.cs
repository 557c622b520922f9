using System.Text;
using BandSpec.Cli.Opening;
using BandSpec.Cli.Releasing;
using BandSpec.Files.Inputs;

namespace BandSpec.Cli.Versioning;

/// <summary>The files of a repository that differ from a revision, those not yet committed or not yet known to git among them.</summary>
internal sealed class ChangedFiles
{
    /// <summary>A list of names; a repository with more changes than fit is not told apart from one that changed altogether.</summary>
    private const int MostBytes = 64 << 20;

    private readonly HashSet<string> paths;
    private readonly string workingFolder;

    private ChangedFiles(HashSet<string> paths, string workingFolder) => (this.paths, this.workingFolder) = (paths, workingFolder);

    /// <summary>What differs from a revision.</summary>
    /// <exception cref="RefusalException">There is no git, no repository, or no such revision.</exception>
    public static ChangedFiles Since(string revision, string workingFolder)
    {
        string top = Ask(workingFolder, $"{workingFolder} is in no repository", "rev-parse", "--show-toplevel").TrimEnd('\n', '\r');
        string changed = Ask(top, $"git knows no revision {revision}", "diff", "--name-only", "--no-renames", "-z", "--end-of-options", revision, "--");
        string unknown = Ask(top, "git cannot list what it does not know", "ls-files", "--others", "--exclude-standard", "-z");
        IEnumerable<string> names = (changed + unknown).Split('\0', StringSplitOptions.RemoveEmptyEntries);
        return new ChangedFiles([.. names.Select(name => RealPath.Of(Path.GetFullPath(name, top)))], workingFolder);
    }

    /// <summary>Whether anything that a package depends on differs: an input, a template, or the release record. What could not be read counts.</summary>
    /// <param name="requirement">The requirement as the user named it.</param>
    /// <param name="inputs">What was read.</param>
    /// <param name="templates">The folder of templates; null for none.</param>
    public bool Touch(string requirement, InputSet inputs, string? templates) =>
        inputs.Sources.Count < 3
        || inputs.Sources.Select(source => source.Name).Append(ReleaseFile.NameFor(requirement)).Any(Holds)
        || (templates is not null && paths.Any(path => RealPath.IsInside(path, RealPath.Of(templates))));

    private bool Holds(string name) => paths.Contains(RealPath.Of(Path.GetFullPath(name, workingFolder)));

    private static string Ask(string folder, string refusal, params string[] arguments)
    {
        GitAnswer answer = Git.Call(folder, MostBytes, arguments);
        return answer.Succeeded ? Encoding.UTF8.GetString(answer.Output.Span) : throw new RefusalException(refusal, ExitCode.Findings);
    }
}
