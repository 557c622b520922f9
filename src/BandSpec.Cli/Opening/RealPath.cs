namespace BandSpec.Cli.Opening;

/// <summary>Where a path leads once every symbolic link in it is followed.</summary>
internal static class RealPath
{
    /// <summary>Links that lead to links; more than any honest file system has, and few enough to end a circle.</summary>
    private const int MostLinks = 40;

    /// <summary>The real path of a full path; parts that do not exist are taken as they are.</summary>
    public static string Of(string path)
    {
        for (int links = 0; links < MostLinks; links++)
        {
            if (FirstLink(path) is not { } link)
                return path;
            path = link;
        }
        return path;
    }

    /// <summary>Whether a real path is a folder or something in it.</summary>
    public static bool IsInside(string path, string folder)
    {
        string relative = Path.GetRelativePath(folder, path);
        return relative != ".." && !relative.StartsWith($"..{Path.DirectorySeparatorChar}", StringComparison.Ordinal) && !Path.IsPathRooted(relative);
    }

    /// <summary>The path with its first symbolic link replaced by what it points at; null when there is none.</summary>
    private static string? FirstLink(string path)
    {
        string done = Path.GetPathRoot(path) ?? "";
        string[] parts = path[done.Length..].Split(Path.DirectorySeparatorChar, StringSplitOptions.RemoveEmptyEntries);
        for (int i = 0; i < parts.Length; i++)
        {
            string next = Path.Combine(done, parts[i]);
            if (new FileInfo(next).LinkTarget is { } target)
                return Path.GetFullPath(Path.Combine([Path.GetFullPath(target, done), .. parts[(i + 1)..]]));
            done = next;
        }
        return null;
    }
}
