using System.Text;

namespace BandSpec.Documents.Fonts;

/// <summary>Which letters can be set at all, and in which face each is set when the wanted one lacks it.</summary>
public static class Letters
{
    private static readonly Face[] Substitutes = [Face.Regular, Face.SemiBold, Face.Italic, Face.Mono];

    /// <summary>
    /// The letters of a text that none of the embedded faces has, each once, in order of first appearance; empty when the text can be
    /// set. Line ends and tabs count as set. An input with such letters should be refused with a finding: a document shows them neither
    /// as a box nor not at all, but fails.
    /// </summary>
    public static IReadOnlyList<string> Missing(string text)
    {
        ArgumentNullException.ThrowIfNull(text);
        return [.. text.EnumerateRunes().Where(r => !IsLayout(r) && FaceFor(r, Face.Regular) is null).Select(r => r.ToString()).Distinct()];
    }

    /// <summary>Cuts a text into pieces of one face each: the wanted face where it has the letters, a substitute elsewhere.</summary>
    internal static IEnumerable<(Face Face, string Text)> InFaces(string text, Face wanted)
    {
        if (text.All(c => c is >= ' ' and <= '~')) return [(wanted, text)];
        return Cut(text, wanted);
    }

    private static IEnumerable<(Face Face, string Text)> Cut(string text, Face wanted)
    {
        var piece = new StringBuilder();
        var current = wanted;
        foreach (var rune in text.EnumerateRunes())
        {
            var face = FaceFor(rune, wanted) ?? throw new MissingLetterException(rune.ToString(), text);
            if (face != current && piece.Length > 0)
            {
                yield return (current, piece.ToString());
                piece.Clear();
            }
            current = face;
            piece.Append(rune);
        }
        if (piece.Length > 0) yield return (current, piece.ToString());
    }

    private static Face? FaceFor(Rune rune, Face wanted)
    {
        if (Typeface.Of(wanted).Has(rune.Value)) return wanted;
        foreach (var face in Substitutes)
            if (Typeface.Of(face).Has(rune.Value))
                return face;
        return null;
    }

    private static bool IsLayout(Rune rune) => rune.Value is '\n' or '\r' or '\t';
}
