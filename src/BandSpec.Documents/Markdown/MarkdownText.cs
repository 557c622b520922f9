using System.Text;
using BandSpec.Documents.Model;

namespace BandSpec.Documents.Markdown;

/// <summary>
/// Phrases in Markdown. Raised and lowered letters become <c>sup</c> and <c>sub</c>, and emphasis inside a word becomes a tag too: stars
/// between letters mean different things to different readers.
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
            if (text[i] is '\\' or '`' or '*' or '_' or '[' or ']' or '<' or '>' or '|' or '~' or '#' && (text[i] != '#' || i == 0)) safe.Append('\\');
            safe.Append(text[i] == '&' ? "&amp;" : text[i].ToString());
        }
        return safe.ToString();
    }

    private static string Runs(Phrase phrase) => string.Concat(phrase.Runs.Select(Run));

    private static string Run(Run run)
    {
        var text = run.Lettering switch
        {
            Lettering.Code => Code(run.Text),
            Lettering.Bold => Around(run.Text, "**", "b"),
            Lettering.Italic => Around(run.Text, "*", "i"),
            _ => Escape(run.Text),
        };
        return run.Shift switch { Shift.Raised => $"<sup>{text}</sup>", Shift.Lowered => $"<sub>{text}</sub>", _ => text };
    }

    // Spaces at the ends stand outside the marks, where they are no part of the emphasis.
    private static string Around(string text, string mark, string tag)
    {
        var core = text.Trim(' ', '\u00a0');
        if (core.Length == 0) return text;
        var plain = char.IsLetterOrDigit(core[0]) && char.IsLetterOrDigit(core[^1]);
        var (open, close) = plain ? (mark, mark) : ($"<{tag}>", $"</{tag}>");
        var start = text.IndexOf(core, StringComparison.Ordinal);
        return text[..start] + open + Escape(core) + close + text[(start + core.Length)..];
    }

    private static string Code(string text) => text.Contains('`', StringComparison.Ordinal) ? $"`` {text} ``" : $"`{text}`";
}
