namespace BandSpec.Core.Numerics.RareEvents;

/// <summary>Small dense triangular matrices.</summary>
internal static class Triangles
{
    /// <summary>The lower triangular <c>L</c> with <c>L·Lᵀ</c> equal to a positive definite matrix.</summary>
    public static double[,] Cholesky(double[,] matrix)
    {
        int n = matrix.GetLength(0);
        double[,] lower = new double[n, n];
        for (int j = 0; j < n; j++)
            for (int i = j; i < n; i++)
            {
                double sum = matrix[i, j];
                for (int k = 0; k < j; k++)
                    sum -= lower[i, k] * lower[j, k];
                lower[i, j] = i == j ? Math.Sqrt(sum) : sum / lower[j, j];
            }
        return lower;
    }

    /// <summary><c>L⁻ᵀ</c>, upper triangular.</summary>
    public static double[,] InverseTransposed(double[,] lower)
    {
        int n = lower.GetLength(0);
        double[,] inverse = new double[n, n];
        for (int column = 0; column < n; column++)
            for (int i = column; i < n; i++)
            {
                double sum = i == column ? 1 : 0;
                for (int k = column; k < i; k++)
                    sum -= lower[i, k] * inverse[column, k];
                inverse[column, i] = sum / lower[i, i];
            }
        return inverse;
    }
}
