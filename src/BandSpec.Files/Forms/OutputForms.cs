namespace BandSpec.Files.Forms;

/// <summary>A value of the output signal as it was written.</summary>
/// <param name="Number">The number.</param>
/// <param name="Unit">Its unit: <c>V</c>, <c>mV</c>, <c>mA</c>, <c>µA</c> or <c>code</c>; of a resolution also <c>bit</c>.</param>
internal readonly record struct OutputValue(double Number, string Unit)
{
    private static readonly (string Symbol, string Base, double Factor)[] Scales =
        [("V", "V", 1), ("mV", "V", 1e-3), ("mA", "mA", 1), ("µA", "mA", 1e-3), ("code", "code", 1)];

    /// <summary>The unit in which values of the same kind can be compared: <c>V</c>, <c>mA</c> or <c>code</c>.</summary>
    internal string Base => ScaleOf(Unit).Base;

    /// <summary>The number in another unit of the same base, without a trace of the conversion's rounding.</summary>
    internal double In(string unit) => unit == Unit ? Number : Math.Round(Number * ScaleOf(Unit).Factor / ScaleOf(unit).Factor, 12);

    private static (string Symbol, string Base, double Factor) ScaleOf(string unit) =>
        Scales.FirstOrDefault(scale => scale.Symbol == unit, (unit, unit, 1));
}

/// <summary>The forms of output values and of the output's resolution.</summary>
internal static class OutputForms
{
    private static readonly Unit<OutputValue>[] Units = [UnitOf("V"), UnitOf("mV"), UnitOf("mA"), UnitOf("µA", "μA", "uA"), UnitOf("code", "counts")];

    /// <summary>A value of the output.</summary>
    internal static QuantityForm<OutputValue> Value { get; } = new("an output value", "any number", "4.5 V", Units);

    /// <summary>A supply voltage.</summary>
    internal static QuantityForm<OutputValue> Supply { get; } = new("a voltage", "any number", "5 V", UnitOf("V"), UnitOf("mV"));

    /// <summary>A resolution: bits, or one step in the output's unit.</summary>
    internal static QuantityForm<OutputValue> Resolution { get; } = new("a resolution", "any number", "12 bit", [UnitOf("bit"), .. Units]);

    /// <summary>A number of codes.</summary>
    internal static QuantityForm<OutputValue> Codes { get; } = new("a number of codes", "any number", "65536 code", UnitOf("code", "counts"));

    private static Unit<OutputValue> UnitOf(string symbol, params string[] aliases) => new(symbol, Maker(symbol), aliases);

    private static MakeQuantity<OutputValue> Maker(string symbol) => (double number, Reading _, out OutputValue value) =>
    {
        value = new OutputValue(number, symbol);
        return true;
    };
}
