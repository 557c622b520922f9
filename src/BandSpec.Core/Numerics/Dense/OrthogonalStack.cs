namespace BandSpec.Core.Numerics.Dense;

/// <summary>
/// Least squares by rows that arrive in portions: keeps the triangle <c>R</c> and the rotated right side <c>v</c> of <c>[A b] = Q[R v; 0 ρ]</c>
/// and the sum of squares <c>ρ²</c> that no combination of the columns explains. Householder reflections (Golub &amp; Van Loan, Matrix
/// Computations, section 5.2) rather than cross products, because a small spread beside a large mean would cancel in those.
/// Rank deficiency needs no decision here: the pivots concerned are simply small or zero.
/// </summary>
internal sealed class OrthogonalStack(int columns)
{
    /// <summary>The triangle beside the right side: <c>columns</c> rows, one column more than that.</summary>
    private readonly Grid triangle = new(columns, columns + 1);

    /// <summary>The unexplained sum of squares.</summary>
    public double Remainder { get; private set; }

    /// <summary>How many rows have arrived.</summary>
    public int Count { get; private set; }

    /// <summary>The triangle <c>R</c>, upper, square.</summary>
    public Grid Triangle => triangle.WithColumns([.. Enumerable.Range(0, columns)]);

    /// <summary>The rotated right side <c>v</c>.</summary>
    public double[] Side
    {
        get
        {
            double[] side = new double[columns];
            for (int i = 0; i < columns; i++)
                side[i] = triangle[i, columns];
            return side;
        }
    }

    /// <summary>Takes rows whose last column is the right side; destroys them.</summary>
    public void Add(Grid rows)
    {
        for (int j = 0; j < columns; j++)
            Reflect(rows, j);
        for (int i = 0; i < rows.Rows; i++)
            Remainder += rows[i, columns] * rows[i, columns];
        Count += rows.Rows;
    }

    /// <summary>Adds a sum of squares that is known to be unexplained.</summary>
    public void AddRemainder(double squares) => Remainder += squares;

    /// <summary>One reflection of row <paramref name="j"/> of the triangle with the new rows, so that their column <paramref name="j"/> vanishes.</summary>
    private void Reflect(Grid rows, int j)
    {
        double below = 0;
        for (int i = 0; i < rows.Rows; i++)
            below += rows[i, j] * rows[i, j];
        if (below == 0)
            return;
        double pivot = triangle[j, j];
        double norm = Math.Sqrt((pivot * pivot) + below);
        double head = pivot > 0 ? pivot + norm : pivot - norm;
        double scale = 2 / ((head * head) + below);
        Span<double> top = triangle.Row(j)[j..];
        Span<double> sums = stackalloc double[top.Length];
        Products.AddTo(sums, head, top);
        for (int i = 0; i < rows.Rows; i++)
            Products.AddTo(sums, rows[i, j], rows.Row(i)[j..]);
        Products.AddTo(top, -scale * head, sums);
        for (int i = 0; i < rows.Rows; i++)
            Products.AddTo(rows.Row(i)[j..], -scale * rows[i, j], sums);
    }
}
