using System.Runtime.Intrinsics;

namespace BandSpec.Core.Planning;

/// <summary>
/// The plans that were in the running when a heat ended: every plan of its families that reaches two bounds over the nodes of that heat.
/// Further nodes only lower margins and leave rms errors as they are, so over more nodes a plan that is not on the list still misses one of
/// the bounds: as long as a plan on the list keeps both, the heat need not be run again.
/// </summary>
/// <param name="Plans">The plans.</param>
/// <param name="Needed">The margin a plan needs to win.</param>
/// <param name="LeastMargin">The least margin on the list.</param>
/// <param name="MostRms">The largest rms error on the list.</param>
/// <param name="RmsFirst">Whether the smallest rms comes before the largest margin.</param>
internal sealed record Shortlist(IReadOnlyList<Contender> Plans, double Needed, double LeastMargin, double MostRms, bool RmsFirst)
{
    /// <summary>The winner over more nodes; nothing when a plan that is not on the list might win.</summary>
    /// <param name="tables">What is known of the candidates.</param>
    /// <param name="margin">The score over all nodes.</param>
    public Contender? WinnerOver(SearchTables tables, MarginScore margin)
    {
        List<Contender> left = [.. Scored(tables, margin).Where(c => c.Margin >= Needed)];
        if (left.Count == 0)
            return null;
        bool isOnList = RmsFirst
            ? Contest.TieAbove(left.Min(c => c.Rms)) <= MostRms
            : Math.Max(Needed, Contest.TieBelow(left.Max(c => c.Margin))) >= LeastMargin;
        return isOnList ? Contest.Winner(left, RmsFirst) : null;
    }

    private IEnumerable<Contender> Scored(SearchTables tables, MarginScore margin)
    {
        var fit = new PlanFit(tables);
        int row = 0;
        foreach (IGrouping<(int Count, int Nearest, int Zero, int Span), Contender> alike in
            Plans.GroupBy(c => (c.List.Length, tables.NearestIn(c.List), c.Zero, c.Span)))
            foreach (Contender[] chunk in alike.Chunk(PlanBatch.Lanes))
            {
                var batch = new PlanBatch(alike.Key.Count, alike.Key.Nearest);
                foreach (Contender contender in chunk)
                    batch.Add(contender.List);
                fit.Load(batch);
                fit.To(tables.RowsOf(alike.Key.Zero, alike.Key.Span));
                Vector512<double> score = margin.Of(fit, double.NegativeInfinity, ref row);
                for (int lane = 0; lane < chunk.Length; lane++)
                    yield return chunk[lane] with { Margin = score[lane] };
            }
    }
}
