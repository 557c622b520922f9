namespace BandSpec.Core.Numerics;

/// <summary>Sums over short vectors and small matrices, always in the same order.</summary>
internal static class Vectors
{
    /// <summary><c>Σ a_i b_i</c>.</summary>
    public static double Dot(ReadOnlySpan<double> a, ReadOnlySpan<double> b)
    {
        double sum = 0;
        for (int i = 0; i < a.Length; i++)
            sum += a[i] * b[i];
        return sum;
    }

    /// <summary><c>aᵀ M b</c> for a square matrix.</summary>
    public static double Form(ReadOnlySpan<double> a, double[,] matrix, ReadOnlySpan<double> b)
    {
        double sum = 0;
        for (int i = 0; i < a.Length; i++)
        {
            if (a[i] == 0)
                continue;
            double row = 0;
            for (int j = 0; j < b.Length; j++)
                row += matrix[i, j] * b[j];
            sum += a[i] * row;
        }

        return sum;
    }
}
