using BandSpec.Documents.Fonts;
using BandSpec.Documents.Model;

namespace BandSpec.Documents.Pdf.Layout;

/// <summary>
/// Sets a phrase into lines of a width: breaks at spaces and after hyphens and slashes between letters, and within a word only where
/// the word alone is wider than the line, so that nothing ever sticks out.
/// </summary>
internal sealed class LineBreaker
{
    private readonly double _width;
    private readonly List<Line> _lines = [];
    private readonly LineInProgress _line = new();
    private readonly List<Span> _word = [];
    private double _wordWidth;
    private Span? _space;

    private LineBreaker(double width) => _width = width;

    public static IReadOnlyList<Line> Break(Phrase phrase, TextStyle style, double width)
    {
        var breaker = new LineBreaker(width);
        foreach (var run in phrase.Runs) breaker.Take(run, style);
        breaker.EndWord();
        breaker.EndLine();
        return breaker._lines;
    }

    /// <summary>Width of the phrase's longest line when no line is broken but at its own line ends.</summary>
    public static double NaturalWidth(Phrase phrase, TextStyle style) => Break(phrase, style, double.MaxValue).Max(l => l.Width);

    /// <summary>Width of the widest piece that can only be broken by force.</summary>
    public static double WidestWord(Phrase phrase, TextStyle style) => Break(phrase, style, 0).Max(l => l.Width);

    private void Take(Run run, TextStyle style)
    {
        var (face, size, rise) = Setting(run, style);
        var start = 0;
        for (int i = 0; i < run.Text.Length; i++)
        {
            var c = run.Text[i];
            if (c is not (' ' or '\n') && !BreaksAfter(run.Text, i)) continue;
            AddToWord(run.Text[start..(c is ' ' or '\n' ? i : i + 1)], face, size, rise);
            start = i + 1;
            EndWord();
            if (c == '\n') EndLine();
            else if (c == ' ') _space = new Span(Typeface.Of(face).Width(" ", size), rise, " ", face, size);
        }
        AddToWord(run.Text[start..], face, size, rise);
    }

    private static bool BreaksAfter(string text, int i) =>
        text[i] is '-' or '/' && i > 0 && i + 1 < text.Length && char.IsLetter(text[i - 1]) && char.IsLetter(text[i + 1]);

    private static (Face Face, double Size, double Rise) Setting(Run run, TextStyle style)
    {
        var face = run.Lettering switch
        {
            Lettering.Bold => Face.SemiBold, Lettering.Italic => Face.Italic, Lettering.Code => Face.Mono, _ => style.Face
        };
        // The mono face looks larger than the text face at the same size.
        var size = face == Face.Mono ? 0.92 * style.Size : style.Size;
        return run.Shift switch
        {
            Shift.Raised => (face, 0.7 * size, 0.33 * style.Size),
            Shift.Lowered => (face, 0.7 * size, -0.14 * style.Size),
            _ => (face, size, 0),
        };
    }

    private void AddToWord(string text, Face wanted, double size, double rise)
    {
        foreach (var (face, piece) in Letters.InFaces(text, wanted))
        {
            _word.Add(new Span(_wordWidth, rise, piece, face, size));
            _wordWidth += Typeface.Of(face).Width(piece, size);
        }
    }

    private void EndWord()
    {
        if (_word.Count == 0) return;
        var space = _line.IsEmpty ? 0 : _space?.X ?? 0;
        if (!_line.IsEmpty && _line.Width + space + _wordWidth > _width)
        {
            EndLine();
            space = 0;
        }
        if (space > 0) _line.Add(_space!.Value, space);
        // With no width at all the question is only how wide the words are.
        if (_wordWidth > _width && _width > 0) ForceWord();
        else foreach (var span in _word) _line.Add(span, Typeface.Of(span.Face).Width(span.Text, span.Size));
        _word.Clear();
        (_wordWidth, _space) = (0, null);
    }

    private void ForceWord()
    {
        foreach (var span in _word)
            foreach (var rune in span.Text.EnumerateRunes())
            {
                var letter = rune.ToString();
                var width = Typeface.Of(span.Face).Width(letter, span.Size);
                if (!_line.IsEmpty && _line.Width + width > _width) EndLine();
                _line.Add(span with { Text = letter }, width);
            }
    }

    private void EndLine()
    {
        _lines.Add(_line.Finish());
        _space = null;
    }
}
