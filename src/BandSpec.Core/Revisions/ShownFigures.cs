using System.Globalization;

namespace BandSpec.Core.Revisions;

/// <summary>Writes the two values of a change side by side: with the same decimals, and no more digits than it takes to tell them apart.</summary>
internal static class ShownFigures
{
    private const int FewestDigits = 5;
    private const int MostDigits = 15;

    /// <summary>Numbers from here to there are written without a power of ten.</summary>
    private const double SmallestPlain = 1e-4, LargestPlain = 1e7;

    /// <summary>Both values with their units. Inputs are shown as they were written.</summary>
    public static (string? Old, string? New) Of(Figure? old, Figure? now)
    {
        bool isInput = (old ?? now)!.Subject <= FigureSubject.Station;
        if (isInput || (old ?? now)!.Number is null || (old is not null && now is not null && (old.Unit != now.Unit || now.Number is null)))
            return (old?.Text, now?.Text);
        double[] numbers = [.. new[] { old?.Number, now?.Number }.OfType<double>()];
        string[] written = Write(numbers);
        return (old is null ? null : Join(written[0], old.Unit), now is null ? null : Join(written[^1], now.Unit));
    }

    /// <summary>Numbers with as many decimals as the largest needs for so many digits; zeros that all have at their end are left out.</summary>
    public static string[] WithDigits(int digits, params double[] numbers) => Trim([.. numbers.Select(number => Write(number, digits, numbers.Max(Math.Abs)))]);

    private static string[] Write(double[] numbers)
    {
        for (int digits = FewestDigits; digits < MostDigits; digits++)
        {
            string[] written = [.. numbers.Select(number => Write(number, digits, numbers.Max(Math.Abs)))];
            if (written.Length == 1 || written[0] != written[1])
                return Trim(written);
        }

        return [.. numbers.Select(number => number.ToString(CultureInfo.InvariantCulture))];
    }

    private static string Write(double number, int digits, double largest)
    {
        if (!double.IsFinite(number))
            return "unlimited";
        if (largest is not 0 and (< SmallestPlain or >= LargestPlain))
            return number.ToString($"0.{new string('0', digits - 1)}e0", CultureInfo.InvariantCulture);
        int whole = largest == 0 || !double.IsFinite(largest) ? 1 : (int)Math.Floor(Math.Log10(largest)) + 1;
        return number.ToString($"F{Math.Max(0, digits - Math.Max(whole, 1))}", CultureInfo.InvariantCulture);
    }

    /// <summary>Zeros that all have at their end say nothing.</summary>
    private static string[] Trim(string[] written)
    {
        while (written.All(w => w.Contains('.', StringComparison.Ordinal) && !w.Contains('e', StringComparison.Ordinal) && w[^1] is '0' or '.'))
        {
            bool isPoint = written.Any(w => w[^1] == '.');
            written = [.. written.Select(w => w[..^1])];
            if (isPoint)
                break;
        }

        return written;
    }

    private static string Join(string number, string unit) => unit.Length == 0 ? number : $"{number} {unit}";
}
