using BandSpec.Core.Quantities;

namespace BandSpec.Core.Requirements;

/// <summary>What a pressure is measured against (IEC 61298-1 calls it the kind of pressure).</summary>
public enum PressureReference
{
    /// <summary>Against the atmosphere at the time.</summary>
    Gauge,

    /// <summary>Against vacuum.</summary>
    Absolute,

    /// <summary>Against a fixed pressure sealed into the unit.</summary>
    SealedGauge,

    /// <summary>Between two ports.</summary>
    Differential,
}

/// <summary>The calibrated range, from lower to upper range value; both in the unit the customer wrote.</summary>
/// <param name="Lower">Lower range value.</param>
/// <param name="Upper">Upper range value, above the lower.</param>
/// <param name="Reference">What the pressure is measured against.</param>
public sealed record PressureRange(Pressure Lower, Pressure Upper, PressureReference Reference)
{
    /// <summary>Upper minus lower range value, in pascals.</summary>
    public double SpanInPascals => Upper.Pascals - Lower.Pascals;

    /// <summary>The pressure at a fraction of the span, in the unit of the upper range value.</summary>
    /// <param name="fraction">0 at the lower, 1 at the upper range value; both ends are met exactly.</param>
    public Pressure At(double fraction)
    {
        Pressure lower = Lower.In(Upper.Unit);
        return Pressure.From(((1 - fraction) * lower.Value) + (fraction * Upper.Value), Upper.Unit);
    }

    /// <summary>A pressure as a part of the span: <c>|p| / (upper − lower)</c>, used by errors given in percent of reading.</summary>
    /// <param name="fraction">The pressure fraction.</param>
    public double MagnitudeAt(double fraction) => Math.Abs(At(fraction).Pascals) / SpanInPascals;
}
