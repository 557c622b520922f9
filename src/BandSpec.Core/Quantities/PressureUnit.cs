namespace BandSpec.Core.Quantities;

/// <summary>
/// A unit of pressure: its symbol and how many pascals it is. The list <see cref="All"/> is closed; equality is that of the symbol.
/// Factors: NIST SP 811 (2008) appendix B.8; the pound-force per square inch from its exact definition
/// (0.453 592 37 kg × 9.806 65 m/s² over 0.0254² m²), mercury and water columns by their conventional densities.
/// </summary>
public sealed record PressureUnit
{
    private PressureUnit(string symbol, double pascals) => (Symbol, Pascals) = (symbol, pascals);

    /// <summary>Pascal.</summary>
    public static PressureUnit Pascal { get; } = new("Pa", 1);

    /// <summary>Hectopascal, 100 Pa.</summary>
    public static PressureUnit Hectopascal { get; } = new("hPa", 1e2);

    /// <summary>Kilopascal, 1000 Pa.</summary>
    public static PressureUnit Kilopascal { get; } = new("kPa", 1e3);

    /// <summary>Megapascal, 10⁶ Pa.</summary>
    public static PressureUnit Megapascal { get; } = new("MPa", 1e6);

    /// <summary>Millibar, 100 Pa.</summary>
    public static PressureUnit Millibar { get; } = new("mbar", 1e2);

    /// <summary>Bar, 10⁵ Pa.</summary>
    public static PressureUnit Bar { get; } = new("bar", 1e5);

    /// <summary>Pound-force per square inch, 6894.757 Pa.</summary>
    public static PressureUnit Psi { get; } = new("psi", 0.45359237 * 9.80665 / (0.0254 * 0.0254));

    /// <summary>Conventional millimetre of mercury, 133.3224 Pa (13 595.1 kg/m³ × 9.806 65 m/s² × 1 mm).</summary>
    public static PressureUnit MillimetreOfMercury { get; } = new("mmHg", 13595.1 * 9.80665 * 1e-3);

    /// <summary>Conventional inch of water, 249.0889 Pa (1000 kg/m³ × 9.806 65 m/s² × 25.4 mm).</summary>
    public static PressureUnit InchOfWater { get; } = new("inH2O", 1000 * 9.80665 * 0.0254);

    /// <summary>Conventional millimetre of water, 9.806 65 Pa.</summary>
    public static PressureUnit MillimetreOfWater { get; } = new("mmH2O", 9.80665);

    /// <summary>Every accepted unit, in the order in which messages list them.</summary>
    public static IReadOnlyList<PressureUnit> All { get; } =
        [Pascal, Hectopascal, Kilopascal, Megapascal, Millibar, Bar, Psi, MillimetreOfMercury, InchOfWater, MillimetreOfWater];

    /// <summary>The symbol as it is written in files, such as <c>bar</c>.</summary>
    public string Symbol { get; }

    /// <summary>How many pascals one unit is.</summary>
    public double Pascals { get; }

    /// <summary>The symbol.</summary>
    public override string ToString() => Symbol;
}
