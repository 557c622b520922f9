using System.Runtime.Intrinsics;

namespace BandSpec.Core.Planning;

/// <summary>
/// A good plan found quickly and without proof: from evenly spread temperatures, one temperature at a time is moved as long as the margin
/// grows. Always the same plan, whatever the number of threads; searches begin with it, and end with it when they are ended at once.
/// </summary>
internal sealed class PlanAscent(SearchTables tables, MarginScore margin, RmsScore rms)
{
    private static readonly int[] Moves = [-4, -2, -1, 1, 2, 4];
    private readonly PlanFit fit = new(tables);
    private int row;

    /// <summary>The best plan that any number of temperatures and any degrees lead to.</summary>
    public Contender Climb()
    {
        List<Contender> tops = [];
        foreach (int count in tables.Families.All.Select(f => f.Count).Distinct())
            foreach ((int zero, int span) in tables.Families.DegreesOf[count])
                if (Climb(count, zero, span) is { } top)
                    tops.Add(top);
        Contender best = Contest.Winner(tops, rmsFirst: false)
            ?? throw new InvalidOperationException("an application has at least one candidate plan that its readings determine");
        var batch = new PlanBatch(best.List.Length, tables.NearestIn(best.List));
        batch.Add(best.List);
        fit.Load(batch);
        fit.To(tables.RowsOf(best.Zero, best.Span));
        return best with { Rms = rms.Of(fit, double.PositiveInfinity)[0] };
    }

    /// <summary>The plan that evenly spread temperatures lead to.</summary>
    private Contender? Climb(int count, int zero, int span)
    {
        Contender? best = null;
        int[]? now = tables.Families.SpreadList(count);
        while (now is not null)
        {
            IReadOnlyList<int[]> near = [now, .. Neighbours(now)];
            now = null;
            foreach (Contender found in Score(near, zero, span))
                if (best is null || found.Margin > best.Margin + (1e-9 * Math.Abs(best.Margin)))
                {
                    best = found;
                    now = found.List;
                }
        }

        return best;
    }

    private IEnumerable<int[]> Neighbours(int[] list)
    {
        for (int i = 0; i < list.Length; i++)
            foreach (int move in Moves)
            {
                int[] moved = [.. list];
                moved[i] += move;
                if (tables.Families.Allows(moved))
                    yield return moved;
            }
    }

    private IEnumerable<Contender> Score(IEnumerable<int[]> lists, int zero, int span)
    {
        foreach (IGrouping<int, int[]> alike in lists.GroupBy(l => tables.NearestIn(l)))
            foreach (int[][] chunk in alike.Chunk(PlanBatch.Lanes))
            {
                var batch = new PlanBatch(chunk[0].Length, alike.Key);
                foreach (int[] list in chunk)
                    batch.Add(list);
                fit.Load(batch);
                Vector512<double> determined = fit.To(tables.RowsOf(zero, span));
                Vector512<double> score = margin.Of(fit, double.NegativeInfinity, ref row);
                for (int lane = 0; lane < batch.Count; lane++)
                    if (determined.AsInt64()[lane] != 0)
                        yield return new Contender(chunk[lane], zero, span, score[lane], double.PositiveInfinity);
            }
    }
}
