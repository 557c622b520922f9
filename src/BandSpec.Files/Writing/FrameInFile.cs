namespace BandSpec.Files.Writing;

/// <summary>
/// Keeps in a platform file what new statistics do not touch as it was written: the line that tells editors the schema, ratings, correction and
/// ageing with their remarks. What a person wrote about them is not to be lost because units were measured.
/// </summary>
public static class FrameInFile
{
    private static readonly string[] Always = ["pressure:", "correction:", "ageing:"];

    /// <summary>The new file's text with the sections of the earlier one.</summary>
    /// <param name="earlier">The platform file as it was; known to be one.</param>
    /// <param name="written">The platform file with new statistics, as <see cref="PlatformYaml"/> writes it.</param>
    /// <param name="isRenamed">Whether name or revision are new.</param>
    /// <param name="isMoved">Whether the reference temperature is new.</param>
    public static string Keep(string earlier, string written, bool isRenamed, bool isMoved)
    {
        ArgumentNullException.ThrowIfNull(earlier);
        ArgumentNullException.ThrowIfNull(written);
        List<string> old = Lines(earlier), lines = Lines(written);
        IEnumerable<string> kept = Always.Concat(isRenamed ? [] : ["platform:"]).Concat(isMoved ? [] : ["temperature:"]);
        foreach (string key in kept)
            Put(lines, old, key);
        lines.InsertRange(0, old.Where(line => line.StartsWith("# yaml-language-server:", StringComparison.Ordinal)).Take(1));
        return string.Join('\n', lines) + "\n";
    }

    private static void Put(List<string> lines, List<string> old, string key)
    {
        // Only ageing has remarks above it that are its own; those above the first key speak of the whole file.
        (int from, int to) = key == "ageing:" ? YamlSection.WithRemarks(old, key) : YamlSection.Of(old, key, 0, 0, old.Count);
        if (from == to)
            return;
        (int begin, int end) = YamlSection.Of(lines, key, 0, 0, lines.Count);
        lines.RemoveRange(begin, end - begin);
        lines.InsertRange(begin, old[from..to]);
    }

    private static List<string> Lines(string text) => [.. text.ReplaceLineEndings("\n").TrimEnd('\n').Split('\n')];
}
