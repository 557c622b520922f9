namespace BandSpec.Core.VirtualLots;

/// <summary>Ordinary least squares by Householder reflections (Golub and Van Loan, "Matrix Computations", 5.2.1 and 5.3.2).</summary>
internal static class HouseholderFit
{
    /// <summary>The matrix that turns observations into fitted coefficients, row by row, one row a coefficient.</summary>
    /// <param name="columns">The columns of the design matrix, each as long as there are observations; they are used up.</param>
    /// <param name="observations">How many observations.</param>
    /// <exception cref="ArgumentException">The columns are linearly dependent, or there are more of them than observations.</exception>
    public static double[] Solver(double[][] columns, int observations)
    {
        if (columns.Length > observations)
            throw new ArgumentException($"{observations} observations cannot determine {columns.Length} coefficients", nameof(columns));
        double[] diagonal = new double[columns.Length];
        for (int k = 0; k < columns.Length; k++)
        {
            diagonal[k] = Reflector(columns[k], k);
            for (int j = k + 1; j < columns.Length; j++)
                Reflect(columns[k], k, columns[j]);
        }
        double[] solver = new double[columns.Length * observations];
        for (int i = 0; i < observations; i++)
            SolveFor(columns, diagonal, i, observations, solver);
        return solver;
    }

    /// <summary>Turns the rest of a column into the reflector's vector of length √2; returns the diagonal entry it leaves.</summary>
    private static double Reflector(double[] column, int k)
    {
        double norm = Math.Sqrt(column.Skip(k).Sum(v => v * v));
        if (norm <= 1e-10 * Math.Sqrt(column.Sum(v => v * v)))
            throw new ArgumentException("the observations do not determine the coefficients", nameof(column));
        double diagonal = column[k] > 0 ? -norm : norm;
        double scale = 1 / Math.Sqrt(norm * (norm + Math.Abs(column[k])));
        column[k] -= diagonal;
        for (int i = k; i < column.Length; i++)
            column[i] *= scale;
        return diagonal;
    }

    private static void Reflect(double[] reflector, int k, double[] vector)
    {
        double along = 0;
        for (int i = k; i < vector.Length; i++)
            along += reflector[i] * vector[i];
        for (int i = k; i < vector.Length; i++)
            vector[i] -= along * reflector[i];
    }

    private static void SolveFor(double[][] columns, double[] diagonal, int observation, int observations, double[] solver)
    {
        double[] right = new double[observations];
        right[observation] = 1;
        for (int k = 0; k < columns.Length; k++)
            Reflect(columns[k], k, right);
        for (int row = columns.Length - 1; row >= 0; row--)
        {
            double sum = right[row];
            for (int j = row + 1; j < columns.Length; j++)
                sum -= columns[j][row] * solver[(j * observations) + observation];
            solver[(row * observations) + observation] = sum / diagonal[row];
        }
    }
}
