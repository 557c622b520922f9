using BandSpec.Core.Bands;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.Planning;

/// <summary>
/// Walks up the cost levels and keeps the best plan of each that beats all cheaper ones. A plan that falls short between the nodes adds nodes,
/// which hold for all later levels too: nodes only lower margins, so what was beaten stays beaten.
/// </summary>
internal sealed class FrontSearch(PlanSearch search, IProgress<SearchProgress>? progress, CancellationToken cancellation)
{
    /// <summary>Cuts are made anew when the margin to beat has risen by this much; older ones hold as well, but discard less.</summary>
    private const double NewCuts = 1.02;

    private readonly List<NodePlace> added = [];
    private IReadOnlyList<ListGroup> groups = new CutMaking(search.Tables, []).Uncut();
    private double cutAt;
    private long passed;

    /// <summary>The front of cost against margin.</summary>
    public Front ByMargin()
    {
        double toBeat = double.NegativeInfinity;
        return Walk(level =>
        {
            CutFor(toBeat);
            TradeoffPoint? point = BestOf(level, m => new Heat(m, Contest.TieAbove(toBeat), rmsFirst: false), everywhere => everywhere >= Contest.TieAbove(toBeat));
            toBeat = point?.Margin ?? toBeat;
            return point;
        });
    }

    /// <summary>The front of cost against rms error, over feasible plans.</summary>
    public Front ByRmsError()
    {
        if (!cancellation.IsCancellationRequested)
            (groups, cutAt) = (new CutMaking(search.Tables, added).CutAt(1, search.Threads), 1);
        double toBeat = double.PositiveInfinity;
        return Walk(level =>
        {
            double most = Contest.TieBelow(toBeat);
            TradeoffPoint? point = BestOf(
                level, m => new Heat(m, 1, rmsFirst: true, most), everywhere => everywhere >= 1 - PlanChoosing.Shortfall);
            toBeat = point?.RmsError ?? toBeat;
            return point;
        });
    }

    /// <summary>Up the cost levels; a level that the search was ended in does not count.</summary>
    private Front Walk(Func<IReadOnlyList<PlanFamily>, TradeoffPoint?> bestOf)
    {
        List<TradeoffPoint> points = [];
        PlanFamilies families = search.Tables.Families;
        double? completeTo = null;
        foreach (IReadOnlyList<PlanFamily> level in families.CostLevels())
        {
            TradeoffPoint? point = bestOf(level);
            if (cancellation.IsCancellationRequested)
                return new Front(points, completeTo, IsComplete: false);
            if (point is not null)
                points.Add(point);
            completeTo = ChamberRun.Cost(Duration.FromMinutes(level[0].Minutes), search.Tables.Application.Station.Chamber);
            passed += level.Sum(f => families.ListsIn(f) * families.DegreesOf[f.Count].Count);
            progress?.Report(new SearchProgress(passed, 2 * search.PlanCount));
        }

        return new Front(points, completeTo, IsComplete: true);
    }

    /// <summary>The best plan of a level that keeps what it was chosen for at every place; nothing when none does.</summary>
    private TradeoffPoint? BestOf(IReadOnlyList<PlanFamily> level, Func<MarginScore, Heat> heat, Func<double, bool> isEnough)
    {
        Shortlist? shortlist = null;
        while (!cancellation.IsCancellationRequested)
        {
            var margin = new MarginScore(search.Tables, added);
            Contender? winner = shortlist?.WinnerOver(search.Tables, margin);
            if (winner is null)
            {
                Heat run = heat(margin);
                winner = search.Best(level, groups, run, cancellation);
                shortlist = run.Shortlist(cutAt);
            }

            if (winner is null || cancellation.IsCancellationRequested)
                return null;
            CompensationPlan plan = search.Tables.PlanOf(winner);
            IReadOnlyList<ContinuousMargin> everywhere = ContinuousMargin.AllOf(search.Tables.Application, plan);
            double least = everywhere.Min(r => r.Margin);
            List<NodePlace> shortOf =
            [
                .. everywhere.Where(r => winner.Margin > 0 && r.Margin < winner.Margin * (1 - PlanChoosing.Shortfall)).Select(r => r.Worst).Where(p => !added.Contains(p)),
            ];
            if (shortOf.Count == 0 || (winner.Margin > 0 && isEnough(least) && heat(margin).RmsFirst))
                return new TradeoffPoint(
                    plan, ChamberRun.Of(plan, search.Tables.Application.Station.Chamber).CostPerUnit, least, winner.Rms, Proven: winner.Margin > 0);
            added.AddRange(shortOf);
        }

        return null;
    }

    private void CutFor(double toBeat)
    {
        if (toBeat <= 0 || toBeat < cutAt * NewCuts)
            return;
        (groups, cutAt) = (new CutMaking(search.Tables, added).CutAt(toBeat, search.Threads), toBeat);
    }
}

/// <summary>A front as far as it is known.</summary>
/// <param name="Points">Its points, by rising cost.</param>
/// <param name="CompleteTo">The cost per unit up to which none is missing; nothing when not even the cheapest plans were looked at.</param>
/// <param name="IsComplete">Whether none is missing at all.</param>
internal sealed record Front(IReadOnlyList<TradeoffPoint> Points, double? CompleteTo, bool IsComplete);
