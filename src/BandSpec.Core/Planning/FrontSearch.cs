using BandSpec.Core.Bands;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.Planning;

/// <summary>
/// Walks up the cost levels and keeps the best plan of each that beats all cheaper ones. A plan that falls short between the nodes adds nodes,
/// which hold for all later levels too: nodes only lower margins, so what was beaten stays beaten.
/// </summary>
internal sealed class FrontSearch(PlanSearch search, CancellationToken cancellation)
{
    /// <summary>Cuts are made anew when the margin to beat has risen by this much; older ones hold as well, but discard less.</summary>
    private const double NewCuts = 1.02;

    private readonly List<NodePlace> added = [];
    private IReadOnlyList<ListGroup> groups = new CutMaking(search.Tables, []).Uncut();
    private double cutAt;

    /// <summary>The front of cost against margin.</summary>
    public IReadOnlyList<TradeoffPoint> ByMargin()
    {
        List<TradeoffPoint> front = [];
        double toBeat = double.NegativeInfinity;
        foreach (IReadOnlyList<PlanFamily> level in search.Tables.Families.CostLevels())
        {
            CutFor(toBeat);
            if (BestOf(level, m => new Heat(m, Above(toBeat), rmsFirst: false), everywhere => everywhere >= Above(toBeat)) is not { } point)
                continue;
            front.Add(point);
            toBeat = point.Margin;
        }

        return front;
    }

    /// <summary>The front of cost against rms error, over feasible plans.</summary>
    public IReadOnlyList<TradeoffPoint> ByRmsError()
    {
        (groups, cutAt) = (new CutMaking(search.Tables, added).CutAt(1, search.Threads), 1);
        List<TradeoffPoint> front = [];
        double toBeat = double.PositiveInfinity;
        foreach (IReadOnlyList<PlanFamily> level in search.Tables.Families.CostLevels())
        {
            double most = toBeat * (1 - Tie);
            if (BestOf(level, m => new Heat(m, 1, rmsFirst: true, most), everywhere => everywhere >= 1 - PlanChoosing.Shortfall) is not { } point)
                continue;
            front.Add(point);
            toBeat = point.RmsError;
        }

        return front;
    }

    private const double Tie = 1e-9;

    private static double Above(double margin) => double.IsInfinity(margin) ? margin : margin + (Tie * Math.Abs(margin));

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
            CompensationPlan plan = search.Tables.PlanOf(winner.List, winner.Zero, winner.Span);
            IReadOnlyList<ContinuousMargin> everywhere = ContinuousMargin.AllOf(search.Tables.Application, plan);
            double least = everywhere.Min(r => r.Margin);
            List<NodePlace> shortOf =
            [
                .. everywhere.Where(r => winner.Margin > 0 && r.Margin < winner.Margin * (1 - PlanChoosing.Shortfall)).Select(r => r.Worst).Where(p => !added.Contains(p)),
            ];
            if (shortOf.Count == 0 || (winner.Margin > 0 && isEnough(least) && heat(margin).RmsFirst))
                return new TradeoffPoint(plan, ChamberRun.Of(plan, search.Tables.Application.Station.Chamber).CostPerUnit, least, winner.Rms);
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
