using System.Runtime.Intrinsics;
using BandSpec.Core.Bands;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.Planning;

/// <summary>
/// Scores plans by their margin over all nodes. Where even a unit without scatter would not fit, a plan is scored by the room it
/// lacks, in %FS and negative: a ratio to the scatter would there reward scatter.
/// </summary>
internal sealed class MarginScore
{
    private readonly IReadOnlyList<NodeRow> rows;
    private readonly PlaceGrid grid;
    private readonly double sampleFactor;
    private readonly double longRunFactor;

    public MarginScore(SearchTables tables, IReadOnlyList<NodePlace> added)
    {
        Requirement requirement = tables.Application.Requirement;
        rows = NodeRow.AllOf(tables.Application, added);
        grid = new PlaceGrid(tables, [.. rows.Select(r => tables.PlaceOf(r.Temperature))]);
        sampleFactor = 9 * requirement.Capability.Sample * requirement.Capability.Sample;
        longRunFactor = 9 * requirement.Capability.LongRun * requirement.Capability.LongRun;
    }

    /// <summary>
    /// The scores of eight plans; as soon as every plan has fallen below <paramref name="enough"/> the rest is left alone and what they have
    /// come to is returned.
    /// </summary>
    /// <param name="fit">The fitted plans.</param>
    /// <param name="enough">What a plan has to reach to be of interest.</param>
    /// <param name="first">The row of nodes to begin with; on return the row at which the last plan fell, if all did.</param>
    public Vector512<double> Of(PlanFit fit, double enough, ref int first)
    {
        var least = new LeastSoFar(Vector512.Create(double.PositiveInfinity), Vector512.Create(double.PositiveInfinity));
        ShapeMoments moments = default;
        for (int i = 0; i < grid.Count; i++)
        {
            int row = i == 0 ? first : i <= first ? i - 1 : i;
            grid.Moments(fit, row, ref moments);
            least = LeastIn(rows[row], moments, least);
            Vector512<double> score = least.Score();
            if (!Vector512.GreaterThanOrEqualAny(score, Vector512.Create(enough)))
            {
                first = row;
                return score;
            }
        }

        return least.Score();
    }

    private LeastSoFar LeastIn(NodeRow row, in ShapeMoments moments, LeastSoFar least)
    {
        (Vector512<double> leastRoom, Vector512<double> leastRatio) = least;
        for (int n = 0; n < row.Pressures.Length; n++)
        {
            ref readonly PressureNode node = ref row.Pressures[n];
            Vector512<double> room = Vector512.Create(row.Design[n]) - node.AddedWith(moments.Mean.At(node.Shapes));
            Vector512<double> within = moments.Within.At(node.Products) + Vector512.Create(node.Variance);
            Vector512<double> longRun = within + moments.Lots.At(node.Products);
            Vector512<double> needed = Vector512.Max(within * sampleFactor, longRun * longRunFactor);
            leastRoom = Vector512.Min(leastRoom, room);
            leastRatio = Vector512.Min(leastRatio, SquareRatio(room, needed));
        }

        return new LeastSoFar(leastRoom, leastRatio);
    }

    /// <summary><c>room²/needed</c>; without scatter there is no limit. Of no meaning where the room is negative.</summary>
    private static Vector512<double> SquareRatio(Vector512<double> room, Vector512<double> needed) => Vector512.ConditionalSelect(
        Vector512.Equals(needed, Vector512<double>.Zero), Vector512.Create(double.PositiveInfinity), room * room / needed);

    /// <summary>The least room and the least square of a margin met so far.</summary>
    private readonly record struct LeastSoFar(Vector512<double> Room, Vector512<double> Ratio)
    {
        public Vector512<double> Score() =>
            Vector512.ConditionalSelect(Vector512.LessThan(Room, Vector512<double>.Zero), Room, Vector512.Sqrt(Ratio));
    }
}
