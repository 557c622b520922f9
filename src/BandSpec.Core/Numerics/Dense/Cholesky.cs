namespace BandSpec.Core.Numerics.Dense;

/// <summary>The Cholesky factor <c>A = KKᵀ</c> of a symmetric positive definite matrix, and what is solved with it.</summary>
internal static class Cholesky
{
    /// <summary>Replaces the lower half of <paramref name="a"/> by <c>K</c> and clears the upper; <see langword="false"/> when a pivot is not positive.</summary>
    /// <param name="a">The matrix; its lower half is read.</param>
    /// <param name="tolerance">A pivot has to exceed this part of its diagonal element.</param>
    public static bool TryFactor(Grid a, double tolerance = 0)
    {
        for (int j = 0; j < a.Rows; j++)
        {
            Span<double> pivotRow = a.Row(j);
            double pivot = pivotRow[j] - Vectors.Dot(pivotRow[..j], pivotRow[..j]);
            if (!(pivot > tolerance * pivotRow[j]) || !double.IsFinite(pivot))
                return false;
            double root = pivotRow[j] = Math.Sqrt(pivot);
            for (int i = j + 1; i < a.Rows; i++)
            {
                Span<double> row = a.Row(i);
                row[j] = (row[j] - Vectors.Dot(row[..j], pivotRow[..j])) / root;
            }

            pivotRow[(j + 1)..].Clear();
        }

        return true;
    }

    /// <summary>The lower factor of a positive definite matrix.</summary>
    /// <exception cref="ArithmeticException">The matrix is not positive definite.</exception>
    public static Grid Factor(Grid a)
    {
        Grid factor = a.Copy();
        return TryFactor(factor) ? factor : throw new ArithmeticException("the matrix is not positive definite");
    }

    /// <summary><c>ln det A = 2Σ ln K_jj</c>.</summary>
    public static double LogDeterminant(Grid lower)
    {
        double sum = 0;
        for (int j = 0; j < lower.Rows; j++)
            sum += Math.Log(lower[j, j]);
        return 2 * sum;
    }

    /// <summary>Replaces <c>B</c> by <c>K⁻¹B</c>.</summary>
    public static void SolveLower(Grid lower, Grid b)
    {
        for (int i = 0; i < lower.Rows; i++)
        {
            Span<double> row = b.Row(i);
            for (int j = 0; j < i; j++)
                Products.AddTo(row, -lower[i, j], b.Row(j));
            double scale = 1 / lower[i, i];
            foreach (ref double cell in row)
                cell *= scale;
        }
    }

    /// <summary>Replaces <c>v</c> by <c>K⁻¹v</c>.</summary>
    public static void SolveLower(Grid lower, Span<double> vector)
    {
        for (int i = 0; i < lower.Rows; i++)
            vector[i] = (vector[i] - Vectors.Dot(lower.Row(i)[..i], vector[..i])) / lower[i, i];
    }

    /// <summary><c>A⁻¹ = (K⁻¹)ᵀK⁻¹</c>.</summary>
    public static Grid Inverse(Grid lower)
    {
        Grid inverse = Grid.Identity(lower.Rows);
        SolveLower(lower, inverse);
        return inverse.Gram();
    }
}
