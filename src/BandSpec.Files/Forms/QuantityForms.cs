using System.Diagnostics.CodeAnalysis;
using BandSpec.Core.Quantities;

namespace BandSpec.Files.Forms;

/// <summary>The quantities of input files and the units in which each may be written.</summary>
internal static class QuantityForms
{
    private const double FahrenheitPerKelvin = 1.8;

    private static readonly (string Symbol, double Hours)[] Times = [("s", 1 / 3600.0), ("min", 1 / 60.0), ("h", 1), ("d", 24), ("y", 8760)];

    /// <summary>A temperature, a point of the scale.</summary>
    internal static QuantityForm<Temperature> Temperature { get; } = new(
        "a temperature", "-273.15 °C and up", "25 °C",
        new("°C", MakeTemperature, "degC", "℃"),
        new("K", (double n, Reading r, out Temperature t) => MakeTemperature(Rounded(n - 273.15), r, out t)),
        new("°F", (double n, Reading r, out Temperature t) => MakeTemperature(Rounded((n - 32) / FahrenheitPerKelvin), r, out t), "degF", "℉"));

    /// <summary>A difference of temperatures.</summary>
    internal static QuantityForm<TemperatureDifference> Difference { get; } = new(
        "a temperature difference", "any number", "15 K", new Unit<TemperatureDifference>("K", MakeDifference));

    /// <summary>A rate of heating or cooling, read as the difference in a minute.</summary>
    internal static QuantityForm<TemperatureDifference> Rate { get; } = new(
        "a rate of temperature", "any number", "3 K/min", new Unit<TemperatureDifference>("K/min", MakeDifference));

    /// <summary>A pressure, printed back in the unit it was written in.</summary>
    internal static QuantityForm<Pressure> Pressure { get; } = new(
        "a pressure", "any number", "25 bar", [.. PressureUnit.All.Select(unit => new Unit<Pressure>(unit.Symbol, MakePressure(unit)))]);

    /// <summary>An error: percent of span, or a pressure that is converted with the requirement's span.</summary>
    internal static QuantityForm<PercentOfSpan> Error { get; } = new(
        "an error", "a part of the span", "0.5 %FS",
        [new("%FS", MakeError), .. PressureUnit.All.Select(unit => new Unit<PercentOfSpan>(unit.Symbol, MakeErrorFrom(unit)))]);

    /// <summary>A length of time.</summary>
    internal static QuantityForm<Duration> Time { get; } = new(
        "a time", "not negative", "1500 h", [.. Times.Select(time => new Unit<Duration>(time.Symbol, MakeTime(time.Hours)))]);

    /// <summary>A dwell: a time, or a part of the service life.</summary>
    internal static QuantityForm<Dwell> Dwell { get; } = new(
        "a dwell", "not negative", "1500 h",
        [.. Times.Select(time => new Unit<Dwell>(time.Symbol, MakeDwell(MakeTime(time.Hours)))), new("%", MakeShare)]);

    /// <summary>A percentage that is not of the span, read as a ratio.</summary>
    internal static QuantityForm<Ratio> Percentage { get; } = new(
        "a percentage", "any number", "2 %", new Unit<Ratio>("%", (double n, Reading _, out Ratio r) => Made(new Ratio(n / 100), out r)));

    /// <summary>An energy of a single particle, read in electronvolts.</summary>
    internal static QuantityForm<double> Energy { get; } = new(
        "an energy", "any number", "0.6 eV", new Unit<double>("eV", (double n, Reading _, out double e) => Made(n, out e)));

    private static double Rounded(double celsius) => Math.Round(celsius, 9);

    private static bool Made<T>(T made, out T value)
    {
        value = made;
        return true;
    }

    private static bool MakeTemperature(double celsius, Reading reading, out Temperature value)
    {
        bool valid = Core.Quantities.Temperature.IsValid(celsius);
        value = valid ? Core.Quantities.Temperature.FromCelsius(celsius) : default;
        return valid;
    }

    private static bool MakeDifference(double kelvin, Reading reading, out TemperatureDifference value) =>
        Made(TemperatureDifference.FromKelvin(kelvin), out value);

    private static MakeQuantity<Pressure> MakePressure(PressureUnit unit) =>
        (double number, Reading _, out Pressure value) => Made(Core.Quantities.Pressure.From(number, unit), out value);

    private static bool MakeError(double percent, Reading reading, out PercentOfSpan value) =>
        Made(PercentOfSpan.FromPercent(percent), out value);

    private static MakeQuantity<PercentOfSpan> MakeErrorFrom(PressureUnit unit) => (double number, Reading reading, out PercentOfSpan value) =>
    {
        reading.SpanIsMissed |= reading.SpanInPascals is null;
        double percent = 100 * number * unit.Pascals / (reading.SpanInPascals ?? 1);
        bool finite = double.IsFinite(percent);
        return MakeError(finite ? percent : 0, reading, out value) && finite;
    };

    private static MakeQuantity<Duration> MakeTime(double hours) => (double number, Reading _, out Duration value) =>
        Made(number < 0 ? default : Duration.FromHours(number * hours), out value) && number >= 0;

    private static MakeQuantity<Dwell> MakeDwell(MakeQuantity<Duration> makeTime) =>
        (double number, Reading reading, [MaybeNullWhen(false)] out Dwell value) =>
        {
            bool valid = makeTime(number, reading, out Duration time);
            value = new Dwell(time, null);
            return valid;
        };

    private static bool MakeShare(double percent, Reading reading, [MaybeNullWhen(false)] out Dwell value)
    {
        value = new Dwell(null, percent);
        return percent >= 0;
    }
}

/// <summary>A dwell as it was written: a time, or percent of the service life.</summary>
/// <param name="Time">The time; <see langword="null"/> when it was written in percent.</param>
/// <param name="Percent">Percent of the service life; <see langword="null"/> when it was written as a time.</param>
internal sealed record Dwell(Duration? Time, double? Percent);

/// <summary>A plain ratio: 0.02 for 2 %.</summary>
/// <param name="Value">The ratio.</param>
internal readonly record struct Ratio(double Value);
