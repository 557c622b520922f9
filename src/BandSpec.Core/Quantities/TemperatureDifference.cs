using System.Globalization;

namespace BandSpec.Core.Quantities;

/// <summary>
/// A difference of two temperatures in kelvin; unlike a <see cref="Temperature"/> it can be doubled and its zero means "none".
/// Range: finite, either sign. The default value is 0 K.
/// </summary>
public readonly record struct TemperatureDifference : IComparable<TemperatureDifference>
{
    private TemperatureDifference(double kelvin) => Kelvin = kelvin;

    /// <summary>The difference in kelvin.</summary>
    public double Kelvin { get; }

    /// <summary>A difference from kelvin.</summary>
    /// <exception cref="ArgumentOutOfRangeException">The number is not finite.</exception>
    public static TemperatureDifference FromKelvin(double kelvin) =>
        double.IsFinite(kelvin)
            ? new TemperatureDifference(kelvin)
            : throw new ArgumentOutOfRangeException(nameof(kelvin), kelvin, "a temperature difference is finite");

    /// <inheritdoc/>
    public int CompareTo(TemperatureDifference other) => Kelvin.CompareTo(other.Kelvin);

    /// <summary>Smaller than.</summary>
    public static bool operator <(TemperatureDifference a, TemperatureDifference b) => a.Kelvin < b.Kelvin;

    /// <summary>Larger than.</summary>
    public static bool operator >(TemperatureDifference a, TemperatureDifference b) => a.Kelvin > b.Kelvin;

    /// <summary>Smaller than or equal to.</summary>
    public static bool operator <=(TemperatureDifference a, TemperatureDifference b) => a.Kelvin <= b.Kelvin;

    /// <summary>Larger than or equal to.</summary>
    public static bool operator >=(TemperatureDifference a, TemperatureDifference b) => a.Kelvin >= b.Kelvin;

    /// <summary>The number with its unit in the invariant culture: <c>15 K</c>.</summary>
    public override string ToString() => string.Create(CultureInfo.InvariantCulture, $"{Kelvin} K");
}
