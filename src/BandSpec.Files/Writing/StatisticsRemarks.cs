using System.Globalization;
using BandSpec.Core.Characterizing;

namespace BandSpec.Files.Writing;

/// <summary>What a platform file says beside its figures about the sample behind them.</summary>
public static class StatisticsRemarks
{
    /// <summary>The remarks of a characterization.</summary>
    /// <param name="statistics">The characterization.</param>
    /// <param name="files">The names of the files of readings.</param>
    public static Dictionary<string, IReadOnlyList<string>> Of(Characterization statistics, IReadOnlyList<string> files)
    {
        ArgumentNullException.ThrowIfNull(statistics);
        string lots = statistics.Lots == 1 ? "1 lot" : $"{statistics.Lots} lots";
        Dictionary<string, IReadOnlyList<string>> remarks = new()
        {
            ["file"] =
            [
                $"Statistics of {statistics.Units} units of {lots}, {statistics.Readings} readings in {string.Join(", ", files)}.",
                $"Remarks are {100 * statistics.Scope.Confidence:0.#} % intervals of the figures.",
                .. Excluded(statistics),
                .. LeftOutTerm.Grouped(statistics.LeftOut).Select(term => $"Left out {term.Term}: {term.Reason}."),
            ],
            ["repeatability"] = [$"{Range(statistics.Repeatability)}, reading instrument included"],
        };
        foreach (CoefficientEstimate c in statistics.Coefficients)
            remarks[c.Name.ToString()] = [Coefficient(c)];
        foreach (CorrelationEstimate c in statistics.Correlations)
            remarks[$"{c.Pair.First} {c.Pair.Second}"] = [Range(c.Value)];
        remarks["pressure-hysteresis"] = [Hysteresis(statistics.PressureHysteresis, "full width")];
        remarks["thermal-hysteresis"] = [Hysteresis(statistics.ThermalHysteresis, "half width")];
        return remarks;
    }

    /// <summary>The remarks of an ageing test, for the keys below <c>ageing</c>.</summary>
    /// <param name="statistics">The ageing statistics.</param>
    /// <param name="files">The names of the files of readings.</param>
    public static Dictionary<string, IReadOnlyList<string>> Of(AgeingStatistics statistics, IReadOnlyList<string> files)
    {
        ArgumentNullException.ThrowIfNull(statistics);
        return new()
        {
            ["ageing"] =
            [
                $"Drift of {statistics.Units} units, {statistics.Readings} readings in {string.Join(", ", files)}.",
                .. statistics.LeftOut.Select(term => $"{term.Term}: {term.Reason}."),
            ],
            ["ageing.zero"] = [Spread(statistics.Zero)],
            ["ageing.span"] = [Spread(statistics.Span)],
            ["ageing.activation-energy"] = [Assumable(statistics.ActivationEnergy)],
            ["ageing.time-exponent"] = [Assumable(statistics.TimeExponent)],
        };
    }

    private static IEnumerable<string> Excluded(Characterization statistics)
    {
        string kept = statistics.Scope.KeepSuspects ? "kept" : "left out";
        if (statistics.Scope.ExcludedUnits.Count > 0)
            yield return $"Left out by name: {string.Join(", ", statistics.Scope.ExcludedUnits)}.";
        foreach (SuspectUnit unit in statistics.SuspectUnits)
            yield return $"Unit {unit.Unit} is suspect and {kept}: {unit.Term} is off by {Figure(unit.Multiple)} standard deviations.";
        if (statistics.SuspectReadings.Count > 0)
            yield return $"{statistics.SuspectReadings.Count} single readings are suspect and {kept}.";
    }

    private static string Coefficient(CoefficientEstimate c)
    {
        string lots = double.IsFinite(c.LotSigma.Upper) && c.LotSigma.Upper > 0 ? $", lot-sigma {Range(c.LotSigma)}" : "";
        return $"{Spread(c.Units)}{lots}";
    }

    private static string Hysteresis(SpreadEstimate? estimate, string width) =>
        estimate is null ? $"{width}; not measured" : $"{width}; {Spread(estimate)}";

    private static string Spread(SpreadEstimate estimate) => $"mean {Range(estimate.Mean)}, sigma {Range(estimate.Sigma)}";

    private static string Assumable(Estimate estimate) => estimate.Lower == estimate.Upper ? "assumed" : Range(estimate);

    private static string Range(Estimate estimate) =>
        double.IsFinite(estimate.Upper) ? $"{Figure(estimate.Lower)} to {Figure(estimate.Upper)}" : $"{Figure(estimate.Lower)} and up";

    /// <summary>Two significant digits: an interval's end is not known better.</summary>
    private static string Figure(double value)
    {
        int decimals = value == 0 ? 0 : Math.Clamp(1 - (int)Math.Floor(Math.Log10(Math.Abs(value))), 0, 9);
        return (Math.Round(value, decimals) + 0.0).ToString(CultureInfo.InvariantCulture);
    }
}
