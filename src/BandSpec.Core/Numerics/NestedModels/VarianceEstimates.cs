using BandSpec.Core.Numerics.Dense;

namespace BandSpec.Core.Numerics.NestedModels;

/// <summary>Every variance of a fit with its uncertainty.</summary>
/// <param name="Within">Of the coefficients within lots.</param>
/// <param name="Between">Of the coefficients between lots.</param>
/// <param name="Residual">Of a reading.</param>
internal sealed record VarianceEstimates(
    IReadOnlyList<VarianceEstimate> Within, IReadOnlyList<VarianceEstimate> Between, VarianceEstimate Residual)
{
    /// <summary>A variance below this part of its standard error is one that the search left a hair above zero.</summary>
    private const double Negligible = 1e-4;

    /// <summary>
    /// The uncertainty of a fit's variances, found with the correlations set aside: the variance of an estimated variance hardly depends on them
    /// (for complete readings not at all), while their own number would swamp a small sample.
    /// </summary>
    /// <param name="likelihood">The restricted likelihood.</param>
    /// <param name="fit">The fit.</param>
    /// <param name="freeWithin">Which coefficients may scatter within lots.</param>
    /// <param name="freeBetween">Which coefficients may scatter between lots.</param>
    public static VarianceEstimates Of(NestedLikelihood likelihood, NestedFit fit, bool[] freeWithin, bool[] freeBetween)
    {
        double square = fit.Point.Variance;
        double[] within = Diagonal(fit.Within, 1 / square), between = Diagonal(fit.Between, 1 / square);
        NestedPoint point = likelihood.At(Roots(within), Roots(between));
        Grid information = new SpreadInformation(point, within, between, likelihood.Freedom).Matrix();
        double[] errors = StandardErrors(information, [.. freeWithin, .. freeBetween, true]);
        double[] unitSampling = Sampling(within, point.Lots.SelectMany(lot => lot.Units).Select(unit => unit.Summary.Triangle.Gram()));
        double[] lotSampling = Sampling(between, point.Lots.Select(lot => lot.Precision));
        int size = within.Length;
        VarianceEstimate Of(double variance, double sampling, double error) =>
            new(variance > Negligible * error ? variance * square : 0, sampling * square, error * square);
        return new VarianceEstimates(
            [.. Enumerable.Range(0, size).Select(j => Of(within[j], unitSampling[j], errors[j]))],
            [.. Enumerable.Range(0, size).Select(j => Of(between[j], lotSampling[j], errors[size + j]))],
            Of(1, 0, errors[2 * size]));
    }

    private static double[] Diagonal(Grid matrix, double factor) =>
        [.. Enumerable.Range(0, matrix.Rows).Select(j => matrix[j, j] * factor)];

    private static Grid Roots(double[] variances) => Grid.Diagonal(Array.ConvertAll(variances, Math.Sqrt));

    /// <summary>Square roots of the diagonal of the inverse over the variances that are free and that the readings speak of.</summary>
    private static double[] StandardErrors(Grid information, bool[] free)
    {
        int[] kept = [.. Enumerable.Range(0, free.Length).Where(a => free[a] && information[a, a] > 0)];
        Grid scaled = new(kept.Length, kept.Length);
        for (int a = 0; a < kept.Length; a++)
            for (int b = 0; b < kept.Length; b++)
                scaled[a, b] = information[kept[a], kept[b]]
                    / Math.Sqrt(information[kept[a], kept[a]] * information[kept[b], kept[b]]);
        double[] errors = [.. free.Select(_ => double.PositiveInfinity)];
        if (!Cholesky.TryFactor(scaled, 1e-12))
            return errors;
        Grid inverse = Cholesky.Inverse(scaled);
        for (int a = 0; a < kept.Length; a++)
            errors[kept[a]] = Math.Sqrt(inverse[a, a] / information[kept[a], kept[a]]);
        return errors;
    }

    /// <summary>
    /// For each coefficient the sampling variance of the members' own estimates, weighted as the estimation weighs them; a member whose
    /// readings do not determine the coefficient drops out.
    /// </summary>
    private static double[] Sampling(double[] variances, IEnumerable<Grid> precisions)
    {
        double[] sum = new double[variances.Length], squares = new double[variances.Length];
        foreach (Grid precision in precisions)
        {
            double[] own = OwnVariances(precision);
            for (int j = 0; j < own.Length; j++)
            {
                double weight = 1 / (variances[j] + own[j]);
                sum[j] += weight;
                squares[j] += weight * weight;
            }
        }

        return [.. variances.Select((variance, j) => squares[j] > 0 ? Math.Max(0, (sum[j] / squares[j]) - variance) : 0)];
    }

    /// <summary>The diagonal of the inverse of a precision that may be singular; infinite where a coefficient is not determined.</summary>
    private static double[] OwnVariances(Grid precision)
    {
        const double Determined = 1e-9;
        int size = precision.Rows;
        double[] scale = [.. Enumerable.Range(0, size).Select(j => precision[j, j] > 0 ? 1 / Math.Sqrt(precision[j, j]) : 0)];
        Grid ridged = new(size, size);
        for (int a = 0; a < size; a++)
            for (int b = 0; b < size; b++)
                ridged[a, b] = (precision[a, b] * scale[a] * scale[b]) + (a == b ? Determined / 100 : 0);
        Grid inverse = Cholesky.Inverse(Cholesky.Factor(ridged));
        return [.. Enumerable.Range(0, size).Select(j =>
            scale[j] > 0 && inverse[j, j] < 1 / Determined ? inverse[j, j] * scale[j] * scale[j] : double.PositiveInfinity)];
    }
}
