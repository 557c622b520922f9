using BandSpec.Core.Requirements;

namespace BandSpec.Core.VirtualLots;

/// <summary>
/// A lower triangular matrix <c>F</c> with <c>F·Fᵀ = R</c>, the correlations of the raw error's coefficients, as the non-zero entries of each
/// row. Semidefinite matrices are taken: a pivot below 1e-12 leaves its column empty.
/// </summary>
internal static class CorrelationFactor
{
    private const double SmallestPivot = 1e-12;

    /// <summary>The rows of the factor; row <c>i</c> belongs to coefficient <c>i</c>.</summary>
    public static FactorEntry[][] Rows(IReadOnlyList<RawErrorCoefficient> coefficients, IReadOnlyList<CoefficientCorrelation> correlations)
    {
        double[,] factor = Cholesky(Matrix(coefficients, correlations));
        return [.. Enumerable.Range(0, coefficients.Count).Select(row => Row(factor, row))];
    }

    private static FactorEntry[] Row(double[,] factor, int row) =>
        [.. Enumerable.Range(0, row + 1).Where(column => factor[row, column] != 0).Select(column => new FactorEntry(column, factor[row, column]))];

    private static double[,] Matrix(IReadOnlyList<RawErrorCoefficient> coefficients, IReadOnlyList<CoefficientCorrelation> correlations)
    {
        int n = coefficients.Count;
        double[,] matrix = new double[n, n];
        for (int i = 0; i < n; i++)
            matrix[i, i] = 1;
        foreach (CoefficientCorrelation correlation in correlations)
        {
            (int i, int j) = (IndexOf(coefficients, correlation.First), IndexOf(coefficients, correlation.Second));
            matrix[i, j] = matrix[j, i] = correlation.Value;
        }
        return matrix;
    }

    private static int IndexOf(IReadOnlyList<RawErrorCoefficient> coefficients, CoefficientName name) =>
        Enumerable.Range(0, coefficients.Count).First(i => coefficients[i].Name == name);

    private static double[,] Cholesky(double[,] matrix)
    {
        int n = matrix.GetLength(0);
        double[,] factor = new double[n, n];
        for (int column = 0; column < n; column++)
        {
            double pivot = matrix[column, column] - Product(factor, column, column, column);
            if (pivot < SmallestPivot)
                continue;
            factor[column, column] = Math.Sqrt(pivot);
            for (int row = column + 1; row < n; row++)
                factor[row, column] = (matrix[row, column] - Product(factor, row, column, column)) / factor[column, column];
        }
        return factor;
    }

    private static double Product(double[,] factor, int first, int second, int length)
    {
        double sum = 0;
        for (int k = 0; k < length; k++)
            sum += factor[first, k] * factor[second, k];
        return sum;
    }
}

/// <summary>One entry of a row of the factor.</summary>
/// <param name="Column">Which independent number.</param>
/// <param name="Weight">Its weight.</param>
internal readonly record struct FactorEntry(int Column, double Weight);
