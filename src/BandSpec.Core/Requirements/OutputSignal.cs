namespace BandSpec.Core.Requirements;

/// <summary>The kind of output signal.</summary>
public enum SignalKind
{
    /// <summary>A voltage in proportion to the supply.</summary>
    RatiometricVoltage,

    /// <summary>A voltage that does not depend on the supply.</summary>
    Voltage,

    /// <summary>A loop current.</summary>
    Current,

    /// <summary>A digital code.</summary>
    Code,
}

/// <summary>
/// The output over the calibrated range, linear between its ends, in one unit. It may fall with pressure: <see cref="AtUpper"/> below
/// <see cref="AtLower"/>.
/// </summary>
/// <param name="Kind">The kind of signal.</param>
/// <param name="Unit">The unit of every number here: <c>V</c>, <c>mV</c>, <c>mA</c>, <c>µA</c> or <c>code</c>.</param>
/// <param name="AtLower">Output at the lower range value.</param>
/// <param name="AtUpper">Output at the upper range value; differs from <see cref="AtLower"/>.</param>
/// <param name="Supply">The supply a ratiometric output refers to; otherwise <see langword="null"/>.</param>
/// <param name="Step">One step of the output, above 0; <see langword="null"/> for a continuous output.</param>
/// <param name="Resolution">The resolution as it was written, such as <c>12 bit</c>; <see langword="null"/> with <see cref="Step"/>.</param>
public sealed record OutputSignal(
    SignalKind Kind, string Unit, double AtLower, double AtUpper, double? Supply, double? Step, string? Resolution)
{
    /// <summary>Output span, <see cref="AtUpper"/> minus <see cref="AtLower"/>: negative for a falling signal.</summary>
    public double Span => AtUpper - AtLower;

    /// <summary>One step in percent of span; 0 for a continuous output.</summary>
    public double StepInPercent => Step is { } step ? 100 * step / Math.Abs(Span) : 0;

    /// <summary>The nominal output at a pressure fraction, both ends met exactly.</summary>
    /// <param name="fraction">0 at the lower, 1 at the upper range value.</param>
    public double NominalAt(double fraction) => ((1 - fraction) * AtLower) + (fraction * AtUpper);
}
