using System.Runtime.Intrinsics;

namespace BandSpec.Core.Numerics;

/// <summary>
/// Ordinary least squares for eight systems of one shape at once, one system to a lane. Every lane does the same IEEE operations in the same
/// order, so a system gives the same bits in any lane and on any machine.
/// </summary>
internal static class LanewiseLeastSquares
{
    /// <summary>
    /// The pseudo-inverses <c>Q⁺ = R⁻¹Uᵀ</c> by classical Gram-Schmidt, each column orthogonalised twice, which keeps <c>U</c> orthogonal to
    /// rounding as long as the columns are independent (Giraud, Langou, Rozložník &amp; van den Eshof 2005). The classical form is taken because its
    /// projections do not wait for each other; the modified form took three times as long here.
    /// </summary>
    /// <param name="q">On entry <c>Q</c>, one column after the other, each <paramref name="rows"/> long; on return <c>U</c>.</param>
    /// <param name="rows">Number of points.</param>
    /// <param name="columns">Number of coefficients, at most <paramref name="rows"/>.</param>
    /// <param name="r">Workspace for <c>R</c> and one more column, at least columns·(columns + 1).</param>
    /// <param name="inverse">On return <c>Q⁺</c>, one row a coefficient, each <paramref name="rows"/> long.</param>
    /// <returns>All bits set in the lanes whose columns are independent: none lost more than 10 digits to the others.</returns>
    public static Vector512<double> PseudoInverse(
        Span<Vector512<double>> q, int rows, int columns, Span<Vector512<double>> r, Span<Vector512<double>> inverse)
    {
        var independent = Vector512<double>.AllBitsSet;
        Span<Vector512<double>> parts = r.Slice(columns * columns, columns);
        for (int c = 0; c < columns; c++)
        {
            Span<Vector512<double>> column = q.Slice(c * rows, rows), upper = r.Slice(c * columns, columns);
            Vector512<double> before = Dot(column, column);
            upper.Clear();
            for (int pass = 0; pass < 2; pass++)
                Remove(q, column, parts[..c], upper);
            Vector512<double> after = Dot(column, column);
            independent &= Vector512.GreaterThan(after, before * 1e-20);
            upper[c] = Vector512.Sqrt(after);
            Vector512<double> scale = Vector512<double>.One / upper[c];
            foreach (ref Vector512<double> value in column)
                value *= scale;
        }

        SolveUpper(q, rows, columns, r, inverse);
        return independent;
    }

    /// <summary>Takes the parts along the unit vectors before it out of a column and adds them to its column of <c>R</c>.</summary>
    private static void Remove(
        ReadOnlySpan<Vector512<double>> units, Span<Vector512<double>> column, Span<Vector512<double>> parts, Span<Vector512<double>> upper)
    {
        int rows = column.Length;
        for (int k = 0; k < parts.Length; k++)
        {
            parts[k] = Dot(units.Slice(k * rows, rows), column);
            upper[k] += parts[k];
        }

        for (int k = 0; k < parts.Length; k++)
            Subtract(column, parts[k], units.Slice(k * rows, rows));
    }

    /// <summary><c>R·X = Uᵀ</c> from the last row up; <c>R</c> is stored by columns.</summary>
    private static void SolveUpper(
        ReadOnlySpan<Vector512<double>> u, int rows, int columns, ReadOnlySpan<Vector512<double>> r, Span<Vector512<double>> inverse)
    {
        for (int c = columns - 1; c >= 0; c--)
        {
            Span<Vector512<double>> row = inverse.Slice(c * rows, rows);
            u.Slice(c * rows, rows).CopyTo(row);
            for (int k = c + 1; k < columns; k++)
                Subtract(row, r[(k * columns) + c], inverse.Slice(k * rows, rows));
            Vector512<double> scale = Vector512<double>.One / r[(c * columns) + c];
            foreach (ref Vector512<double> value in row)
                value *= scale;
        }
    }

    private static void Subtract(Span<Vector512<double>> target, Vector512<double> factor, ReadOnlySpan<Vector512<double>> source)
    {
        Vector512<double> minus = -factor;
        for (int i = 0; i < target.Length && i < source.Length; i++)
            target[i] = Vector512.FusedMultiplyAdd(minus, source[i], target[i]);
    }

    /// <summary><c>Σ a_i b_i</c> in each lane, over two running sums so that one does not wait for the other.</summary>
    public static Vector512<double> Dot(ReadOnlySpan<Vector512<double>> a, ReadOnlySpan<Vector512<double>> b)
    {
        Vector512<double> even = Vector512<double>.Zero, odd = Vector512<double>.Zero;
        int i = 0;
        for (; i + 1 < a.Length && i + 1 < b.Length; i += 2)
        {
            even = Vector512.FusedMultiplyAdd(a[i], b[i], even);
            odd = Vector512.FusedMultiplyAdd(a[i + 1], b[i + 1], odd);
        }

        return i < a.Length && i < b.Length ? Vector512.FusedMultiplyAdd(a[i], b[i], even) + odd : even + odd;
    }
}
