using System.Globalization;
using BandSpec.Core.Findings;
using BandSpec.Core.Quantities;

namespace BandSpec.Core.Requirements;

/// <summary>The rule that a figure lies in its accepted range, for every kind of figure; one that could not be read breaks no rule.</summary>
internal static class RangeRules
{
    /// <summary>Judges a number in the unit of the range.</summary>
    public static void InRange(this FileFindings findings, string path, double? written, AcceptedRange range)
    {
        if (written is not { } number)
            return;
        string found = string.Create(CultureInfo.InvariantCulture, $"{number} {range.Unit}").TrimEnd();
        findings.Require(range.Holds(number), path, "out-of-range", found, range.ToString());
    }

    /// <summary>Judges an error.</summary>
    public static void InRange(this FileFindings findings, string path, PercentOfSpan? error, AcceptedRange range) =>
        findings.InRange(path, error?.Percent, range);

    /// <summary>Judges a difference of temperatures.</summary>
    public static void InRange(this FileFindings findings, string path, TemperatureDifference? difference, AcceptedRange range) =>
        findings.InRange(path, difference?.Kelvin, range);

    /// <summary>Judges a temperature.</summary>
    public static void InRange(this FileFindings findings, string path, Temperature temperature, AcceptedRange range) =>
        findings.InRange(path, temperature.Celsius, range);

    /// <summary>Judges a pressure, which is shown in its own unit.</summary>
    public static void InRange(this FileFindings findings, string path, Pressure pressure)
    {
        findings.Require(
            AcceptedRanges.Pressure.Holds(pressure.Pascals), path, "out-of-range", pressure.ToString(), "a magnitude of at most 10 GPa, 100000 bar");
    }

    /// <summary>Judges a mean and its standard deviation; a mean that is a magnitude is not negative.</summary>
    public static void InRange(this FileFindings findings, string path, Spread? spread, AcceptedRange mean)
    {
        findings.InRange($"{path}.mean", spread?.Mean, mean);
        findings.InRange($"{path}.sigma", spread?.Sigma, AcceptedRanges.Spread);
    }

    /// <summary>Judges that three temperatures are a range of at least a kelvin with the reference inside.</summary>
    public static void IsRange(this FileFindings findings, string path, OperatingTemperature range)
    {
        findings.InRange($"{path}.lower", range.Lower, AcceptedRanges.Temperature);
        findings.InRange($"{path}.upper", range.Upper, AcceptedRanges.Temperature);
        findings.Require(
            (range.Upper - range.Lower).Kelvin >= 1, $"{path}.upper", "temperature-order",
            $"the upper temperature {range.Upper} is not above the lower, {range.Lower}", "at least 1 K above the lower");
        findings.Require(
            range.Reference >= range.Lower && range.Reference <= range.Upper, $"{path}.reference", "reference-temperature",
            $"the reference temperature {range.Reference} is outside {range.Lower} to {range.Upper}", "a temperature inside the range");
    }
}
