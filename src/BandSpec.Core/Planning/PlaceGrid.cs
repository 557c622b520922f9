using System.Runtime.Intrinsics;
using BandSpec.Core.Requirements;
using BandSpec.Core.Residuals;

namespace BandSpec.Core.Planning;

/// <summary>
/// A set of temperatures, eight to a block, at which the residue of plans is worked out. At one temperature the error left over is
/// <c>ρ(x) = Σ_j ψ_j(x) c_j</c> with four random numbers <c>c_j</c>, whatever the pressure: their means and covariances, <see cref="ShapeMoments"/>,
/// serve all pressures at once.
/// </summary>
internal sealed class PlaceGrid
{
    private const int Lanes = 8;
    private readonly SearchTables tables;
    private readonly Vector512<double>[] taus;
    private readonly Vector512<double>[] starts;

    public PlaceGrid(SearchTables tables, IReadOnlyList<double> reducedTemperatures)
    {
        this.tables = tables;
        Blocks = (reducedTemperatures.Count + Lanes - 1) / Lanes;
        taus = Pack(reducedTemperatures);
        starts = new Vector512<double>[Blocks * tables.Rows.Length * PressureShapes.Count];
        for (int row = 0; row < tables.Rows.Length; row++)
            for (int shape = 0; shape < PressureShapes.Count; shape++)
            {
                Vector512<double>[] values = Pack([.. reducedTemperatures.Select(tau => tables.RowAt(row, (PressureShape)shape, tau))]);
                for (int block = 0; block < Blocks; block++)
                    starts[(((block * tables.Rows.Length) + row) * PressureShapes.Count) + shape] = values[block];
            }
    }

    /// <summary>How many blocks of eight temperatures there are.</summary>
    public int Blocks { get; }

    /// <summary>Numbers in blocks of eight; the last one is repeated to fill its block, which changes no minimum.</summary>
    public static Vector512<double>[] Pack(IReadOnlyList<double> values)
    {
        var blocks = new Vector512<double>[(values.Count + Lanes - 1) / Lanes];
        for (int b = 0; b < blocks.Length; b++)
            blocks[b] = Vector512.Create([.. Enumerable.Range(b * Lanes, Lanes).Select(i => values[Math.Min(i, values.Count - 1)])]);
        return blocks;
    }

    /// <summary>Means and covariances of what a fitted plan leaves at the eight temperatures of a block.</summary>
    public void Moments(PlanFit fit, int block, ref ShapeMoments moments)
    {
        Vector512<double> tau = taus[block];
        ReadOnlySpan<double> map = fit.Map;
        ReadOnlySpan<Vector512<double>> start = starts.AsSpan(block * tables.Rows.Length * PressureShapes.Count);
        int lots = tables.WithinRows, mean = lots + tables.LotRows, noise = mean + 1, columns = fit.Form.Columns;
        moments.Clear();
        for (int r = 0; r < fit.RowCount; r++)
        {
            ShapeVector left = r < noise
                ? new ShapeVector(start[4 * r], start[(4 * r) + 1], start[(4 * r) + 2], start[(4 * r) + 3])
                : default;
            left = left.Less(map.Slice(r * columns, columns), fit.Form, tau);
            if (r == mean)
                moments.Mean = left;
            else if (r >= lots && r < mean)
                moments.Lots.Add(left);
            else
                moments.Within.Add(left);
        }
    }
}

/// <summary>One number for each pressure shape, at eight temperatures.</summary>
internal readonly struct ShapeVector(Vector512<double> zero, Vector512<double> span, Vector512<double> bow, Vector512<double> sShape)
{
    /// <summary>Of the shape <c>ψ0</c>.</summary>
    public readonly Vector512<double> Zero = zero;

    /// <summary>Of the shape <c>ψ1</c>.</summary>
    public readonly Vector512<double> Span = span;

    /// <summary>Of the shape <c>ψ2</c>.</summary>
    public readonly Vector512<double> Bow = bow;

    /// <summary>Of the shape <c>ψ3</c>.</summary>
    public readonly Vector512<double> SShape = sShape;

    /// <summary>What is left when the correction is taken away; its polynomials in <paramref name="tau"/> by Horner's rule.</summary>
    public ShapeVector Less(ReadOnlySpan<double> coefficients, CorrectionForm form, Vector512<double> tau)
    {
        int span = form.ZeroDegree + 1, bow = span + form.SpanDegree + 1, sShape = bow + (form.HasBow ? 1 : 0);
        return new ShapeVector(
            Zero - Horner(coefficients[..span], tau),
            Span - Horner(coefficients[span..bow], tau),
            form.HasBow ? Bow - Vector512.Create(coefficients[bow]) : Bow,
            form.HasSShape ? SShape - Vector512.Create(coefficients[sShape]) : SShape);
    }

    private static Vector512<double> Horner(ReadOnlySpan<double> coefficients, Vector512<double> tau)
    {
        var sum = Vector512.Create(coefficients[^1]);
        for (int k = coefficients.Length - 2; k >= 0; k--)
            sum = Vector512.FusedMultiplyAdd(sum, tau, Vector512.Create(coefficients[k]));
        return sum;
    }
}

/// <summary>Means and covariances of the four shapes at eight temperatures.</summary>
internal struct ShapeMoments
{
    /// <summary>Means.</summary>
    public ShapeVector Mean;

    /// <summary>Covariances within a lot, carried noise included.</summary>
    public ShapeCovariance Within;

    /// <summary>Covariances of the lots.</summary>
    public ShapeCovariance Lots;

    /// <summary>Sets everything to zero.</summary>
    public void Clear() => this = default;
}
