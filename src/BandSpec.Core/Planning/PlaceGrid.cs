using System.Runtime.Intrinsics;
using BandSpec.Core.Requirements;
using BandSpec.Core.Residuals;

namespace BandSpec.Core.Planning;

/// <summary>
/// A list of temperatures at which the residue of plans is worked out. At one temperature the error left over is
/// <c>ρ(x) = Σ_j ψ_j(x) c_j</c> with four random numbers <c>c_j</c>, whatever the pressure: their means and covariances,
/// <see cref="ShapeMoments"/>, serve all pressures at once.
/// </summary>
internal sealed class PlaceGrid
{
    private readonly double[] scaled;
    private readonly double[][] starts;

    public PlaceGrid(SearchTables tables, IReadOnlyList<ScaledTemperature> places)
    {
        scaled = [.. places.Select(p => p.Scaled)];
        starts = [.. tables.Forms.OrderBy(f => f.Index).Select(f => StartsOf(f, places))];
    }

    /// <summary>How many temperatures there are.</summary>
    public int Count => scaled.Length;

    /// <summary>Means and covariances of what eight fitted plans leave at a temperature.</summary>
    public void Moments(PlanFit fit, int place, ref ShapeMoments moments)
    {
        LeftoverRows rows = fit.Rows;
        var at = Vector512.Create(scaled[place]);
        ReadOnlySpan<double> start = starts[rows.Index].AsSpan(place * rows.Count * PressureShapes.Count);
        int lots = rows.WithinCount, mean = rows.Count - 1;
        moments = default;
        for (int r = 0; r < rows.Count; r++)
        {
            var left = ShapeVector.Left(start.Slice(r * PressureShapes.Count, PressureShapes.Count), fit.Coefficients(r), rows.Form, at);
            if (r == mean)
                moments.Mean = left;
            else if (r >= lots)
                moments.Lots.Add(left);
            else
                moments.Within.Add(left);
        }

        fit.Noise.AddTo(ref moments.Within, at);
    }

    private static double[] StartsOf(LeftoverRows rows, IReadOnlyList<ScaledTemperature> places) =>
    [
        .. from place in places
           from row in Enumerable.Range(0, rows.Count)
           from shape in Enum.GetValues<PressureShape>()
           select rows.At(row, shape, place.Tau),
    ];
}

/// <summary>Means and covariances of the four shapes at one temperature, for eight plans.</summary>
internal struct ShapeMoments
{
    /// <summary>Means.</summary>
    public ShapeVector Mean;

    /// <summary>Covariances within a lot, carried noise included.</summary>
    public ShapeCovariance Within;

    /// <summary>Covariances of the lots.</summary>
    public ShapeCovariance Lots;
}
