namespace BandSpec.Core.Numerics.Dense;

/// <summary>Residuals and leverages of one least-squares fit that may lack rank.</summary>
internal static class OrthogonalColumns
{
    /// <summary>A column that keeps less than this of its length is a combination of the earlier ones and is passed over.</summary>
    private const double Independent = 1e-8;

    /// <summary>
    /// Projects the last column on the others by modified Gram-Schmidt, each column orthogonalised twice. The leverage of a row is its diagonal
    /// element of the projection, 0 … 1.
    /// </summary>
    /// <param name="rows">One row a reading: regressors, then the reading. Destroyed.</param>
    /// <returns>One residual and one leverage a row, and how many columns are independent.</returns>
    public static (double[] Residuals, double[] Leverages, int Rank) Project(Grid rows)
    {
        Grid columns = rows.Transposed();
        double[] leverages = new double[rows.Rows];
        List<double[]> units = [];
        for (int j = 0; j < columns.Rows - 1; j++)
        {
            Span<double> column = columns.Row(j);
            double before = Math.Sqrt(Vectors.Dot(column, column));
            Clear(column, units);
            double after = Math.Sqrt(Vectors.Dot(column, column));
            if (!(after > Independent * before))
                continue;
            foreach (ref double cell in column)
                cell /= after;
            units.Add(column.ToArray());
            for (int i = 0; i < leverages.Length; i++)
                leverages[i] += column[i] * column[i];
        }

        Span<double> residuals = columns.Row(columns.Rows - 1);
        Clear(residuals, units);
        return (residuals.ToArray(), leverages, units.Count);
    }

    /// <summary>Takes the parts along orthonormal vectors out of a column, twice.</summary>
    private static void Clear(Span<double> column, List<double[]> units)
    {
        for (int pass = 0; pass < 2; pass++)
            foreach (double[] unit in units)
                Products.AddTo(column, -Vectors.Dot(unit, column), unit);
    }
}
