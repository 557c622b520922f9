using BandSpec.Core.Findings;

namespace BandSpec.Core.Requirements;

/// <summary>Rules that a platform has to follow whatever the requirement.</summary>
internal static class PlatformRules
{
    /// <summary>Judges all of them.</summary>
    public static void Judge(PlatformParts platform, FileFindings findings)
    {
        findings.FitsLine("platform.name", platform.Name);
        findings.FitsLine("platform.revision", platform.Revision, 40);
        if (platform.Temperature is { } range)
            findings.IsRange("temperature", range);
        if (platform.Pressure is { } rating)
            JudgePressure(rating, findings);
        if (platform.RawError is { } coefficients)
        {
            JudgeCoefficients(coefficients, findings);
            CorrelationRules.Judge(coefficients, platform.Correlations ?? [], findings);
        }
        findings.InRange("correction.zero-degree", platform.ZeroDegree, AcceptedRanges.CorrectionDegree);
        findings.InRange("correction.span-degree", platform.SpanDegree, AcceptedRanges.CorrectionDegree);
        findings.InRange("pressure-hysteresis", platform.PressureHysteresis, AcceptedRanges.Spread);
        findings.InRange("thermal-hysteresis", platform.ThermalHysteresis, AcceptedRanges.Spread);
        findings.InRange("repeatability", platform.Repeatability, AcceptedRanges.Spread);
        if (platform.Ageing is { } ageing)
            JudgeAgeing(ageing, findings);
        if (platform.Sample is { } sample)
            PlatformSampleRules.Judge(sample, platform.RawError, findings);
    }

    private static void JudgePressure(PressureRating rating, FileFindings findings)
    {
        foreach ((string key, Quantities.Pressure pressure) in new[] { ("smallest-span", rating.SmallestSpan), ("largest-upper", rating.LargestUpper) })
        {
            findings.InRange($"pressure.{key}", pressure);
            findings.Require(pressure.Pascals > 0, $"pressure.{key}", "pressure-rating", pressure.ToString(), "a pressure above 0");
        }
        findings.InRange("pressure.proof-factor", rating.ProofFactor, AcceptedRanges.PressureFactor);
        findings.InRange("pressure.burst-factor", rating.BurstFactor, AcceptedRanges.PressureFactor);
        findings.Require(
            rating.BurstFactor >= rating.ProofFactor, "pressure.burst-factor", "pressure-rating", "the burst pressure is below the proof pressure",
            "a burst factor that is not below the proof factor");
    }

    private static void JudgeCoefficients(IReadOnlyList<RawErrorCoefficient> coefficients, FileFindings findings)
    {
        findings.Require(
            coefficients.Count > 0, "raw-error", "coefficient-none", "no coefficient at all", "at least one coefficient of zero, span, bow or s-shape");
        Dictionary<PressureShape, int> counts = [];
        HashSet<CoefficientName> names = [];
        foreach (RawErrorCoefficient coefficient in coefficients)
        {
            CoefficientName name = coefficient.Name;
            int index = counts[name.Shape] = counts.GetValueOrDefault(name.Shape, -1) + 1;
            string path = $"raw-error.{name.Word}[{index}]";
            findings.InRange($"{path}.degree", name.Degree, AcceptedRanges.CoefficientDegree);
            findings.Require(names.Add(name), $"{path}.degree", "coefficient-twice", $"{name} a second time", "each degree of a shape once");
            findings.InRange($"{path}.mean", coefficient.Mean, AcceptedRanges.Mean);
            findings.InRange($"{path}.sigma", coefficient.Sigma, AcceptedRanges.Spread);
            findings.InRange($"{path}.lot-sigma", coefficient.LotSigma, AcceptedRanges.Spread);
        }
    }

    private static void JudgeAgeing(Ageing ageing, FileFindings findings)
    {
        findings.InRange("ageing.zero", ageing.Zero, AcceptedRanges.Mean);
        findings.InRange("ageing.span", ageing.Span, AcceptedRanges.Mean);
        findings.InRange("ageing.test.temperature", ageing.TestTemperature, AcceptedRanges.AgeingTemperature);
        findings.InRange("ageing.test.duration", ageing.TestDuration.Hours, AcceptedRanges.AgeingTest);
        findings.InRange("ageing.activation-energy", ageing.ActivationEnergy, AcceptedRanges.ActivationEnergy);
        findings.InRange("ageing.time-exponent", ageing.TimeExponent, AcceptedRanges.TimeExponent);
    }
}
