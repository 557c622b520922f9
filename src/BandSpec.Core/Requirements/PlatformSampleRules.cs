using BandSpec.Core.Findings;

namespace BandSpec.Core.Requirements;

/// <summary>Rules of what a platform says about its sample: it has to be about the coefficients that are there.</summary>
internal static class PlatformSampleRules
{
    /// <summary>Judges all of them.</summary>
    /// <param name="sample">The sample.</param>
    /// <param name="coefficients">The raw error's coefficients, if they could be read.</param>
    /// <param name="findings">Where findings go.</param>
    public static void Judge(PlatformSample sample, IReadOnlyList<RawErrorCoefficient>? coefficients, FileFindings findings)
    {
        findings.Require(
            sample.Lots <= sample.Units, "sample.lots", "sample-lots", $"{sample.Lots} lots of {sample.Units} units", "no more lots than units");
        for (int i = 0; i < sample.Coefficients.Count; i++)
            JudgeCoefficient(sample.Coefficients[i], i, findings);
        if (coefficients is not null)
            JudgeNames(sample, [.. coefficients.Select(c => c.Name)], findings);
    }

    private static void JudgeCoefficient(CoefficientAccuracy accuracy, int index, FileFindings findings)
    {
        string path = $"sample.coefficients[{index}]";
        findings.InRange($"{path}.variance-error", accuracy.VarianceError, AcceptedRanges.VarianceError);
        findings.InRange($"{path}.lot-variance-error", accuracy.LotVarianceError, AcceptedRanges.VarianceError);
        findings.Require(
            accuracy.MeanCovariance.Count == index + 1, $"{path}.mean-covariance", "sample-covariance",
            $"{accuracy.MeanCovariance.Count} numbers for coefficient {index + 1} of the list",
            $"{index + 1}: one for each coefficient listed before it, and last its own variance");
        findings.Require(
            accuracy.MeanCovariance.Count == 0 || accuracy.MeanCovariance[^1] >= 0, $"{path}.mean-covariance", "sample-covariance",
            "the last number, the mean's own variance, is negative", "a variance of 0 or more");
    }

    private static void JudgeNames(PlatformSample sample, CoefficientName[] names, FileFindings findings)
    {
        CoefficientName[] listed = [.. sample.Coefficients.Select(c => c.Name)];
        foreach (CoefficientName missing in names.Except(listed))
            findings.Add("sample.coefficients", "sample-missing", $"{missing} is not listed", "the accuracy of each coefficient of raw-error");
        for (int i = 0; i < listed.Length; i++)
        {
            findings.Require(
                names.Contains(listed[i]), $"sample.coefficients[{i}].of", "sample-unknown", $"there is no coefficient {listed[i]}",
                string.Join(", ", names));
            findings.Require(
                Array.IndexOf(listed, listed[i]) == i, $"sample.coefficients[{i}].of", "sample-twice", $"{listed[i]} a second time",
                "each coefficient once");
        }
    }
}
