using System.Text;

namespace BandSpec.Documents.Model;

/// <summary>
/// The few marks that the words of a template may carry: <c>**bold**</c>, <c>*italic*</c>, <c>`code`</c>, <c>^{raised}</c>,
/// <c>_{lowered}</c>, and a backslash before a letter that is meant as itself. Unlike Markdown, what a mark means never depends on
/// its neighbours, and a mark left open is an error.
/// </summary>
internal sealed class Markup
{
    private readonly string _text;
    private readonly List<Run> _runs = [];
    private readonly StringBuilder _letters = new();
    private bool _bold, _italic, _code;
    private Shift _shift;
    private int _at;

    private Markup(string text) => _text = text;

    /// <exception cref="FormatException">A mark is opened and not closed.</exception>
    public static Phrase Parse(string text) => new Markup(text).Read();

    /// <summary>Protects a value, so that it is read back letter by letter.</summary>
    public static string Escape(string value)
    {
        var safe = new StringBuilder(value.Length);
        foreach (var c in value)
            (c is '\\' or '*' or '`' or '^' or '_' or '}' ? safe.Append('\\') : safe).Append(c);
        return safe.ToString();
    }

    private Phrase Read()
    {
        while (_at < _text.Length)
            if (!ReadMark())
                _letters.Append(_text[_at++]);
        Cut();
        if (_bold || _italic || _code || _shift != Shift.None)
            throw new FormatException($"A mark is opened and not closed in \"{_text}\"; write \\* for a star that is meant as itself.");
        return new Phrase(_runs);
    }

    private bool ReadMark() => _text[_at] switch
    {
        '\\' when _at + 1 < _text.Length => Literal(),
        '`' => Toggle(ref _code, 1),
        _ when _code => false,
        '*' when Next('*') => Toggle(ref _bold, 2),
        '*' => Toggle(ref _italic, 1),
        '^' when Next('{') => Move(Shift.Raised, 2),
        '_' when Next('{') => Move(Shift.Lowered, 2),
        '}' when _shift != Shift.None => Move(Shift.None, 1),
        _ => false,
    };

    private bool Next(char c) => _at + 1 < _text.Length && _text[_at + 1] == c;

    private bool Literal()
    {
        _letters.Append(_text[_at + 1]);
        _at += 2;
        return true;
    }

    private bool Toggle(ref bool mark, int length)
    {
        Cut();
        mark = !mark;
        _at += length;
        return true;
    }

    private bool Move(Shift shift, int length)
    {
        Cut();
        _shift = shift;
        _at += length;
        return true;
    }

    private void Cut()
    {
        if (_letters.Length == 0) return;
        var lettering = _code ? Lettering.Code : _bold ? Lettering.Bold : _italic ? Lettering.Italic : Lettering.Plain;
        _runs.Add(new Run(_letters.ToString(), lettering, _shift));
        _letters.Clear();
    }
}
