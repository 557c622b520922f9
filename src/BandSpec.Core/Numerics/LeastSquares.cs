namespace BandSpec.Core.Numerics;

/// <summary>Ordinary least squares for the small dense systems of a compensation plan, without allocation.</summary>
internal static class LeastSquares
{
    /// <summary>
    /// The pseudo-inverse <c>Q⁺ = R⁻¹Uᵀ</c> of a matrix of full column rank by modified Gram-Schmidt, each column orthogonalised twice, which
    /// keeps <c>U</c> orthogonal to rounding for the conditions met here (Giraud &amp; Langou 2002, "twice is enough").
    /// </summary>
    /// <param name="q">On entry <c>Q</c>, one column after the other, each <paramref name="rows"/> long; on return <c>U</c>.</param>
    /// <param name="rows">Number of points.</param>
    /// <param name="columns">Number of coefficients, at most <paramref name="rows"/>.</param>
    /// <param name="r">Workspace for <c>R</c>, at least columns².</param>
    /// <param name="inverse">On return <c>Q⁺</c>, one row a coefficient, each <paramref name="rows"/> long.</param>
    /// <returns>Whether the columns are independent: none lost more than 10 digits to the others.</returns>
    public static bool PseudoInverse(Span<double> q, int rows, int columns, Span<double> r, Span<double> inverse)
    {
        for (int c = 0; c < columns; c++)
        {
            Span<double> column = q.Slice(c * rows, rows);
            double before = Norm(column);
            Span<double> upper = r.Slice(c * columns, columns);
            upper.Clear();
            for (int pass = 0; pass < 2; pass++)
                for (int k = 0; k < c; k++)
                    upper[k] += Remove(q.Slice(k * rows, rows), column);
            double after = Norm(column);
            if (!(after > 1e-10 * before))
                return false;
            upper[c] = after;
            for (int i = 0; i < rows; i++)
                column[i] /= after;
        }

        SolveUpper(q, rows, columns, r, inverse);
        return true;
    }

    /// <summary>Takes the part along a unit vector out of a column and returns how much that was.</summary>
    private static double Remove(ReadOnlySpan<double> unit, Span<double> column)
    {
        double part = 0;
        for (int i = 0; i < column.Length; i++)
            part += unit[i] * column[i];
        for (int i = 0; i < column.Length; i++)
            column[i] -= part * unit[i];
        return part;
    }

    /// <summary><c>R·X = Uᵀ</c> from the last row up; <c>R</c> is stored by columns.</summary>
    private static void SolveUpper(ReadOnlySpan<double> u, int rows, int columns, ReadOnlySpan<double> r, Span<double> inverse)
    {
        for (int c = columns - 1; c >= 0; c--)
        {
            Span<double> row = inverse.Slice(c * rows, rows);
            u.Slice(c * rows, rows).CopyTo(row);
            for (int k = c + 1; k < columns; k++)
            {
                double factor = r[(k * columns) + c];
                ReadOnlySpan<double> below = inverse.Slice(k * rows, rows);
                for (int i = 0; i < rows; i++)
                    row[i] -= factor * below[i];
            }

            double pivot = r[(c * columns) + c];
            for (int i = 0; i < rows; i++)
                row[i] /= pivot;
        }
    }

    private static double Norm(ReadOnlySpan<double> v)
    {
        double sum = 0;
        foreach (double x in v)
            sum += x * x;
        return Math.Sqrt(sum);
    }
}
