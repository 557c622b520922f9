using System.Text;
using System.Text.RegularExpressions;
using BandSpec.Cli.Opening;
using BandSpec.Documents;

namespace BandSpec.Cli.Judging;

/// <summary>
/// Charts that an earlier judgement left in a folder. Ours to remove is only a file that the earlier judgement's text shows as a figure and whose name
/// is one that judgements give: a number, a hyphen and a characteristic, with no folder in it. What the text does not show stays, whatever its name.
/// </summary>
internal static partial class EarlierCharts
{
    /// <summary>Removes the earlier charts that the new judgement does not have.</summary>
    /// <param name="folder">The folder's full path.</param>
    /// <param name="text">Name of the text in it; there may be none.</param>
    /// <param name="documents">The documents of the new judgement.</param>
    /// <exception cref="IOException">The text cannot be read or a chart cannot be removed.</exception>
    /// <exception cref="UnauthorizedAccessException">The rights do not allow it.</exception>
    public static void Remove(string folder, string text, IReadOnlyList<DocumentFile> documents)
    {
        string path = Path.Combine(folder, text);
        if (!File.Exists(path))
            return;
        string earlier = Encoding.UTF8.GetString(BoundedFile.Read(path));
        foreach (string chart in Shown().Matches(earlier).Select(match => match.Groups["chart"].Value).Except(documents.Select(d => d.Name)))
            File.Delete(Path.Combine(folder, chart));
    }

    [GeneratedRegex(@"^!\[.*\]\((?<chart>[0-9]{2,}-[A-Za-z0-9_-]*\.svg)\)\r?$", RegexOptions.Multiline | RegexOptions.CultureInvariant)]
    private static partial Regex Shown();
}
