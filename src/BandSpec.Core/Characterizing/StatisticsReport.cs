using BandSpec.Core.Numerics;
using BandSpec.Core.Numerics.Dense;
using BandSpec.Core.Numerics.NestedModels;
using MathNet.Numerics.Distributions;
using MathNet.Numerics.LinearAlgebra;
using MathNet.Numerics.LinearAlgebra.Factorization;

namespace BandSpec.Core.Characterizing;

/// <summary>Puts a fit into words: every estimate with its interval.</summary>
/// <remarks>
/// The mean's interval is Student's with the number of lots less one where lots scatter: however many units there are, a mean over production
/// is known from the lots. The correlation's is Fisher's (1921, Metron 1, 3-32).
/// </remarks>
internal sealed class StatisticsReport(
    MeasuredFamily family, IReadOnlyList<ReadingColumn> columns, SpreadFit spreads, CharacterizationScope scope)
{
    private readonly NestedFit fit = spreads.Fit;
    private readonly Grid meanCovariance = spreads.Fit.MeanCovariance;
    private readonly VarianceEstimates variances = VarianceEstimates.Of(
        spreads.Likelihood, spreads.Fit, spreads.FreeWithin, spreads.FreeBetween);

    /// <summary>The finished record.</summary>
    public Characterization With(
        IReadOnlyList<LeftOutTerm> leftOut, IReadOnlyList<DegreeStep> steps,
        IReadOnlyList<SuspectUnit> strangers, IReadOnlyList<SuspectReading> slips, IReadOnlyList<MeasuredUnit> leftOutUnits)
    {
        int[] coefficients = [.. Enumerable.Range(0, columns.Count).Where(j => columns[j].Kind == ColumnKind.Coefficient)];
        return new Characterization
        {
            Scope = scope,
            Units = family.Units.Count(),
            Lots = family.Lots.Count,
            Readings = family.Readings.Count(),
            Coefficients = [.. coefficients.Select(Coefficient)],
            MeanCovariance = [.. coefficients.Select((row, i) => coefficients[..(i + 1)].Select(column => meanCovariance[row, column]).ToList())],
            Correlations = [.. spreads.Correlations.Select(c => Correlation(c.Pair, c.Value))],
            PressureHysteresis = Hysteresis(ReadingColumn.PressureHysteresis),
            ThermalHysteresis = Hysteresis(ReadingColumn.ThermalHysteresis),
            Repeatability = Estimate.Of(fit.Residual, variances.Residual.SpreadInterval(scope.Confidence)),
            RepeatabilityVarianceError = variances.Residual.StandardError,
            LeftOut = family.Lots.Count > 1 ? leftOut : [.. leftOut, new LeftOutTerm("lot-sigma", "all units are of one lot")],
            DegreeSteps = steps,
            SuspectUnits = strangers,
            SuspectReadings = slips,
            Curves = Curves(coefficients),
            SuspectCurves = [.. leftOutUnits.Select(unit => OwnCurve(unit, coefficients)).OfType<UnitCurve>()],
            Deviance = fit.Deviance,
        };
    }

    private CoefficientEstimate Coefficient(int j) => new(
        columns[j].Name, Spread(j),
        Estimate.Of(
            Math.Sqrt(variances.Between[j].Variance),
            spreads.FreeBetween[j] ? variances.Between[j].SpreadInterval(scope.Confidence) : default),
        variances.Between[j].StandardError);

    private SpreadEstimate? Hysteresis(ReadingColumn column) => columns.ToList().IndexOf(column) is >= 0 and var j ? Spread(j) : null;

    private SpreadEstimate Spread(int j)
    {
        VarianceEstimate within = variances.Within[j];
        double error = Math.Sqrt(meanCovariance[j, j]);
        double freedom = spreads.FreeBetween[j] ? family.Lots.Count - 1 : Math.Max(1, within.Freedom);
        double reach = error * StudentT.InvCDF(0, 1, freedom, (1 + scope.Confidence) / 2);
        return new SpreadEstimate(
            new Estimate(fit.Mean[j], fit.Mean[j] - reach, fit.Mean[j] + reach), error,
            Estimate.Of(Math.Sqrt(within.Variance), within.SpreadInterval(scope.Confidence)), within.StandardError);
    }

    /// <summary>Fisher's <c>artanh r ± z/√(ν − 2)</c>, with the smaller of the two spreads' degrees of freedom.</summary>
    private CorrelationEstimate Correlation((int First, int Second) pair, double value)
    {
        double freedom = Math.Min(variances.Within[pair.First].Freedom, variances.Within[pair.Second].Freedom);
        double reach = NormalDistribution.Quantile((1 + scope.Confidence) / 2) / Math.Sqrt(Math.Max(0.01, freedom - 2));
        return new CorrelationEstimate(
            new CoefficientPair(columns[pair.First].Name, columns[pair.Second].Name),
            new Estimate(value, Math.Tanh(Math.Atanh(value) - reach), Math.Tanh(Math.Atanh(value) + reach)));
    }

    private List<UnitCurve> Curves(int[] coefficients)
    {
        IEnumerable<UnitDeviation> deviations = UnitDeviation.All(fit).SelectMany(lot => lot);
        return [.. family.Units.Zip(deviations, (unit, deviation) =>
        {
            Grid rows = unit.Rows(columns);
            return new UnitCurve(
                unit.Lot, unit.Name, [.. coefficients.Select(j => deviation.Predicted[j])],
                [.. unit.Readings.Select((reading, i) => new ReadingResidual(
                    reading, reading.Error.Percent - Vectors.Dot(rows.Row(i)[..columns.Count], deviation.Predicted)))]);
        })];
    }

    /// <summary>A unit's curve by least squares; null when its readings do not determine every term.</summary>
    private UnitCurve? OwnCurve(MeasuredUnit unit, int[] coefficients)
    {
        Grid rows = unit.Rows(columns);
        Svd<double> parts = Matrix<double>.Build.Dense(rows.Rows, columns.Count, (i, j) => rows[i, j]).Svd();
        if (parts.Rank < columns.Count)
            return null;
        Vector<double> own = parts.Solve(Vector<double>.Build.Dense(rows.Rows, i => rows[i, columns.Count]));
        return new UnitCurve(
            unit.Lot, unit.Name, [.. coefficients.Select(j => own[j])],
            [.. unit.Readings.Select((reading, i) => new ReadingResidual(
                reading, reading.Error.Percent - Vectors.Dot(rows.Row(i)[..columns.Count], own.AsArray())))]);
    }
}
