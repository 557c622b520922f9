using System.Globalization;
using BandSpec.Core.Findings;

namespace BandSpec.Core.Requirements;

/// <summary>Rules of an output signal.</summary>
internal static class OutputRules
{
    /// <summary>An output with fewer steps over its span resolves nothing that an error band could be stated of.</summary>
    private const int FewestSteps = 16;

    /// <summary>Judges all of them.</summary>
    public static void Judge(OutputSignal output, FileFindings findings)
    {
        bool isSupplied = output.Kind != SignalKind.RatiometricVoltage || output.Supply is > 0;
        findings.Require(isSupplied, "output.supply", "output-supply", "no supply above zero", "the supply of a ratiometric output");
        if (!isSupplied)
            return;
        foreach ((string key, double value) in new[] { ("at-lower", output.AtLower), ("at-upper", output.AtUpper) })
        {
            findings.InRange($"output.{key}", value, AcceptedRanges.Output);
            if (output.Kind == SignalKind.RatiometricVoltage && output.Supply is { } supply)
                findings.Require(
                    value >= 0 && value <= supply, $"output.{key}", "output-supply",
                    $"{Written(value, output)} of a supply of {Written(supply, output)}", "a value between 0 and the supply");
        }
        findings.Require(
            output.Span != 0, "output.at-upper", "output-span", "the same output at both range values", "two different values");
        JudgeStep(output, findings);
    }

    private static void JudgeStep(OutputSignal output, FileFindings findings)
    {
        if (output.Step is not { } step)
            return;
        double coarsest = Math.Abs(output.Span) / FewestSteps;
        findings.Require(
            step > 0 && step <= coarsest, "output.resolution", "output-resolution",
            $"one step is {Written(step, output)} of a span of {Written(Math.Abs(output.Span), output)}",
            $"at least {FewestSteps} steps over the span: at most {Written(coarsest, output)}");
    }

    private static string Written(double value, OutputSignal output) => string.Create(CultureInfo.InvariantCulture, $"{value:0.######} {output.Unit}");
}
