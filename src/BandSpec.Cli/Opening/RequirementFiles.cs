namespace BandSpec.Cli.Opening;

/// <summary>A file that was named, or found in a folder that was named.</summary>
/// <param name="Name">The file as the user would name it.</param>
/// <param name="Note">Why it is no requirement although it is an input; null for what is to be read as one.</param>
internal sealed record NamedFile(string Name, string? Note);

/// <summary>
/// The requirements among files and folders. A pattern such as <c>requirements/**/*.yaml</c> also takes in platforms and stations: these are
/// told by their own keys and left out. A file that was named alone is always read as a requirement.
/// </summary>
internal static class RequirementFiles
{
    /// <summary>Deeper than anybody files; it ends a circle of links.</summary>
    private const int Deepest = 20;

    /// <summary>What is looked at to tell one input from another.</summary>
    private const int LongestLook = 1 << 20;

    private static readonly EnumerationOptions Below = new()
    {
        RecurseSubdirectories = true, MaxRecursionDepth = Deepest, IgnoreInaccessible = true, AttributesToSkip = FileAttributes.Hidden | FileAttributes.ReparsePoint,
    };

    private static readonly (string Key, string Kind)[] Keys =
        [("specification:", "requirement"), ("raw-error:", "platform"), ("pressure-standard:", "station")];

    /// <summary>All files, folders replaced by the requirements below them in the order of their names.</summary>
    /// <param name="named">Files and folders as the user named them.</param>
    /// <param name="workingFolder">The folder that relative paths are counted from.</param>
    /// <exception cref="RefusalException">There is no requirement in a folder.</exception>
    public static IReadOnlyList<NamedFile> Among(IReadOnlyList<string> named, string workingFolder)
    {
        List<NamedFile> files = [];
        foreach (string name in named)
        {
            string path = Path.GetFullPath(name, workingFolder);
            if (Directory.Exists(path))
                files.AddRange(In(name, path));
            else
                files.Add(new NamedFile(name, named.Count > 1 && KindOf(path) is "platform" or "station" ? $"a {KindOf(path)}, not a requirement" : null));
        }

        return [.. files.DistinctBy(file => Path.GetFullPath(file.Name, workingFolder))];
    }

    private static IEnumerable<NamedFile> In(string name, string folder)
    {
        NamedFile[] found =
        [
            .. from path in Directory.EnumerateFiles(folder, "*", Below)
               where Path.GetExtension(path) is ".yaml" or ".yml" && KindOf(path) == "requirement"
               let below = Path.GetRelativePath(folder, path)
               let shown = name is "." or "./" ? below : Path.Combine(name, below)
               orderby shown.Replace(Path.DirectorySeparatorChar, '/') select new NamedFile(shown, null),
        ];
        return found.Length > 0 ? found : throw new RefusalException($"there is no requirement in {name}", ExitCode.Findings);
    }

    /// <summary>What a file is by the first key at the beginning of a line that only one kind of input has; null when it has none.</summary>
    private static string? KindOf(string path)
    {
        try
        {
            using StreamReader reader = new(path);
            for (int read = 0; read < LongestLook && reader.ReadLine() is { } line; read += line.Length + 1)
                foreach ((string key, string kind) in Keys)
                    if (line.StartsWith(key, StringComparison.Ordinal))
                        return kind;
            return null;
        }
        catch (Exception unreadable) when (unreadable is IOException or UnauthorizedAccessException)
        {
            return null;
        }
    }
}
