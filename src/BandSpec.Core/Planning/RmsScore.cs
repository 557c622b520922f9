using System.Runtime.Intrinsics;
using BandSpec.Core.Bands;
using BandSpec.Core.Quantities;

namespace BandSpec.Core.Planning;

/// <summary>Scores plans by their dwell-weighted rms error over the temperature profile.</summary>
internal sealed class RmsScore
{
    private readonly PlaceGrid grid;
    private readonly PressureNode[] nodes;
    private readonly Vector512<double>[] weights;

    public RmsScore(SearchTables tables)
    {
        List<(Temperature Temperature, int Region, double Weight)> places = [.. ProfilePoints.TemperaturesOf(tables.Application.Requirement)];
        grid = new PlaceGrid(tables, [.. places.Select(p => tables.Reduced(p.Temperature))]);
        nodes = PressureNode.AllOf(tables.Application);
        IEnumerable<double> padding = Enumerable.Repeat(0.0, (grid.Blocks * Vector512<double>.Count) - places.Count);
        weights = PlaceGrid.Pack([.. places.Select(p => p.Weight), .. padding]);
    }

    /// <summary><c>√(mean of M² + σ_t²)</c> of a fitted plan, %FS.</summary>
    public double Of(PlanFit fit)
    {
        Vector512<double> sum = Vector512<double>.Zero;
        ShapeMoments moments = default;
        for (int block = 0; block < grid.Blocks; block++)
        {
            grid.Moments(fit, block, ref moments);
            for (int n = 0; n < nodes.Length; n++)
            {
                ref readonly PressureNode node = ref nodes[n];
                Vector512<double> added = node.AddedWith(node.Shapes.Mean(moments.Mean));
                Vector512<double> variance = moments.Within.At(node.Shapes) + moments.Lots.At(node.Shapes) + Vector512.Create(node.Variance);
                sum += weights[block] * ProfilePoints.PressureWeight(n) * ((added * added) + variance);
            }
        }

        double total = 0;
        for (int lane = 0; lane < Vector512<double>.Count; lane++)
            total += sum[lane];
        return Math.Sqrt(total);
    }
}
