using BandSpec.Core.Numerics.Dense;

namespace BandSpec.Core.Numerics.NestedModels;

/// <summary>
/// Covariances without any structure: <c>Λ = Λ₀T</c> with a lower triangle <c>T</c> that starts at the identity, so that every free parameter
/// matters about as much as the others. The triangle may become singular: a covariance without full rank is an inner point.
/// </summary>
/// <param name="start">The factors <c>Λ₀</c>, lower triangles; a column of zeros stays at zero.</param>
internal sealed class FreeCovarianceLaw(NestedFactors start) : ICovarianceLaw
{
    private readonly (int Row, int Column)[] within = Free(start.Within);
    private readonly (int Row, int Column)[] between = Free(start.Between);

    public double[] Start => [.. within.Concat(between).Select(cell => cell.Row == cell.Column ? 1.0 : 0.0)];

    /// <summary>As for spreads and correlations: 4 for a pivot and 2 for the cells beside it, each unit or lot.</summary>
    public double[] Curvature(int units, int lots) =>
    [
        .. within.Select(cell => (cell.Row == cell.Column ? 4.0 : 2.0) * units),
        .. between.Select(cell => (cell.Row == cell.Column ? 4.0 : 2.0) * lots),
    ];

    public NestedFactors? Factors(double[] parameters) => new(
        start.Within.Times(Triangle(within, parameters, start.Within.Rows)),
        start.Between.Times(Triangle(between, parameters.AsSpan(within.Length), start.Between.Rows)));

    public double[] Slope(double[] parameters, NestedFactors factors, NestedSlopes slopes)
    {
        Grid inner = Chain(start.Within, slopes.Within, factors.Within);
        Grid outer = Chain(start.Between, slopes.Between, factors.Between);
        return [.. within.Select(cell => inner[cell.Row, cell.Column]), .. between.Select(cell => outer[cell.Row, cell.Column])];
    }

    public double[]? Downhill(double[] parameters, NestedSlopes slopes)
    {
        double[] moved = (double[])parameters.Clone();
        Stir(within, moved, Chain(start.Within, slopes.Within, start.Within));
        Stir(between, moved.AsSpan(within.Length), Chain(start.Between, slopes.Between, start.Between));
        return moved.AsSpan().SequenceEqual(parameters) ? null : moved;
    }

    /// <summary>Lifts a pivot off zero where the deviance falls with its square.</summary>
    private static void Stir((int Row, int Column)[] cells, Span<double> parameters, Grid curvature)
    {
        const double Small = 1e-3;
        for (int i = 0; i < cells.Length; i++)
            if (cells[i].Row == cells[i].Column && Math.Abs(parameters[i]) < Small
                && curvature[cells[i].Row, cells[i].Row] * Small * Small < -1e-9)
                parameters[i] = 10 * Small;
    }

    /// <summary><c>Λ₀ᵀ·2GΛ</c>.</summary>
    private static Grid Chain(Grid from, Grid slopes, Grid factor) => from.Transposed().Times(slopes).Times(factor).ScaledBy(2);

    private static (int Row, int Column)[] Free(Grid factor) =>
        [.. from row in Enumerable.Range(0, factor.Rows)
            where factor[row, row] != 0
            from column in Enumerable.Range(0, row + 1)
            where factor[column, column] != 0
            select (row, column)];

    private static Grid Triangle((int Row, int Column)[] cells, ReadOnlySpan<double> values, int size)
    {
        Grid triangle = new(size, size);
        for (int i = 0; i < cells.Length; i++)
            triangle[cells[i].Row, cells[i].Column] = values[i];
        return triangle;
    }
}
