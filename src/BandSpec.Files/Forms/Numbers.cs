using System.Diagnostics.CodeAnalysis;
using System.Globalization;

namespace BandSpec.Files.Forms;

/// <summary>Numbers as they are written in input files: decimal point, no grouping, no NaN and no infinity.</summary>
internal static class Numbers
{
    /// <summary>The same grammar as <see cref="LengthOf"/> for a JSON Schema.</summary>
    internal const string Pattern = @"[+-]?[0-9]+(\.[0-9]+)?([eE][+-]?[0-9]{1,3})?";

    /// <summary>Beyond this no quantity of any unit makes sense, and products of a few of them stay far from infinity.</summary>
    private const double Largest = 1e15;

    /// <summary>The length of the number at the beginning of a text; 0 when there is none.</summary>
    internal static int LengthOf(ReadOnlySpan<char> text)
    {
        int sign = text is ['+' or '-', ..] ? 1 : 0;
        int end = sign + Digits(text[sign..]);
        if (end == sign)
            return 0;
        if (text[end..] is ['.', var first, ..] && char.IsAsciiDigit(first))
            end += 1 + Digits(text[(end + 1)..]);
        return end + ExponentLength(text[end..]);
    }

    /// <summary>Reads a number that is the whole text.</summary>
    internal static bool TryRead(string text, out double number, [NotNullWhen(false)] out Misreading? why)
    {
        why = null;
        number = 0;
        if (text.Length == 0 || LengthOf(text) != text.Length)
            why = Explain(text);
        else if (!(Math.Abs(number = double.Parse(text, NumberStyles.Float, CultureInfo.InvariantCulture)) <= Largest))
            why = new Misreading("number", $"`{Form.Shorten(text)}` is too large", "a number of at most 1e15");
        // A negative zero is a zero: it would be printed with its sign otherwise.
        number += 0.0;
        return why is null;
    }

    private static int Digits(ReadOnlySpan<char> text)
    {
        int end = text.IndexOfAnyExceptInRange('0', '9');
        return end < 0 ? text.Length : end;
    }

    private static int ExponentLength(ReadOnlySpan<char> text)
    {
        if (text is not ['e' or 'E', ..])
            return 0;
        int begin = text.Length > 1 && text[1] is '+' or '-' ? 2 : 1;
        int digits = Digits(text[begin..]);
        return digits is >= 1 and <= 3 ? begin + digits : 0;
    }

    private static Misreading Explain(string text)
    {
        string point = text.Replace(',', '.').Replace('\u2212', '-');
        if (text.Contains(',', StringComparison.Ordinal) && LengthOf(point) == point.Length)
            return new Misreading("number", $"`{Form.Shorten(text)}` has a comma", $"a decimal point: {point}");
        if (text.Contains('\u2212', StringComparison.Ordinal) && LengthOf(point) == point.Length)
            return new Misreading("number", $"`{Form.Shorten(text)}` has a typographic minus sign", $"a hyphen: {point}");
        if (text.TrimStart('+', '-', '.').ToUpperInvariant() is "NAN" or "INF" or "INFINITY")
            return new Misreading("number", $"`{Form.Shorten(text)}` is not a finite number", "a finite number");
        return new Misreading("number", $"`{Form.Shorten(text)}` is not a number", "a number such as 1.5 or -20");
    }
}
