using System.Globalization;

namespace BandSpec.Documents.Printing;

/// <summary>
/// A figure as it is printed, rounded once: digits, a point, and a minus sign as in files. What a page shows is the same letters with the
/// typesetter's minus and the language's decimal sign, so page and file cannot disagree.
/// </summary>
internal readonly record struct Rounded(string Plain, bool IsBound = false)
{
    // A figure that lies on a step but for the last bits of its calculation counts as being on it.
    private const double OnStep = 1e-7;

    /// <summary>To the next step away from zero: for what is promised as not exceeded.</summary>
    public static Rounded Up(double value, double step) => OfSteps(Math.Sign(value) * Math.Ceiling(Math.Abs(value) / step - OnStep), step);

    /// <summary>To the next step towards zero: for what has to be kept, and for margins, so that none is rounded up to 1.</summary>
    public static Rounded Down(double value, double step) => OfSteps(Math.Sign(value) * Math.Floor(Math.Abs(value) / step + OnStep), step);

    /// <summary>To the next step above, whatever the sign: the lower of two limits.</summary>
    public static Rounded Above(double value, double step) => OfSteps(Math.Ceiling(value / step - OnStep), step);

    /// <summary>To the next step below, whatever the sign: the upper of two limits.</summary>
    public static Rounded Below(double value, double step) => OfSteps(Math.Floor(value / step + OnStep), step);

    public static Rounded Nearest(double value, int decimals) => Write((decimal)Math.Round(value, decimals), decimals);

    /// <summary>As it was given, with no more digits than it has.</summary>
    public static Rounded Given(double value) => new(Math.Round(value, 9).ToString("0.#########", CultureInfo.InvariantCulture));

    /// <summary>As it was given, but with at least so many decimals: a column of given figures lines up.</summary>
    public static Rounded Given(double value, int decimals) =>
        Nearest(value, Math.Max(decimals, Decimals(Math.Abs(Math.Round(value, 9)))));

    /// <summary>
    /// A probability in parts per million, rounded up to two figures, and to a thousandth at least: a page says that it is less.
    /// </summary>
    public static Rounded PerMillion(double probability)
    {
        var parts = probability * 1e6;
        if (parts < 0.001) return new Rounded("0.001", IsBound: true);
        var second = Math.Floor(Math.Log10(parts)) - 1;
        var step = Math.Pow(10, second);
        return Write((decimal)(Math.Ceiling(parts / step - OnStep) * step), Math.Max(0, (int)-second));
    }

    /// <summary>A figure above 0 to three figures.</summary>
    public static Rounded Significant(double value)
    {
        const int Figures = 3;
        var first = value > 0 ? (int)Math.Floor(Math.Log10(value)) : 0;
        return Nearest(value, Math.Clamp(Figures - 1 - first, 0, 9));
    }

    /// <summary>How many decimals a step has: 2 for 0.05.</summary>
    public static int Decimals(double step)
    {
        var text = Math.Round(step, 9).ToString("0.#########", CultureInfo.InvariantCulture);
        return text.Contains('.', StringComparison.Ordinal) ? text.Length - text.IndexOf('.', StringComparison.Ordinal) - 1 : 0;
    }

    /// <summary>As shown on a page of a language that writes this decimal sign; long figures are grouped by threes.</summary>
    public string Shown(string decimalSign) =>
        (IsBound ? "<\u00a0" : "")
        + Grouped(Plain.Replace("-", "\u2212", StringComparison.Ordinal)).Replace(".", decimalSign, StringComparison.Ordinal);

    // Four figures stay together (ISO 80000-1 leaves it open), five and more are grouped with a space that does not break.
    private static string Grouped(string text)
    {
        var end = text.IndexOf('.', StringComparison.Ordinal) is var point && point < 0 ? text.Length : point;
        var start = text.IndexOfAny(['0', '1', '2', '3', '4', '5', '6', '7', '8', '9']);
        if (start < 0 || end - start < 5) return text;
        for (int at = end - 3; at > start; at -= 3) text = text.Insert(at, "\u00a0");
        return text;
    }

    private static Rounded OfSteps(double count, double step) => Write((decimal)count * (decimal)step, Decimals(step));

    private static Rounded Write(decimal value, int decimals)
    {
        var text = value.ToString("F" + decimals.ToString(CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);
        return new Rounded(text.StartsWith('-') && text.All(c => c is '-' or '0' or '.') ? text[1..] : text);
    }
}
