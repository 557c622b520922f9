using BandSpec.Core.Requirements;

namespace BandSpec.Files.Writing;

/// <summary>
/// Writes a platform file as a person would: one line a coefficient, units in the text, and beside each figure what it rests on. Reading the
/// file back gives the same platform.
/// </summary>
public static class PlatformYaml
{
    /// <summary>The file's text.</summary>
    /// <param name="platform">The platform.</param>
    /// <param name="remarks">What is said beside the figures, by key: <c>zero.1</c>, <c>pressure-hysteresis</c>, and <c>file</c> for the top.</param>
    public static string Write(Platform platform, IReadOnlyDictionary<string, IReadOnlyList<string>> remarks)
    {
        ArgumentNullException.ThrowIfNull(platform);
        ArgumentNullException.ThrowIfNull(remarks);
        YamlLines lines = new(remarks);
        lines.Above("file");
        lines.Add($"platform: {{ name: {YamlLines.Text(platform.Name)}, revision: {YamlLines.Text(platform.Revision)} }}", "platform");
        OperatingTemperature range = platform.Temperature;
        lines.Add($"temperature: {{ lower: {range.Lower}, upper: {range.Upper}, reference: {range.Reference} }}", "temperature");
        PressureRating rating = platform.Pressure;
        lines.Add(
            $"pressure: {{ smallest-span: {rating.SmallestSpan}, largest-upper: {rating.LargestUpper}, "
            + FormattableString.Invariant($"proof-factor: {rating.ProofFactor}, burst-factor: {rating.BurstFactor} }}"), "pressure");
        RawError(platform, lines);
        lines.Add(FormattableString.Invariant($"correction: {{ zero-degree: {platform.ZeroDegree}, span-degree: {platform.SpanDegree} }}"), "correction");
        lines.Add($"pressure-hysteresis: {Map(platform.PressureHysteresis)}", "pressure-hysteresis");
        lines.Add($"thermal-hysteresis: {Map(platform.ThermalHysteresis)}", "thermal-hysteresis");
        lines.Add($"repeatability: {platform.Repeatability}", "repeatability");
        AgeingLines(platform.Ageing, lines);
        if (platform.Sample is { } sample)
            SampleYaml.Write(sample, lines);
        return lines.ToString();
    }

    private static void RawError(Platform platform, YamlLines lines)
    {
        lines.Add("raw-error:                # coefficients of ψ_j τ^k in %FS, τ = (T − reference)/100 K");
        foreach (IGrouping<string, RawErrorCoefficient> shape in platform.RawError.GroupBy(c => c.Name.Word))
        {
            lines.Add($"  {shape.Key}:");
            foreach (RawErrorCoefficient c in shape)
            {
                string lots = c.LotSigma > 0 ? FormattableString.Invariant($", lot-sigma: {c.LotSigma}") : "";
                lines.Add(
                    FormattableString.Invariant($"    - {{ degree: {c.Name.Degree}, mean: {c.Mean}, sigma: {c.Sigma}{lots} }}"), c.Name.ToString());
            }
        }

        if (platform.Correlations.Count > 0)
            lines.Add("  correlations:");
        foreach (CoefficientCorrelation c in platform.Correlations)
            lines.Add(
                FormattableString.Invariant($"    - {{ between: [{c.First}, {c.Second}], value: {c.Value} }}"), $"{c.First} {c.Second}");
    }

    /// <summary>Writes the <c>ageing</c> with what is said above and beside it.</summary>
    internal static void AgeingLines(Ageing ageing, YamlLines lines)
    {
        lines.Above("ageing");
        lines.Add("ageing:");
        lines.Add($"  zero: {Map(ageing.Zero)}", "ageing.zero");
        lines.Add($"  span: {Map(ageing.Span)}", "ageing.span");
        lines.Add($"  test: {{ temperature: {ageing.TestTemperature}, duration: {ageing.TestDuration} }}", "ageing.test");
        lines.Add(FormattableString.Invariant($"  activation-energy: {ageing.ActivationEnergy} eV"), "ageing.activation-energy");
        lines.Add(FormattableString.Invariant($"  time-exponent: {ageing.TimeExponent}"), "ageing.time-exponent");
    }

    private static string Map(Spread spread) => $"{{ mean: {spread.Mean}, sigma: {spread.Sigma} }}";
}
