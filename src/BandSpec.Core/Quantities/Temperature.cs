using System.Globalization;

namespace BandSpec.Core.Quantities;

/// <summary>
/// A temperature on the Celsius scale, a point and not an interval: the difference of two is a <see cref="TemperatureDifference"/>.
/// Range: absolute zero and up, finite. Equality and order are those of the number. The default value is 0 °C.
/// </summary>
public readonly record struct Temperature : IComparable<Temperature>
{
    private const double AbsoluteZero = -273.15;

    private Temperature(double celsius) => Celsius = celsius;

    /// <summary>The temperature in °C.</summary>
    public double Celsius { get; }

    /// <summary>The thermodynamic temperature in kelvin, for laws such as Arrhenius'.</summary>
    public double Kelvin => Celsius - AbsoluteZero;

    /// <summary>A temperature from degrees Celsius.</summary>
    /// <exception cref="ArgumentOutOfRangeException">The number is not finite, or below absolute zero (−273.15 °C).</exception>
    public static Temperature FromCelsius(double celsius) =>
        double.IsFinite(celsius) && celsius >= AbsoluteZero
            ? new Temperature(celsius)
            : throw new ArgumentOutOfRangeException(nameof(celsius), celsius, "a temperature is finite and at or above -273.15 °C");

    /// <summary>Whether <see cref="FromCelsius"/> takes the number.</summary>
    public static bool IsValid(double celsius) => double.IsFinite(celsius) && celsius >= AbsoluteZero;

    /// <inheritdoc/>
    public int CompareTo(Temperature other) => Celsius.CompareTo(other.Celsius);

    /// <summary>The colder of two.</summary>
    public static Temperature Min(Temperature a, Temperature b) => a <= b ? a : b;

    /// <summary>The hotter of two.</summary>
    public static Temperature Max(Temperature a, Temperature b) => a >= b ? a : b;

    /// <summary>How far apart two temperatures are, positive when <paramref name="a"/> is the hotter.</summary>
    public static TemperatureDifference operator -(Temperature a, Temperature b) => TemperatureDifference.FromKelvin(a.Celsius - b.Celsius);

    /// <summary>The temperature that lies a difference above.</summary>
    public static Temperature operator +(Temperature a, TemperatureDifference b) => FromCelsius(a.Celsius + b.Kelvin);

    /// <summary>The temperature that lies a difference below.</summary>
    public static Temperature operator -(Temperature a, TemperatureDifference b) => FromCelsius(a.Celsius - b.Kelvin);

    /// <summary>Colder than.</summary>
    public static bool operator <(Temperature a, Temperature b) => a.Celsius < b.Celsius;

    /// <summary>Hotter than.</summary>
    public static bool operator >(Temperature a, Temperature b) => a.Celsius > b.Celsius;

    /// <summary>Colder than or equal to.</summary>
    public static bool operator <=(Temperature a, Temperature b) => a.Celsius <= b.Celsius;

    /// <summary>Hotter than or equal to.</summary>
    public static bool operator >=(Temperature a, Temperature b) => a.Celsius >= b.Celsius;

    /// <summary>The number with its unit, shortest form that reads back the same, in the invariant culture: <c>-20 °C</c>.</summary>
    public override string ToString() => string.Create(CultureInfo.InvariantCulture, $"{Celsius} °C");
}
