using System.Runtime.Intrinsics;
using BandSpec.Core.Bands;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.Planning;

/// <summary>
/// Scores plans by their margin over all design nodes. Where even a unit without scatter would not fit, a node is scored by the room it
/// lacks, in %FS and negative: a ratio to the scatter would there reward scatter.
/// </summary>
internal sealed class MarginScore
{
    private readonly PlaceGrid grid;
    private readonly PressureNode[] nodes;
    private readonly Vector512<double>[] design;
    private readonly double sampleFactor;
    private readonly double longRunFactor;

    public MarginScore(SearchTables tables)
    {
        Requirement requirement = tables.Application.Requirement;
        List<(Temperature Temperature, int Region)> places =
        [
            .. requirement.AllowedError.SelectMany((region, r) => DesignNodes.TemperaturesOf(region).Select(t => (t, r))),
        ];
        grid = new PlaceGrid(tables, [.. places.Select(p => tables.Reduced(p.Temperature))]);
        nodes = PressureNode.AllOf(tables.Application);
        design = new Vector512<double>[grid.Blocks * nodes.Length];
        for (int n = 0; n < nodes.Length; n++)
            PlaceGrid.Pack([.. places.Select(p => DesignAt(requirement, p.Region, p.Temperature, nodes[n].Fraction))])
                .CopyTo(design, n * grid.Blocks);
        sampleFactor = 3 * requirement.Capability.Sample;
        longRunFactor = 3 * requirement.Capability.LongRun;
    }

    /// <summary>How many blocks of temperatures there are.</summary>
    public int Blocks => grid.Blocks;

    /// <summary>
    /// The plan's score; as soon as a block falls below <paramref name="enough"/> the rest is left alone and that block's score returned.
    /// </summary>
    /// <param name="fit">The fitted plan.</param>
    /// <param name="enough">What a plan has to reach to be of interest.</param>
    /// <param name="first">The block to begin with; on return the block that fell short, if one did.</param>
    public double Of(PlanFit fit, double enough, ref int first)
    {
        double least = double.PositiveInfinity;
        ShapeMoments moments = default;
        for (int i = 0; i < grid.Blocks; i++)
        {
            int block = i == 0 ? first : i <= first ? i - 1 : i;
            grid.Moments(fit, block, ref moments);
            least = Math.Min(least, LeastIn(block, moments));
            if (least < enough)
            {
                first = block;
                return least;
            }
        }

        return least;
    }

    private double LeastIn(int block, in ShapeMoments moments)
    {
        var least = Vector512.Create(double.PositiveInfinity);
        for (int n = 0; n < nodes.Length; n++)
        {
            ref readonly PressureNode node = ref nodes[n];
            Vector512<double> room = design[(n * grid.Blocks) + block] - node.AddedWith(node.Shapes.Mean(moments.Mean));
            Vector512<double> within = moments.Within.At(node.Shapes) + Vector512.Create(node.Variance);
            Vector512<double> longRun = within + moments.Lots.At(node.Shapes);
            Vector512<double> needed = Vector512.Sqrt(Vector512.Max(
                within * (sampleFactor * sampleFactor), longRun * (longRunFactor * longRunFactor)));
            least = Vector512.Min(least, Score(room, needed));
        }

        double smallest = least[0];
        for (int lane = 1; lane < Vector512<double>.Count; lane++)
            smallest = Math.Min(smallest, least[lane]);
        return smallest;
    }

    private static Vector512<double> Score(Vector512<double> room, Vector512<double> needed)
    {
        var infinite = Vector512.Create(double.PositiveInfinity);
        Vector512<double> margin = Vector512.ConditionalSelect(Vector512.Equals(needed, Vector512<double>.Zero), infinite, room / needed);
        return Vector512.ConditionalSelect(Vector512.LessThan(room, Vector512<double>.Zero), room, margin);
    }

    private static double DesignAt(Requirement requirement, int region, Temperature temperature, double fraction) =>
        requirement.AllowedError[region].At(temperature, requirement.Pressure.MagnitudeAt(fraction)) / requirement.SafetyFactor;
}
