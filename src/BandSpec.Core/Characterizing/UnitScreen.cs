using BandSpec.Core.Numerics;
using BandSpec.Core.Numerics.Dense;
using BandSpec.Core.Numerics.NestedModels;
using MathNet.Numerics.Distributions;
using MathNet.Numerics.Statistics;

namespace BandSpec.Core.Characterizing;

/// <summary>A unit that the rest of its family contradicts.</summary>
/// <param name="Lot">Its lot.</param>
/// <param name="Unit">Its name.</param>
/// <param name="Term">The term in which it stands out most, as in files; <c>repeatability</c> when its readings scatter.</param>
/// <param name="Multiple">How far: multiples of the standard deviation that the other units have; for scatter, of their repeatability.</param>
/// <param name="SpreadWithout">The term's standard deviation within a lot without the unit, %FS.</param>
/// <param name="SpreadWith">The same with it.</param>
public sealed record SuspectUnit(string Lot, string Unit, string Term, double Multiple, double SpreadWithout, double SpreadWith);

/// <summary>
/// Finds units that do not belong: a candidate stands out against the median absolute deviation of all units, which spoiled units cannot
/// lift; it is confirmed when the family fitted without it leaves it beyond the limit. One after the other, so that two spoiled units do not
/// hide each other. The level is 1 % for all units and terms together; at most a tenth of the units.
/// </summary>
/// <param name="columns">The columns that are kept.</param>
internal sealed class UnitScreen(IReadOnlyList<ReadingColumn> columns)
{
    private const double FamilyLevel = 0.01;
    private const double MostSuspects = 0.1;

    /// <summary>Candidates are looked at from three quarters of the limit on: the robust spread is itself uncertain.</summary>
    private const double CandidatePart = 0.75;

    private const int FewestUnits = 6;

    /// <summary>
    /// The suspect units in the order in which they were found, and the fit of those that are left; a family of fewer than six units has none.
    /// </summary>
    public (IReadOnlyList<SuspectUnit> Suspects, SpreadFit Kept) Find(MeasuredFamily family)
    {
        List<SuspectUnit> found = [];
        int most = (int)Math.Ceiling(MostSuspects * family.Units.Count());
        SpreadFit fit = SpreadFit.Of(family.Sample(columns), columns, restricted: true);
        double limit = Limit(family);
        while (found.Count < most && family.Units.Count() >= FewestUnits)
        {
            (MeasuredUnit unit, double outlying) = Candidate(family, fit.Fit);
            if (outlying < CandidatePart * limit)
                break;
            MeasuredFamily others = family.Without(u => ReferenceEquals(u, unit));
            SpreadFit without = SpreadFit.Of(others.Sample(columns), columns, restricted: true);
            if (Confirm(unit, others, fit.Fit, without.Fit, limit) is not { } suspect)
                break;
            found.Add(suspect);
            (family, fit) = (others, without);
        }

        return (found, fit);
    }

    /// <summary>Student's quantile: a unit left out is compared with a spread that the others' degrees of freedom estimate.</summary>
    private double Limit(MeasuredFamily family)
    {
        int units = family.Units.Count();
        return -StudentT.InvCDF(0, 1, Math.Max(1, units - family.Lots.Count - 1), FamilyLevel / 2 / (units * (columns.Count + 1)));
    }

    /// <summary>The unit that stands out most, in robust standard deviations of any term or in the scatter of its readings.</summary>
    private static (MeasuredUnit Unit, double Outlying) Candidate(MeasuredFamily family, NestedFit fit)
    {
        List<UnitDeviation> deviations = [.. UnitDeviation.All(fit).SelectMany(lot => lot)];
        double[] outlying = [.. fit.Point.Lots.SelectMany(lot => lot.Units).Select(unit => Scatter(unit.Summary, fit.Residual).Score)];
        for (int j = 0; j < fit.Mean.Length; j++)
        {
            double[] values = [.. deviations.Select(d => d.Standardised[j])];
            double middle = values.Median();
            double spread = values.Select(v => Math.Abs(v - middle)).Median() / NormalDistribution.Quantile(0.75);
            for (int i = 0; i < values.Length && spread > 0; i++)
                outlying[i] = Math.Max(outlying[i], Math.Abs(values[i] - middle) / spread);
        }

        int worst = Array.IndexOf(outlying, outlying.Max());
        return (family.Units.ElementAt(worst), outlying[worst]);
    }

    private SuspectUnit? Confirm(MeasuredUnit unit, MeasuredFamily others, NestedFit with, NestedFit without, double limit)
    {
        UnitShare share = new(unit.Summary(columns), without.Factors.Within);
        double[] deviation = UnitDeviation.Of(share, Expected(unit, others, without), without).Standardised;
        int worst = Enumerable.Range(0, deviation.Length).MaxBy(j => Math.Abs(deviation[j]));
        (double score, double ratio) = Scatter(share.Summary, without.Residual);
        if (Math.Max(score, Math.Abs(deviation[worst])) < limit)
            return null;
        return score > Math.Abs(deviation[worst])
            ? new SuspectUnit(unit.Lot, unit.Name, "repeatability", ratio, without.Residual, with.Residual)
            : new SuspectUnit(unit.Lot, unit.Name, columns[worst].Key, Math.Abs(deviation[worst]),
                Math.Sqrt(without.Within[worst, worst]), Math.Sqrt(with.Within[worst, worst]));
    }

    /// <summary>What is expected of a further unit: its lot's coefficients; those of a new lot when it was the only one of its lot.</summary>
    private static (double[] Coefficients, Grid Covariance) Expected(MeasuredUnit unit, MeasuredFamily others, NestedFit fit)
    {
        int lot = others.Lots.ToList().FindIndex(units => units[0].Lot == unit.Lot);
        if (lot >= 0)
            return fit.Point.Lots[lot].Predict(fit.Mean, fit.Point.MeanCovariance);
        Grid covariance = fit.Point.MeanCovariance.Copy();
        Products.AddTo(covariance, 1 / fit.Point.Variance, fit.Between);
        return (fit.Mean, covariance);
    }

    /// <summary>
    /// How improbable the scatter of a unit's readings about its own curve is, as a normal score (Wilson &amp; Hilferty 1931, PNAS 17, 684-688),
    /// and the scatter over that of the family.
    /// </summary>
    private static (double Score, double Ratio) Scatter(UnitSummary unit, double sigma)
    {
        double spare = unit.Count - unit.Triangle.Rows;
        if (spare < 1)
            return (0, 1);
        double ratio = unit.Remainder / (spare * sigma * sigma);
        return ((Math.Cbrt(ratio) - 1 + (2 / (9 * spare))) / Math.Sqrt(2 / (9 * spare)), Math.Sqrt(ratio));
    }
}
