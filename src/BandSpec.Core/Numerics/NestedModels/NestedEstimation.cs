using BandSpec.Core.Numerics.Dense;
using BandSpec.Core.Numerics.Minimizing;

namespace BandSpec.Core.Numerics.NestedModels;

/// <summary>
/// Finds the most likely covariances: a few steps of expectation-maximisation (Dempster, Laird &amp; Rubin 1977; they cannot overshoot) to
/// the right order of magnitude, then a quasi-Newton search with the analytic slope. Expectation-maximisation alone needs thousands of steps
/// where a spread belongs at zero.
/// </summary>
internal static class NestedEstimation
{
    private const int RoughSteps = 8;
    private const int MostSteps = 2000;
    private const int MostRestarts = 5;

    /// <summary>The most likely parameters of a law.</summary>
    /// <param name="likelihood">The likelihood.</param>
    /// <param name="law">The law.</param>
    /// <param name="worthwhile">The deviance that the answer may be above the smallest one, about; 0 for as little as rounding allows.</param>
    public static NestedFit Fit(NestedLikelihood likelihood, ICovarianceLaw law, double worthwhile = 0)
    {
        double[] start = law.Start;
        double[] curvature = law.Curvature(likelihood.Sample.Units, likelihood.Sample.Lots.Count);
        int evaluations = 0;
        for (int restart = 0; ; restart++)
        {
            QuasiNewton search = new(parameters => Evaluate(likelihood, law, parameters), MostSteps, worthwhile);
            Minimum minimum = search.From(start, curvature);
            evaluations += minimum.Evaluations + 1;
            NestedFactors factors = law.Factors(minimum.Point.Place)!;
            NestedPoint last = likelihood.At(factors.Within, factors.Between);
            double[]? downhill = restart < MostRestarts ? law.Downhill(minimum.Point.Place, last.Slopes) : null;
            if (downhill is null)
                return new NestedFit(minimum.Point.Place, factors, last, minimum.End, evaluations);
            start = downhill;
        }
    }

    /// <summary>Spreads of the right order of magnitude, relative to the residual standard deviation.</summary>
    /// <param name="likelihood">The likelihood.</param>
    /// <param name="within">Which coefficients scatter within lots.</param>
    /// <param name="between">Which coefficients scatter between lots.</param>
    public static (double[] Within, double[] Between) RoughSpreads(NestedLikelihood likelihood, bool[] within, bool[] between)
    {
        double[] wide = WideSpreads(likelihood.Sample);
        double[] sigma = [.. wide.Select((s, j) => within[j] ? s : 0)];
        double[] lotSigma = [.. wide.Select((s, j) => between[j] ? s : 0)];
        for (int step = 0; step < RoughSteps; step++)
        {
            NestedSlopes slopes = likelihood.At(Grid.Diagonal(sigma), Grid.Diagonal(lotSigma)).Slopes;
            Maximise(sigma, slopes.Within, likelihood.Sample.Units);
            Maximise(lotSigma, slopes.Between, likelihood.Sample.Lots.Count);
        }

        return (sigma, lotSigma);
    }

    private static SlopedPoint Evaluate(NestedLikelihood likelihood, ICovarianceLaw law, double[] parameters)
    {
        if (law.Factors(parameters) is not { } factors)
            return SlopedPoint.Outside(parameters);
        NestedPoint point = likelihood.At(factors.Within, factors.Between);
        return double.IsFinite(point.Deviance)
            ? new SlopedPoint(parameters, point.Deviance, law.Slope(parameters, factors, point.Slopes))
            : SlopedPoint.Outside(parameters);
    }

    /// <summary>The maximisation step <c>Σ_jj − Σ_jj² G_jj/m</c> of a spread without correlations.</summary>
    private static void Maximise(double[] spreads, Grid slopes, int members)
    {
        for (int j = 0; j < spreads.Length; j++)
        {
            double square = spreads[j] * spreads[j];
            spreads[j] = Math.Sqrt(Math.Max(square - (square * square * slopes[j, j] / members), 1e-6 * square));
        }
    }

    /// <summary>For each coefficient the spread that alone would explain all scatter about one common curve: certainly too wide.</summary>
    private static double[] WideSpreads(NestedSample sample)
    {
        OrthogonalStack stack = new(sample.Coefficients);
        double[] squares = new double[sample.Coefficients];
        (double remainder, int freedom) = (0, 0);
        foreach (UnitSummary unit in sample.Lots.SelectMany(lot => lot))
        {
            (Grid rows, _) = UnitShare.Whiten(unit.Triangle, unit.Side, new Grid(sample.Coefficients, sample.Coefficients));
            for (int j = 0; j < squares.Length; j++)
                squares[j] += Enumerable.Range(0, rows.Rows).Sum(i => rows[i, j] * rows[i, j]);
            stack.AddRemainder(unit.Remainder);
            stack.Add(rows);
            (remainder, freedom) = (remainder + unit.Remainder, freedom + unit.Count - unit.Triangle.Rows);
        }

        double total = stack.Remainder / Math.Max(1, sample.Readings - sample.Coefficients);
        double noise = freedom > 0 && remainder > 0 ? remainder / freedom : total;
        return [.. squares.Select(s => s > 0 ? Math.Sqrt(total / noise * sample.Readings / s) : 0)];
    }
}
