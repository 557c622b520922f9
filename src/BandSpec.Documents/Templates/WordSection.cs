namespace BandSpec.Documents.Templates;

/// <summary>An entry of a word file before it is parsed.</summary>
internal sealed record WordSection(string Key, int Line, string Text)
{
    private const string Opening = ":: ";

    /// <summary>
    /// The text below as many empty lines as stand above it in the file, so that Scriban's own messages name the right line.
    /// </summary>
    public string PaddedText => new string('\n', Line) + Text;

    public static IEnumerable<WordSection> Cut(string file, string text)
    {
        var lines = text.ReplaceLineEndings("\n").Split('\n');
        for (int i = 0; i < lines.Length;)
        {
            var first = i++;
            if (!lines[first].StartsWith(Opening, StringComparison.Ordinal))
            {
                if (lines[first].Trim().Length == 0 || lines[first].StartsWith('#')) continue;
                throw new TemplateException(
                    file, first + 1, 1, "A word file begins with a comment (#) or the opening of an entry (:: key).");
            }
            while (i < lines.Length && !lines[i].StartsWith(Opening, StringComparison.Ordinal)) i++;
            yield return new WordSection(lines[first][Opening.Length..].Trim(), first + 1, string.Join('\n', lines[(first + 1)..i]));
        }
    }
}
