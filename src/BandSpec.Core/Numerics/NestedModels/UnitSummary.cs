using BandSpec.Core.Numerics.Dense;

namespace BandSpec.Core.Numerics.NestedModels;

/// <summary>
/// All that the likelihood needs of one unit's readings <c>y = Zc + ε</c>: after the orthogonal reduction <c>Z = Q[R; 0]</c> the readings
/// act like at most as many as there are coefficients. A unit is read once; each step of the estimation then costs the same for ten readings
/// as for ten thousand.
/// </summary>
/// <param name="Triangle"><c>R</c>: one row a reading, at most as many as coefficients; one column a coefficient.</param>
/// <param name="Side">The rotated readings, one a row of <paramref name="Triangle"/>.</param>
/// <param name="Remainder">The sum of squares about the unit's own best fit.</param>
/// <param name="Count">How many readings there were.</param>
internal sealed record UnitSummary(Grid Triangle, double[] Side, double Remainder, int Count)
{
    /// <summary>Reduces readings.</summary>
    /// <param name="rows">One row a reading: the coefficients' regressors, then the reading. Destroyed.</param>
    public static UnitSummary From(Grid rows)
    {
        OrthogonalStack stack = new(rows.Columns - 1);
        int count = rows.Rows;
        stack.Add(rows);
        return From(stack, Math.Min(count, rows.Columns - 1), count);
    }

    /// <summary>The same readings on fewer coefficients, in the order given.</summary>
    public UnitSummary WithColumns(IReadOnlyList<int> chosen)
    {
        Grid rows = new(Triangle.Rows, chosen.Count + 1);
        for (int i = 0; i < rows.Rows; i++)
        {
            for (int j = 0; j < chosen.Count; j++)
                rows[i, j] = Triangle[i, chosen[j]];
            rows[i, chosen.Count] = Side[i];
        }

        OrthogonalStack stack = new(chosen.Count);
        stack.AddRemainder(Remainder);
        stack.Add(rows);
        return From(stack, Math.Min(Triangle.Rows, chosen.Count), Count);
    }

    /// <summary>
    /// The readings cleared of the first <paramref name="nuisance"/> coefficients, which the unit may have at any value: what is left of them
    /// after the reduction speaks of the others only. As in restricted likelihood, one reading is spent on each.
    /// </summary>
    public UnitSummary WithoutLeading(int nuisance)
    {
        int rows = Math.Max(0, Triangle.Rows - nuisance);
        Grid rest = new(rows, Triangle.Columns - nuisance);
        for (int i = 0; i < rows; i++)
            Triangle.Row(i + nuisance)[nuisance..].CopyTo(rest.Row(i));
        return new UnitSummary(rest, Side[Math.Min(nuisance, Side.Length)..], Remainder, Math.Max(0, Count - nuisance));
    }

    private static UnitSummary From(OrthogonalStack stack, int rows, int count)
    {
        Grid square = stack.Triangle;
        Grid triangle = new(rows, square.Columns);
        for (int i = 0; i < rows; i++)
            square.Row(i).CopyTo(triangle.Row(i));
        return new UnitSummary(triangle, stack.Side[..rows], stack.Remainder, count);
    }
}
