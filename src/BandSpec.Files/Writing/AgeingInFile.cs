using BandSpec.Core.Requirements;

namespace BandSpec.Files.Writing;

/// <summary>
/// Puts new ageing into the text of a platform file and leaves everything else as it stands, remarks included: the statistics beside it come
/// from another sample and have nothing to do with it.
/// </summary>
public static class AgeingInFile
{
    /// <summary>The file's text with the new ageing.</summary>
    /// <param name="text">The platform file as it is; known to be one.</param>
    /// <param name="ageing">The drift.</param>
    /// <param name="accuracy">How uncertain it is.</param>
    /// <param name="remarks">What is said beside the figures, by key.</param>
    public static string Replace(
        string text, Ageing ageing, AgeingAccuracy accuracy, IReadOnlyDictionary<string, IReadOnlyList<string>> remarks)
    {
        ArgumentNullException.ThrowIfNull(text);
        ArgumentNullException.ThrowIfNull(ageing);
        ArgumentNullException.ThrowIfNull(accuracy);
        List<string> lines = [.. text.ReplaceLineEndings("\n").TrimEnd('\n').Split('\n')];
        (int begin, int end) = YamlSection.WithRemarks(lines, "ageing:");
        Put(lines, begin, end, written => PlatformYaml.AgeingLines(ageing, written), remarks);
        (int sample, int sampleEnd) = YamlSection.Of(lines, "sample:", 0, 0, lines.Count);
        if (sample < sampleEnd)
        {
            (int part, int partEnd) = YamlSection.Of(lines, "ageing:", 2, sample + 1, sampleEnd);
            Put(lines, part, partEnd, written => SampleYaml.Write(accuracy, written), remarks);
        }

        return string.Join('\n', lines) + "\n";
    }

    private static void Put(
        List<string> lines, int begin, int end, Action<YamlLines> write, IReadOnlyDictionary<string, IReadOnlyList<string>> remarks)
    {
        YamlLines written = new(remarks);
        write(written);
        lines.RemoveRange(begin, end - begin);
        lines.InsertRange(begin, written.ToString().TrimEnd('\n').Split('\n'));
    }
}
