using System.Globalization;
using BandSpec.Core.Characterizing;

namespace BandSpec.Documents.Printing;

/// <summary>Estimated figures as reports print them: three significant digits, two for the ends of an interval, with the typesetter's minus sign.</summary>
internal static class Figures
{
    public static string Whole(long value) => value.ToString(CultureInfo.InvariantCulture).Replace('-', '\u2212');

    public static string Short(double value) => Digits(value, 3);

    /// <summary>A number that was chosen, not measured, such as a temperature or a confidence: no digit more than it has, at most four.</summary>
    public static string Given(double value) => value.ToString("0.####", CultureInfo.InvariantCulture).Replace('-', '\u2212');

    /// <summary>The estimate with its interval in brackets; the estimate alone where there is none.</summary>
    public static string WithRange(Estimate estimate) => estimate switch
    {
        { Lower: 0, Upper: 0 } => "\u2013",
        { Upper: double.PositiveInfinity } => $"{Short(estimate.Value)} ({Digits(estimate.Lower, 2)} and up)",
        _ when estimate.Lower == estimate.Upper => $"{Short(estimate.Value)} (assumed)",
        _ => $"{Short(estimate.Value)} ({Digits(estimate.Lower, 2)} to {Digits(estimate.Upper, 2)})",
    };

    private static string Digits(double value, int digits)
    {
        if (Math.Abs(value) < 1e-9)
            return "0";
        int decimals = Math.Clamp(digits - 1 - (int)Math.Floor(Math.Log10(Math.Abs(value))), 0, 9);
        return value.ToString($"F{decimals}", CultureInfo.InvariantCulture).Replace('-', '\u2212');
    }
}
