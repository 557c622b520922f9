using System.Text;
using BandSpec.Core.Findings;
using BandSpec.Files.Inputs;
using BandSpec.Files.Yaml;

namespace BandSpec.Cli.Printing;

/// <summary>
/// Findings as a person reads them: file, line and column in the form that terminals and editors make a link of, the line itself with a caret
/// below the value, what was found, what is accepted, and the nearest word for a misspelt one.
/// </summary>
internal static class FindingScreen
{
    /// <summary>A longer line is cut around the caret.</summary>
    private const int WidestLine = 150;
    private const int WidestText = 100;

    /// <summary>All findings and their count, ending with a line end.</summary>
    public static string Of(IReadOnlyList<PlacedFinding> findings, Ink ink)
    {
        int files = findings.Select(finding => finding.Place.File).Distinct().Count();
        string count = $"{findings.Count} finding{(findings.Count == 1 ? "" : "s")} in {files} file{(files == 1 ? "" : "s")}";
        return string.Concat(findings.Select(finding => Of(finding, ink))) + ink.Bold(count) + "\n";
    }

    private static string Of(PlacedFinding placed, Ink ink)
    {
        (Finding finding, Place place) = placed;
        string number = place.Line.ToString(null, null).PadLeft(5);
        (string line, string caret) = Cut(place);
        // What concerns a file that could not be had stands at no line of it.
        bool hasLine = line.Length > 0 || place.Line > 1;
        string where = hasLine ? $"{place.File}:{place.Line}:{place.Column}" : place.File;
        string shown = !hasLine ? "" : $"""
            {ink.Faint($"{number} |")} {line}
            {ink.Faint("      |")} {ink.Red(caret)}

            """;
        string accepted = Wrap(finding.Accepted);
        string nearest = finding.Nearest is { } word ? $"        did you mean {ink.Green($"`{word}`")}?\n" : "";
        return $"{ink.Bold(where)}: {ink.Red(Plain(finding.Found))} {ink.Faint($"[{finding.Rule}]")}\n"
            + shown + $"        accepted: {accepted}\n" + nearest + "\n";
    }

    /// <summary>No file can send a terminal anything but text: control characters are shown as a box, tabs as a space.</summary>
    private static string Plain(string text) => string.Concat(text.Select(c => c == '\t' ? ' ' : char.IsControl(c) || IsTurning(c) ? '\uFFFD' : c));

    /// <summary>Marks that turn the direction of writing, and with it what a line seems to say.</summary>
    private static bool IsTurning(char c) => c is (>= '\u200E' and <= '\u200F') or (>= '\u202A' and <= '\u202E') or (>= '\u2066' and <= '\u2069');

    /// <summary>Long lists go on below, under their beginning.</summary>
    private static string Wrap(string text)
    {
        StringBuilder wrapped = new();
        int column = 0;
        foreach (string word in text.Split(' '))
        {
            if (column + word.Length > WidestText && column > 0)
                (_, column) = (wrapped.Append("\n                  "), 0);
            else if (wrapped.Length > 0)
                (_, column) = (wrapped.Append(' '), column + 1);
            wrapped.Append(word);
            column += word.Length;
        }
        return wrapped.ToString();
    }

    /// <summary>The line and the carets below it, both cut to what fits.</summary>
    private static (string Line, string Caret) Cut(Place place)
    {
        string text = Plain(place.Text);
        int begin = Math.Min(place.Column - 1, text.Length);
        int from = begin + place.Length <= WidestLine ? 0 : Math.Max(0, begin - (WidestLine / 4));
        string left = from > 0 ? "..." : "", right = text.Length - from > WidestLine ? "..." : "";
        string line = string.Concat(left, text.AsSpan(from, Math.Min(WidestLine, text.Length - from)), right);
        int length = Math.Clamp(place.Length, 1, Math.Max(1, Math.Min(WidestLine, text.Length - from) - (begin - from)));
        string before = left + text[from..begin];
        string under = text.Substring(begin, Math.Min(length, text.Length - begin));
        return (line, new string(' ', CellWidth.Of(before)) + new string('^', Math.Max(1, CellWidth.Of(under))));
    }
}
