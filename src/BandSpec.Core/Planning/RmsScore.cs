using System.Runtime.Intrinsics;
using BandSpec.Core.Bands;
using BandSpec.Core.Quantities;

namespace BandSpec.Core.Planning;

/// <summary>Scores plans by their dwell-weighted rms error over the temperature profile.</summary>
internal sealed class RmsScore
{
    private readonly PlaceGrid grid;
    private readonly PressureNode[] nodes;
    private readonly double[] weights;
    private readonly double[] leastBeyond;

    public RmsScore(SearchTables tables)
    {
        List<(Temperature Temperature, int Region, double Weight)> places = [.. ProfilePoints.TemperaturesOf(tables.Application.Requirement)];
        grid = new PlaceGrid(tables, [.. places.Select(p => tables.PlaceOf(p.Temperature))]);
        nodes = PressureNode.AllOf(tables.Application);
        weights = [.. places.Select(p => p.Weight)];
        double floor = nodes.Select((n, i) => ProfilePoints.PressureWeight(i) * LeastAt(n)).Sum();
        leastBeyond = [.. places.Select((_, i) => floor * weights.Skip(i + 1).Sum())];
    }

    /// <summary>
    /// <c>√(mean of M² + σ_t²)</c> of eight fitted plans, %FS. It is left alone as soon as no plan can come to <paramref name="most"/>: what is
    /// still to come adds at least what a perfect correction would; then the result is infinite.
    /// </summary>
    /// <param name="fit">The fitted plans.</param>
    /// <param name="most">What a plan may have at most to be of interest.</param>
    public Vector512<double> Of(PlanFit fit, double most)
    {
        Vector512<double> sum = Vector512<double>.Zero;
        ShapeMoments moments = default;
        double limit = most * most;
        for (int place = 0; place < grid.Count; place++)
        {
            grid.Moments(fit, place, ref moments);
            sum = Vector512.FusedMultiplyAdd(Vector512.Create(weights[place]), MeanSquareAt(moments), sum);
            if (!Vector512.LessThanOrEqualAny(sum + Vector512.Create(leastBeyond[place]), Vector512.Create(limit)))
                return Vector512.Create(double.PositiveInfinity);
        }

        return Vector512.Sqrt(sum);
    }

    private Vector512<double> MeanSquareAt(in ShapeMoments moments)
    {
        Vector512<double> sum = Vector512<double>.Zero;
        for (int n = 0; n < nodes.Length; n++)
        {
            ref readonly PressureNode node = ref nodes[n];
            Vector512<double> added = node.AddedWith(moments.Mean.At(node.Shapes));
            Vector512<double> variance = moments.Within.At(node.Products) + moments.Lots.At(node.Products) + Vector512.Create(node.Variance);
            Vector512<double> square = Vector512.FusedMultiplyAdd(added, added, variance);
            sum = Vector512.FusedMultiplyAdd(Vector512.Create(ProfilePoints.PressureWeight(n)), square, sum);
        }

        return sum;
    }

    /// <summary>
    /// The least mean square at a pressure, whatever the correction: <c>max(|μ|, |μ + d|) ≥ |d|/2</c>, and no variance below the steady
    /// one. A part in 10⁹ is taken off for rounding.
    /// </summary>
    private static double LeastAt(PressureNode node)
    {
        double added = node.Added + (Math.Abs(node.Drift) / 2);
        return ((added * added) + node.Variance) * (1 - 1e-9);
    }
}
