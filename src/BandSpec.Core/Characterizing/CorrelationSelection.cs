using BandSpec.Core.Numerics;
using BandSpec.Core.Numerics.NestedModels;

namespace BandSpec.Core.Characterizing;

/// <summary>
/// Chooses the correlated pairs. The score test (Rao 1948, Proc. Camb. Phil. Soc. 44, 50-57) asks of every pair how steeply the likelihood
/// rises when its correlation leaves zero, without fitting it; the clearest pair is taken in and all is fitted again, until no pair is clear
/// at a family-wise level of 5 % (Bonferroni). A slope at zero is a promise only: a pair whose fit does not lower the deviance as much stays out. A platform file with ninety doubtful correlations would carry noise into every specification.
/// </summary>
internal static class CorrelationSelection
{
    private const double FamilyLevel = 0.05;

    private const int MostPairs = 20;

    /// <summary>The fit with every clear pair.</summary>
    public static SpreadFit Choose(SpreadFit fit, IReadOnlyList<ReadingColumn> columns)
    {
        HashSet<(int First, int Second)> refused = [];
        while (fit.Law.Pairs.Count < MostPairs)
        {
            List<(int First, int Second)> open = [.. OpenPairs(fit, columns).Where(pair => !refused.Contains(pair))];
            if (open.Count == 0)
                return fit;
            (int First, int Second) clearest = open.MaxBy(pair => Score(fit.Fit, pair));
            double limit = NormalDistribution.Quantile(FamilyLevel / 2 / (open.Count + refused.Count));
            if (Score(fit.Fit, clearest) < limit * limit)
                return fit;
            SpreadFit trial = fit.WithPair(clearest);
            if (fit.Fit.Deviance - trial.Fit.Deviance >= limit * limit)
                fit = trial;
            else
                refused.Add(clearest);
        }

        return fit;
    }

    /// <summary>The fit with the pairs that are fixed beforehand, as far as their coefficients were kept.</summary>
    public static SpreadFit Pin(SpreadFit fit, IReadOnlyList<ReadingColumn> columns, IReadOnlyList<CoefficientPair> pinned)
    {
        foreach (CoefficientPair pair in pinned)
        {
            int first = columns.ToList().IndexOf(new ReadingColumn(ColumnKind.Coefficient, pair.First));
            int second = columns.ToList().IndexOf(new ReadingColumn(ColumnKind.Coefficient, pair.Second));
            if (first >= 0 && second >= 0)
                fit = fit.WithPair((first, second));
        }

        return fit;
    }

    private static IEnumerable<(int First, int Second)> OpenPairs(SpreadFit fit, IReadOnlyList<ReadingColumn> columns) =>
        from first in Enumerable.Range(0, columns.Count)
        from second in Enumerable.Range(first + 1, columns.Count - first - 1)
        where columns[first].Kind == ColumnKind.Coefficient && columns[second].Kind == ColumnKind.Coefficient
        where !fit.Law.Pairs.Contains((first, second))
        select (first, second);

    /// <summary>
    /// The score statistic <c>(dL/dρ)²/I</c> of a pair, chi-square with one degree of freedom when it is uncorrelated:
    /// <c>dL/dρ = −(W_jk σ_jσ_k + B_jk σ_lot,j σ_lot,k)</c>, <c>I = Σ_i P_jj P_kk σ_j²σ_k²</c> over units.
    /// </summary>
    private static double Score(NestedFit fit, (int First, int Second) pair)
    {
        (int j, int k) = pair;
        NestedSlopes slopes = fit.Point.Slopes;
        double within = Spread(fit.Factors.Within, j) * Spread(fit.Factors.Within, k);
        double between = Spread(fit.Factors.Between, j) * Spread(fit.Factors.Between, k);
        double rise = (slopes.Within[j, k] * within) + (slopes.Between[j, k] * between);
        double information = fit.Point.Lots.SelectMany(lot => lot.Units)
            .Sum(unit => unit.Precision[j, j] * unit.Precision[k, k] * within * within);
        return information > 0 ? rise * rise / information : 0;
    }

    private static double Spread(Numerics.Dense.Grid factor, int j) => Math.Sqrt(Vectors.Dot(factor.Row(j), factor.Row(j)));
}
