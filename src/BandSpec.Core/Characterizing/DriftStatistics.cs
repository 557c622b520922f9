using BandSpec.Core.Numerics.NestedModels;
using MathNet.Numerics.Distributions;

namespace BandSpec.Core.Characterizing;

/// <summary>From the readings of an ageing test to its statistics, the story in one place.</summary>
internal sealed class DriftStatistics
{
    private readonly IReadOnlyList<StoredUnit> units;
    private readonly AgeingScope scope;
    private readonly DriftSupport support;
    private readonly DriftLikelihood likelihood;
    private readonly DriftLaw law;
    private readonly NestedFit fit;
    private readonly VarianceEstimates variances;
    private readonly DriftAccuracy accuracy;

    public DriftStatistics(IReadOnlyList<StoredUnit> units, AgeingScope scope, bool isEnergyOpen)
    {
        (this.units, this.scope) = (units, scope);
        support = new DriftSupport(units, scope, isEnergyOpen);
        likelihood = new DriftLikelihood(units, scope, support);
        law = likelihood.MostLikely();
        (NestedLikelihood restricted, fit) = likelihood.Fit(law, restricted: true);
        variances = VarianceEstimates.Of(restricted, fit, [true, true], [false, false]);
        accuracy = new DriftAccuracy(
            new DriftInformation(law, (fit.Mean[0], fit.Mean[1]), (fit.Within[0, 0], fit.Within[1, 1], fit.Point.Variance)), support, units);
    }

    public AgeingStatistics Estimate()
    {
        DriftErrors now = accuracy.Now();
        DriftRegion region = new(likelihood, support, law, accuracy.FigureCovariance(), units.Count, scope.Confidence);
        return new AgeingStatistics
        {
            Scope = scope,
            Units = units.Count,
            Readings = units.Sum(unit => unit.Readings.Count),
            Zero = Spread(0, now.ZeroMean),
            Span = Spread(1, now.SpanMean),
            ActivationEnergy = region.Interval(DriftFigure.Energy),
            TimeExponent = region.Interval(DriftFigure.Exponent),
            Region = region.Edge(),
            Repeatability = Characterizing.Estimate.Of(fit.Residual, variances.Residual.SpreadInterval(scope.Confidence)),
            LeftOut = [.. support.Assumed()],
            Errors = now,
            ErrorsWithPlannedTest = scope.PlannedTest is { } planned ? accuracy.With(planned) : null,
            Drifts = [.. units.SelectMany(Drifts)],
        };
    }

    /// <summary>The mean's standard error includes that of energy and exponent; its interval is Student's with the units less one.</summary>
    private SpreadEstimate Spread(int j, double error)
    {
        double reach = error * StudentT.InvCDF(0, 1, units.Count - 1, (1 + scope.Confidence) / 2);
        VarianceEstimate variance = variances.Within[j];
        return new SpreadEstimate(
            new Estimate(fit.Mean[j], fit.Mean[j] - reach, fit.Mean[j] + reach), error,
            Characterizing.Estimate.Of(Math.Sqrt(variance.Variance), variance.SpreadInterval(scope.Confidence)), variance.StandardError);
    }

    private static IEnumerable<UnitDrift> Drifts(StoredUnit unit) =>
        from atPressure in unit.Readings.GroupBy(r => Math.Round(r.PressureFraction, 2))
        let start = atPressure.Where(r => r.Stored.Hours == 0).ToList()
        where start.Count > 0
        from atTime in atPressure.Where(r => r.Stored.Hours > 0).GroupBy(r => r.Stored)
        select new UnitDrift(
            unit.Name, atTime.First().Storage, atTime.Key, atPressure.Key,
            atTime.Average(r => r.Error.Percent) - start.Average(r => r.Error.Percent));
}
