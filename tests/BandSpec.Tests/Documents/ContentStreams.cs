using System.IO.Compression;
using System.Text;
using System.Text.RegularExpressions;

namespace BandSpec.Tests.Documents;

/// <summary>The page contents of a finished PDF, unpacked, and a check that brackets close in the order they open.</summary>
internal static partial class ContentStreams
{
    public static IReadOnlyList<string> Of(byte[] pdf) => [.. All(pdf).Where(s => s.Contains("BDC\n", StringComparison.Ordinal))];

    /// <summary>Every compressed stream of the file.</summary>
    public static IEnumerable<string> All(byte[] pdf)
    {
        var text = Encoding.Latin1.GetString(pdf);
        foreach (Match match in Stream().Matches(text))
        {
            var length = int.Parse(match.Groups[1].Value);
            using var packed = new ZLibStream(new MemoryStream(pdf, match.Index + match.Length, length), CompressionMode.Decompress);
            using var plain = new MemoryStream();
            packed.CopyTo(plain);
            yield return Encoding.Latin1.GetString(plain.ToArray());
        }
    }

    /// <summary>
    /// The first bracket that closes another than the one opened last; none when all is well. Marked content and text objects have to be
    /// nested in one another; saved graphics states only among themselves (ISO 32000-1, 14.6.1 and 8.4.2).
    /// </summary>
    public static string? WrongNesting(string content) =>
        WrongNesting(content, "q", "Q") ?? WrongNesting(content, "BT", "ET", "EMC", "BDC", "BMC");

    private static string? WrongNesting(string content, params string[] kinds)
    {
        var open = new Stack<string>();
        foreach (Match match in Bracket().Matches(content))
        {
            if (!kinds.Any(kind => match.Value.EndsWith(kind, StringComparison.Ordinal))) continue;
            var (opens, closes) = match.Value.Trim() switch
            {
                "BT" => ("ET", ""), "q" => ("Q", ""), "ET" or "Q" or "EMC" => ("", match.Value.Trim()), _ => ("EMC", "")
            };
            if (opens.Length > 0) open.Push(opens);
            else if (open.Count == 0 || open.Pop() != closes) return $"{closes} at {match.Index}";
        }
        return open.Count == 0 ? null : $"{open.Peek()} is missing at the end";
    }

    [GeneratedRegex(@"<</Length (\d+)/Filter/FlateDecode[^\n]*\nstream\n")]
    private static partial Regex Stream();

    [GeneratedRegex(@"^(BT|ET|q|Q|EMC|.*(BDC|BMC))$", RegexOptions.Multiline)]
    private static partial Regex Bracket();
}
