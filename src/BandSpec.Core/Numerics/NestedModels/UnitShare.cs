using BandSpec.Core.Numerics.Dense;

namespace BandSpec.Core.Numerics.NestedModels;

/// <summary>One unit's part of the likelihood at a given factor of the spread within a lot.</summary>
internal sealed class UnitShare
{
    private readonly Grid whitened;

    public UnitShare(UnitSummary summary, Grid within)
    {
        Summary = summary;
        (whitened, LogDeterminant) = Whiten(summary.Triangle, summary.Side, within);
        int size = within.Rows;
        Grid products = whitened.Gram();
        Precision = new Grid(size, size);
        Pull = new double[size];
        for (int i = 0; i < size; i++)
        {
            products.Row(i)[..size].CopyTo(Precision.Row(i));
            Pull[i] = products[i, size];
        }
    }

    /// <summary>The unit's readings.</summary>
    public UnitSummary Summary { get; }

    /// <summary><c>ZᵀV⁻¹Z</c>, <c>V</c> relative to <c>σ²</c> and without the lot's part.</summary>
    public Grid Precision { get; }

    /// <summary><c>ZᵀV⁻¹y</c>.</summary>
    public double[] Pull { get; }

    /// <summary><c>ln det V</c>.</summary>
    public double LogDeterminant { get; }

    /// <summary>The sum of squares that no coefficients explain.</summary>
    public double Remainder => Summary.Remainder;

    /// <summary>A copy of the whitened rows <c>[R̃ ũ]</c>.</summary>
    public Grid Rows() => whitened.Copy();

    /// <summary>
    /// Rows <c>[R v]</c> with unit noise and a coefficient scatter <c>ΛΛᵀ</c>, made independent of each other:
    /// <c>I + RΛΛᵀRᵀ = KKᵀ</c>, then <c>K⁻¹[R v]</c>; and <c>ln det KKᵀ</c>.
    /// </summary>
    public static (Grid Rows, double LogDeterminant) Whiten(Grid triangle, double[] side, Grid factor)
    {
        Grid scatter = triangle.Times(factor);
        Grid covariance = scatter.TimesTransposed(scatter);
        for (int i = 0; i < covariance.Rows; i++)
            covariance[i, i] += 1;
        Grid lower = Cholesky.Factor(covariance);
        Grid rows = new(triangle.Rows, triangle.Columns + 1);
        for (int i = 0; i < rows.Rows; i++)
        {
            triangle.Row(i).CopyTo(rows.Row(i));
            rows[i, triangle.Columns] = side[i];
        }

        Cholesky.SolveLower(lower, rows);
        return (rows, Cholesky.LogDeterminant(lower));
    }
}
