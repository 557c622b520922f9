using System.Globalization;

namespace BandSpec.Core.Quantities;

/// <summary>
/// A pressure as somebody wrote it: a number and its unit, so that it is printed back in the same unit. Two pressures are equal when number
/// and unit are; compare <see cref="Pascals"/> to compare what they mean. Range: finite, either sign. The default value is 0 Pa.
/// </summary>
public readonly record struct Pressure
{
    private readonly PressureUnit? unit;

    private Pressure(double value, PressureUnit unit) => (Value, this.unit) = (value, unit);

    /// <summary>The number, in <see cref="Unit"/>.</summary>
    public double Value { get; }

    /// <summary>The unit the pressure was given in.</summary>
    public PressureUnit Unit => unit ?? PressureUnit.Pascal;

    /// <summary>The pressure in pascals.</summary>
    public double Pascals => Value * Unit.Pascals;

    /// <summary>A pressure from a number and its unit.</summary>
    /// <exception cref="ArgumentOutOfRangeException">The number is not finite.</exception>
    public static Pressure From(double value, PressureUnit unit)
    {
        ArgumentNullException.ThrowIfNull(unit);
        return double.IsFinite(value)
            ? new Pressure(value, unit)
            : throw new ArgumentOutOfRangeException(nameof(value), value, "a pressure is finite");
    }

    /// <summary>The same pressure in another unit.</summary>
    public Pressure In(PressureUnit other)
    {
        ArgumentNullException.ThrowIfNull(other);
        return other == Unit ? this : new Pressure(Pascals / other.Pascals, other);
    }

    /// <summary>The number with its unit in the invariant culture: <c>25 bar</c>.</summary>
    public override string ToString() => string.Create(CultureInfo.InvariantCulture, $"{Value} {Unit.Symbol}");
}
