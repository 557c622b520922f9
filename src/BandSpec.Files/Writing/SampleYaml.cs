using System.Globalization;
using BandSpec.Core.Requirements;

namespace BandSpec.Files.Writing;

/// <summary>Writes the <c>sample</c> of a platform file.</summary>
internal static class SampleYaml
{
    /// <summary>Writes the whole.</summary>
    public static void Write(PlatformSample sample, YamlLines lines)
    {
        lines.Add("sample:                   # what the statistics rest on, and how uncertain they are for that");
        lines.Add(FormattableString.Invariant($"  units: {sample.Units}"));
        lines.Add(FormattableString.Invariant($"  lots: {sample.Lots}"));
        lines.Add(FormattableString.Invariant($"  readings: {sample.Readings}"));
        lines.Add("  coefficients:           # standard errors of sigma² and lot-sigma², covariances of the means: (%FS)²");
        foreach (CoefficientAccuracy c in sample.Coefficients)
        {
            string lots = c.LotVarianceError > 0 ? $", lot-variance-error: {Number(c.LotVarianceError)}" : "";
            string covariance = string.Join(", ", c.MeanCovariance.Select(Number));
            lines.Add($"    - {{ of: {c.Name}, variance-error: {Number(c.VarianceError)}{lots}, mean-covariance: [{covariance}] }}");
        }

        if (sample.PressureHysteresis is { } pressure)
            lines.Add($"  pressure-hysteresis: {Map(pressure)}");
        if (sample.ThermalHysteresis is { } thermal)
            lines.Add($"  thermal-hysteresis: {Map(thermal)}");
        if (sample.RepeatabilityVarianceError > 0)
            lines.Add($"  repeatability-variance-error: {Number(sample.RepeatabilityVarianceError)}");
        if (sample.Ageing is { } ageing)
            Write(ageing, lines);
    }

    /// <summary>Writes the accuracy of the drift.</summary>
    public static void Write(AgeingAccuracy ageing, YamlLines lines)
    {
        lines.Add("  ageing:");
        lines.Add(FormattableString.Invariant($"    units: {ageing.Units}"));
        lines.Add($"    zero: {Map(ageing.Zero)}");
        lines.Add($"    span: {Map(ageing.Span)}");
        lines.Add($"    activation-energy-error: {Number(ageing.ActivationEnergyError)} eV");
        lines.Add($"    time-exponent-error: {Number(ageing.TimeExponentError)}");
    }

    private static string Map(SpreadAccuracy accuracy) =>
        $"{{ mean-error: {Number(accuracy.MeanError.Percent)} %FS, variance-error: {Number(accuracy.VarianceError)} }}";

    /// <summary>The shortest form that reads back the same; <c>1E-05</c> is written <c>1e-05</c>, as people do.</summary>
    private static string Number(double value) => value.ToString(CultureInfo.InvariantCulture).Replace('E', 'e');
}
