using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using BandSpec.Files.Forms;

namespace BandSpec.Files.Inputs;

/// <summary>The form of <c>pressure</c> in a requirement.</summary>
internal static class PressureForm
{
    private static readonly Key<Pressure> Lower = new("lower", QuantityForms.Pressure, "Lower range value.");
    private static readonly Key<Pressure> Upper = new("upper", QuantityForms.Pressure, "Upper range value, above the lower.");

    private static readonly Key<PressureReference> Reference = new(
        "reference",
        new ChoiceForm<PressureReference>(
            ("gauge", PressureReference.Gauge), ("absolute", PressureReference.Absolute),
            ("sealed-gauge", PressureReference.SealedGauge), ("differential", PressureReference.Differential)),
        "What the pressure is measured against.");

    /// <summary>The form.</summary>
    internal static MapForm<PressureRange> Form { get; } = new("the pressure range", [Lower, Upper, Reference], Build);

    private static PressureRange Build(MapValues v)
    {
        PressureRange range = new(v.Of(Lower), v.Of(Upper), v.Of(Reference));
        // Errors written as a pressure are parts of the span, so that nothing can be read without one.
        if (range.SpanInPascals <= 0)
            v.Complain(Upper, "pressure-order", $"the upper range value {range.Upper} is not above the lower, {range.Lower}", "upper above lower");
        return range;
    }
}
