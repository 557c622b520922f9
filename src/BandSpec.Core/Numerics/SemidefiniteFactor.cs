namespace BandSpec.Core.Numerics;

/// <summary>A factor of a positive semidefinite matrix.</summary>
internal static class SemidefiniteFactor
{
    /// <summary>
    /// The rows of <c>Lᵀ</c> with <c>Σ = L·Lᵀ</c> (Cholesky), without the rows that are zero: a coefficient without scatter, or one wholly
    /// determined by others, costs nothing later. A pivot below 10⁻¹² of its diagonal counts as zero.
    /// </summary>
    /// <param name="sigma">Symmetric positive semidefinite, n×n.</param>
    /// <returns>r rows of length n, r being the rank.</returns>
    public static double[][] RowsOf(double[,] sigma)
    {
        int n = sigma.GetLength(0);
        List<double[]> rows = [];
        var left = (double[,])sigma.Clone();
        for (int k = 0; k < n; k++)
        {
            double pivot = left[k, k];
            if (pivot <= 1e-12 * sigma[k, k] || pivot <= 0)
                continue;
            var row = new double[n];
            double root = Math.Sqrt(pivot);
            for (int j = k; j < n; j++)
                row[j] = left[k, j] / root;
            rows.Add(row);
            for (int i = k; i < n; i++)
                for (int j = k; j < n; j++)
                    left[i, j] -= row[i] * row[j];
        }

        return [.. rows];
    }
}
