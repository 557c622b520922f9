using System.Text;
using BandSpec.Documents.Model;

namespace BandSpec.Documents.Markdown;

/// <summary>
/// Phrases in Markdown. Raised and lowered letters become <c>sup</c> and <c>sub</c>, and emphasis whose stars a reader might not see as
/// such becomes a tag too.
/// </summary>
internal static class MarkdownText
{
    /// <summary>A paragraph; a forced line end stays one.</summary>
    public static string Of(Phrase phrase) => Runs(phrase).Replace("\n", "  \n", StringComparison.Ordinal);

    /// <summary>For list items, headings and cells, which must stay on one line.</summary>
    public static string OneLine(Phrase phrase) => Runs(phrase).Replace('\n', ' ');

    public static string Escape(string text)
    {
        var safe = new StringBuilder(text.Length);
        for (int i = 0; i < text.Length; i++)
        {
            if (@"\`*_[]<>|~".Contains(text[i], StringComparison.Ordinal) || (text[i] == '#' && i == 0)) safe.Append('\\');
            safe.Append(text[i] == '&' ? "&amp;" : text[i].ToString());
        }
        return safe.ToString();
    }

    private static string Runs(Phrase phrase)
    {
        var runs = phrase.Runs.Where(r => r.Text.Length > 0).ToList();
        char Before(int i) => i > 0 ? runs[i - 1].Text[^1] : ' ';
        char After(int i) => i + 1 < runs.Count ? runs[i + 1].Text[0] : ' ';
        return string.Concat(runs.Select((run, i) => Run(run, Before(i), After(i))));
    }

    private static string Run(Run run, char before, char after)
    {
        var text = run.Lettering switch
        {
            Lettering.Code => Code(run.Text),
            Lettering.Bold => Around(run.Text, "**", "b", before, after),
            Lettering.Italic => Around(run.Text, "*", "i", before, after),
            _ => Escape(run.Text),
        };
        return run.Shift switch { Shift.Raised => $"<sup>{text}</sup>", Shift.Lowered => $"<sub>{text}</sub>", _ => text };
    }

    // Spaces at the ends stand outside the marks, where they are no part of the emphasis.
    private static string Around(string text, string mark, string tag, char before, char after)
    {
        var core = text.Trim(' ', '\u00a0');
        if (core.Length == 0) return text;
        // A star opens before a letter or after a space, and closes after a letter or before a space (CommonMark 0.31, 6.2).
        var opens = char.IsLetterOrDigit(core[0]) || char.IsWhiteSpace(before);
        var closes = char.IsLetterOrDigit(core[^1]) || char.IsWhiteSpace(after);
        var (open, close) = opens && closes ? (mark, mark) : ($"<{tag}>", $"</{tag}>");
        var start = text.IndexOf(core, StringComparison.Ordinal);
        return text[..start] + open + Escape(core) + close + text[(start + core.Length)..];
    }

    private static string Code(string text) => text.Contains('`', StringComparison.Ordinal) ? $"`` {text} ``" : $"`{text}`";
}
