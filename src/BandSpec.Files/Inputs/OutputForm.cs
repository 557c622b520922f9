using BandSpec.Core.Requirements;
using BandSpec.Files.Forms;

namespace BandSpec.Files.Inputs;

/// <summary>The form of <c>output</c> in a requirement.</summary>
internal static class OutputForm
{
    private static readonly Key<SignalKind> Signal = new(
        "signal",
        new ChoiceForm<SignalKind>(
            ("ratiometric-voltage", SignalKind.RatiometricVoltage), ("voltage", SignalKind.Voltage),
            ("current", SignalKind.Current), ("code", SignalKind.Code)),
        "Kind of signal.");

    private static readonly Key<OutputValue> AtLower = new("at-lower", OutputForms.Value, "Output at the lower range value.");
    private static readonly Key<OutputValue> AtUpper = new(
        "at-upper", OutputForms.Value, "Output at the upper range value; its unit is that of the test limits.");
    private static readonly Key<OutputValue> Supply = Key.Optional<OutputValue>(
        "supply", OutputForms.Supply, "Supply voltage; needed for a ratiometric output.");

    private static readonly Key<OutputValue> Resolution = Key.Optional<OutputValue>(
        "resolution", OutputForms.Resolution,
        "Bits (of the supply when ratiometric, of full-code for a code, of the span otherwise) or one step in the output's unit.");

    private static readonly Key<OutputValue> FullCode = Key.Optional<OutputValue>(
        "full-code", OutputForms.Codes, "Number of codes that the resolution in bits divides; for code outputs.");

    /// <summary>The form.</summary>
    internal static MapForm<OutputSignal> Form { get; } = new(
        "the output signal", [Signal, AtLower, AtUpper, Supply, Resolution, FullCode], Build);

    private static OutputSignal Build(MapValues v)
    {
        SignalKind kind = v.Of(Signal);
        string unit = v.Of(AtUpper).Unit;
        string expected = kind switch { SignalKind.Current => "mA", SignalKind.Code => "code", _ => "V" };
        foreach (Key<OutputValue> key in new[] { AtLower, AtUpper }.Where(key => v.Of(key).Base != expected))
            v.Complain(key, "output-unit", $"a value in {v.Of(key).Unit} for this signal", kind switch
            {
                SignalKind.Current => "units: mA, µA", SignalKind.Code => "unit: code", _ => "units: V, mV",
            });
        CheckKeys(v, kind);
        string? written = v.Has(Resolution) ? FormattableString.Invariant($"{v.Of(Resolution).Number} {v.Of(Resolution).Unit}") : null;
        double? supply = v.Has(Supply) ? v.Of(Supply).In(unit) : null;
        return new OutputSignal(kind, unit, v.Of(AtLower).In(unit), v.Of(AtUpper).Number, supply, StepOf(v, unit), written);
    }

    private static void CheckKeys(MapValues v, SignalKind kind)
    {
        bool isRatiometric = kind == SignalKind.RatiometricVoltage;
        if (v.Has(Supply) != isRatiometric)
            v.Complain(
                Supply, "output-supply",
                isRatiometric ? "a ratiometric output without its supply" : "a supply for an output that does not depend on it",
                isRatiometric ? "`supply`, such as `5 V`" : "leave `supply` out");
        bool needsFullCode = kind == SignalKind.Code && v.Has(Resolution) && v.Of(Resolution).Unit == "bit";
        if (v.Has(FullCode) != needsFullCode)
            v.Complain(
                FullCode, "output-full-code",
                needsFullCode ? "a resolution in bits without the number of codes" : "a number of codes without a resolution in bits of a code",
                needsFullCode ? "`full-code`, such as `65536 code`" : "leave `full-code` out");
    }

    /// <summary>One step in the output's unit; null for a continuous output, or after a complaint.</summary>
    private static double? StepOf(MapValues v, string unit)
    {
        if (!v.Has(Resolution))
            return null;
        OutputValue resolution = v.Of(Resolution);
        if (resolution.Unit == "bit")
            return StepOfBits(v, resolution.Number, unit);
        if (resolution.Base == v.Of(AtUpper).Base)
            return resolution.In(unit);
        v.Complain(Resolution, "output-unit", $"a step in {resolution.Unit} of an output in {unit}", $"bits, or a step in {unit}");
        return null;
    }

    private static double? StepOfBits(MapValues v, double bits, string unit)
    {
        if (!AcceptedRanges.Bits.Holds(bits) || bits != Math.Floor(bits))
        {
            v.Complain(Resolution, "out-of-range", FormattableString.Invariant($"{bits} bit"), $"whole bits, {AcceptedRanges.Bits}");
            return null;
        }
        double whole = v.Of(Signal) switch
        {
            SignalKind.RatiometricVoltage => v.Has(Supply) ? v.Of(Supply).In(unit) : 0,
            SignalKind.Code => v.Has(FullCode) ? v.Of(FullCode).Number : 0,
            _ => Math.Abs(v.Of(AtUpper).Number - v.Of(AtLower).In(unit)),
        };
        return whole / Math.Pow(2, bits);
    }
}
