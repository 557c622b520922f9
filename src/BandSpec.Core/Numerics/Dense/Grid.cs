namespace BandSpec.Core.Numerics.Dense;

/// <summary>
/// A small dense matrix, row after row in one array, for loops that run thousands of times over matrices of ten to twenty rows: there a
/// library's matrix spends more time on allocation and dispatch than on arithmetic. Mutable; never leaves the mathematics.
/// </summary>
internal sealed class Grid(int rows, int columns)
{
    private readonly double[] cells = new double[rows * columns];

    public int Rows { get; } = rows;

    public int Columns { get; } = columns;

    public double this[int row, int column]
    {
        get => cells[(row * Columns) + column];
        set => cells[(row * Columns) + column] = value;
    }

    public static Grid Identity(int size)
    {
        Grid identity = new(size, size);
        for (int i = 0; i < size; i++)
            identity[i, i] = 1;
        return identity;
    }

    public static Grid Diagonal(ReadOnlySpan<double> values)
    {
        Grid diagonal = new(values.Length, values.Length);
        for (int i = 0; i < values.Length; i++)
            diagonal[i, i] = values[i];
        return diagonal;
    }

    public Span<double> Row(int row) => cells.AsSpan(row * Columns, Columns);

    public Span<double> AllCells() => cells;

    public Grid Copy()
    {
        Grid copy = new(Rows, Columns);
        cells.CopyTo(copy.cells, 0);
        return copy;
    }

    public Grid Transposed()
    {
        Grid transposed = new(Columns, Rows);
        for (int i = 0; i < Rows; i++)
            for (int j = 0; j < Columns; j++)
                transposed[j, i] = this[i, j];
        return transposed;
    }

    /// <summary>The chosen columns, in the order given.</summary>
    public Grid WithColumns(IReadOnlyList<int> chosen)
    {
        Grid part = new(Rows, chosen.Count);
        for (int i = 0; i < Rows; i++)
            for (int j = 0; j < chosen.Count; j++)
                part[i, j] = this[i, chosen[j]];
        return part;
    }

    public Grid ScaledBy(double factor)
    {
        Grid scaled = Copy();
        foreach (ref double cell in scaled.cells.AsSpan())
            cell *= factor;
        return scaled;
    }
}
