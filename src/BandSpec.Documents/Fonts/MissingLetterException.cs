namespace BandSpec.Documents.Fonts;

/// <summary>
/// Thrown when a document holds a letter that no embedded face has. Texts of an input are checked with <see cref="Letters.Missing"/>
/// beforehand, so this shows a letter that came in by another way, such as a template.
/// </summary>
public sealed class MissingLetterException : Exception
{
    /// <summary>Names the letter and the text that holds it.</summary>
    /// <param name="letter">The letter that no face has.</param>
    /// <param name="text">The text it stands in.</param>
    public MissingLetterException(string letter, string text)
        : base($"No embedded font has the letter '{letter}' (U+{char.ConvertToUtf32(letter, 0):X4}) of \"{text}\".") => Letter = letter;

    /// <summary>The letter that no face has: one code point, never empty.</summary>
    public string Letter { get; }
}
