using BandSpec.Core.Numerics.Dense;
using BandSpec.Core.Numerics.NestedModels;

namespace BandSpec.Core.Characterizing;

/// <summary>How one unit's coefficients deviate from its lot's, as the model predicts them from its readings.</summary>
internal sealed class UnitDeviation
{
    private UnitDeviation(double[] predicted, double[] standardised) => (Predicted, Standardised) = (predicted, standardised);

    /// <summary>The unit's predicted coefficients, <c>β + b_l + b_i</c>.</summary>
    public double[] Predicted { get; }

    /// <summary>The predicted deviations over their own standard deviations: standard normal for a unit that belongs to the family.</summary>
    public double[] Standardised { get; }

    /// <summary>
    /// Predicts a unit's deviation <c>b̂ = Σ_w(d − Pm)</c> with variance <c>Σ_w(P + PEP)Σ_w</c> when the unit took no part in the fit, and about
    /// that when it did.
    /// </summary>
    /// <param name="unit">The unit at the fit's factors.</param>
    /// <param name="lot">Its lot's predicted coefficients and their covariance relative to <c>σ²</c>.</param>
    /// <param name="fit">The fit.</param>
    public static UnitDeviation Of(UnitShare unit, (double[] Coefficients, Grid Covariance) lot, NestedFit fit)
    {
        Grid relative = fit.Within.ScaledBy(1 / fit.Point.Variance);
        double[] weighted = unit.Precision.Times(lot.Coefficients);
        for (int j = 0; j < weighted.Length; j++)
            weighted[j] = unit.Pull[j] - weighted[j];
        double[] deviation = relative.Times(weighted);
        Grid spread = unit.Precision.Copy();
        Products.AddTo(spread, 1, unit.Precision.Times(lot.Covariance).Times(unit.Precision));
        Grid scatter = relative.Times(spread).Times(relative);
        double[] standardised = new double[deviation.Length];
        double[] predicted = (double[])lot.Coefficients.Clone();
        for (int j = 0; j < deviation.Length; j++)
        {
            predicted[j] += deviation[j];
            standardised[j] = scatter[j, j] > 0 ? deviation[j] / Math.Sqrt(scatter[j, j] * fit.Point.Variance) : 0;
        }

        return new UnitDeviation(predicted, standardised);
    }

    /// <summary>The deviations of every unit of a fit, by lot.</summary>
    public static IReadOnlyList<IReadOnlyList<UnitDeviation>> All(NestedFit fit) =>
        [.. fit.Point.Lots.Select(lot =>
        {
            (double[], Grid) predicted = lot.Predict(fit.Mean, fit.Point.MeanCovariance);
            return lot.Units.Select(unit => Of(unit, predicted, fit)).ToList();
        })];
}
