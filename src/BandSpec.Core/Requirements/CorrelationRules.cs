using System.Globalization;
using BandSpec.Core.Findings;
using BandSpec.Core.Numerics;

namespace BandSpec.Core.Requirements;

/// <summary>Rules of the correlations between coefficients: each a possible one, and all together those of some population.</summary>
internal static class CorrelationRules
{
    /// <summary>Judges all of them.</summary>
    public static void Judge(
        IReadOnlyList<RawErrorCoefficient> coefficients, IReadOnlyList<CoefficientCorrelation> correlations, FileFindings findings)
    {
        CoefficientName[] names = [.. coefficients.Select(coefficient => coefficient.Name).Distinct()];
        HashSet<(CoefficientName, CoefficientName)> pairs = [];
        bool isMatrix = true;
        for (int i = 0; i < correlations.Count; i++)
            isMatrix &= JudgePair(correlations[i], names, pairs, $"raw-error.correlations[{i}]", findings);
        if (isMatrix && correlations.Count > 0)
            JudgeMatrix(correlations, names, findings);
    }

    private static bool JudgePair(
        CoefficientCorrelation pair, CoefficientName[] names, HashSet<(CoefficientName, CoefficientName)> pairs, string path, FileFindings findings)
    {
        (CoefficientName first, CoefficientName second) = (pair.First, pair.Second);
        foreach ((CoefficientName name, int index) in new[] { (first, 0), (second, 1) }.Where(named => !names.Contains(named.Item1)))
            findings.Add(
                $"{path}.between[{index}]", "correlation-unknown", $"there is no coefficient {name}", string.Join(", ", names),
                Spelling.Nearest(name.ToString(), names.Select(known => known.ToString())));
        bool isOther = first != second && pairs.Add((first, second)) && pairs.Add((second, first));
        findings.Require(
            isOther, $"{path}.between", "correlation-twice",
            first == second ? $"{first} with itself" : $"{first} with {second} a second time", "each pair of two coefficients once");
        findings.InRange($"{path}.value", pair.Value, AcceptedRanges.Correlation);
        return isOther && names.Contains(first) && names.Contains(second) && AcceptedRanges.Correlation.Holds(pair.Value);
    }

    private static void JudgeMatrix(IReadOnlyList<CoefficientCorrelation> correlations, CoefficientName[] names, FileFindings findings)
    {
        int n = names.Length;
        double[,] matrix = new double[n, n];
        for (int i = 0; i < n; i++)
            matrix[i, i] = 1;
        foreach (CoefficientCorrelation pair in correlations)
        {
            (int i, int j) = (Array.IndexOf(names, pair.First), Array.IndexOf(names, pair.Second));
            matrix[i, j] = matrix[j, i] = pair.Value;
        }
        double smallest = Eigenvalues.SmallestOf(matrix);
        findings.Require(
            smallest >= -Eigenvalues.Rounding * n, "raw-error.correlations", "correlation-impossible",
            string.Create(CultureInfo.InvariantCulture, $"no population has these correlations together: smallest eigenvalue {smallest:0.####}"),
            "correlations whose matrix has no eigenvalue below 0");
    }
}
