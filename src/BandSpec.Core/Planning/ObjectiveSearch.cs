using BandSpec.Core.Bands;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.Planning;

/// <summary>The way to the best plan by each objective, over one set of nodes.</summary>
internal sealed class ObjectiveSearch
{
    private const double Enough = 1;

    /// <summary>After so many plans in cost levels without a feasible one, making cuts pays.</summary>
    private const long ManyPlans = 20_000;

    private readonly PlanSearch search;
    private readonly CancellationToken cancellation;
    private readonly MarginScore margin;
    private readonly CutMaking cuts;
    private readonly Lazy<Contender> start;

    public ObjectiveSearch(PlanSearch search, IReadOnlyList<NodePlace> added, CancellationToken cancellation)
    {
        (this.search, this.cancellation) = (search, cancellation);
        margin = new MarginScore(search.Tables, added);
        cuts = new CutMaking(search.Tables, added);
        start = new Lazy<Contender>(() => new PlanAscent(search.Tables, margin, search.Rms).Climb());
    }

    /// <summary>The plans in the running when the search that decided had ended; nothing before.</summary>
    public Shortlist? Shortlist { get; private set; }

    /// <summary>The plan that searches begin with, found by climbing.</summary>
    public Contender Start => start.Value;

    private PlanFamilies Families => search.Tables.Families;

    /// <summary>The best plan by an objective; when none is feasible, the one of largest margin.</summary>
    public Contender Best(PlanObjective objective) => objective switch
    {
        PlanObjective.LeastCost => Cheapest(),
        PlanObjective.LeastError => LeastError(),
        _ => MostMargin(),
    };

    /// <summary>The feasible plan of largest margin; nothing when there is none. Sooner done than the largest margin of all.</summary>
    public Contender? Feasible()
    {
        var heat = new Heat(margin, Enough, rmsFirst: false);
        heat.Enter(start.Value);
        return Run(heat, Math.Max(Enough, Contest.Below(start.Value.Margin, Heat.Reserve)));
    }

    /// <summary>The best of all plans by margin, whether feasible or not; begins with a plan found by climbing, which most plans cannot reach.</summary>
    private Contender MostMargin()
    {
        var heat = new Heat(margin, double.NegativeInfinity, rmsFirst: false);
        heat.Enter(start.Value);
        return Run(heat, Contest.Below(start.Value.Margin, Heat.Reserve)) ?? start.Value;
    }

    private Contender LeastError()
    {
        Contender best = BestKnown();
        if (best.Margin < Enough)
            return best;
        var heat = new Heat(margin, Enough, rmsFirst: true);
        heat.Enter(best);
        return Run(heat, Enough) ?? best;
    }

    /// <summary>A feasible plan, if climbing finds one; otherwise the best of all by margin, which tells whether there is any.</summary>
    private Contender BestKnown() => start.Value.Margin >= Enough ? start.Value : MostMargin();

    /// <summary>
    /// The cheapest feasible plan: of the first cost level, from the cheapest up, that has one. After many plans without one it is found out
    /// first whether there is any, and cuts are made.
    /// </summary>
    private Contender Cheapest()
    {
        IReadOnlyList<ListGroup> groups = cuts.Uncut();
        long passed = 0;
        foreach (IReadOnlyList<PlanFamily> level in Families.CostLevels())
        {
            if (passed >= ManyPlans)
            {
                if (BestKnown() is { Margin: < Enough } nearest)
                    return nearest;
                groups = cuts.CutAt(Enough, search.Threads);
                passed = long.MinValue;
            }

            Contender? winner = Run(level, groups, new Heat(margin, Enough, rmsFirst: false), Enough);
            if (winner is not null || cancellation.IsCancellationRequested)
                return winner ?? start.Value;
            passed += level.Sum(f => Families.ListsIn(f) * Families.DegreesOf[f.Count].Count);
        }

        return passed >= 0 ? BestKnown() : start.Value;
    }

    /// <summary>A heat of all plans that cuts at a margin leave.</summary>
    private Contender? Run(Heat heat, double cutAt) => Run(Families.All, cuts.CutAt(cutAt, search.Threads), heat, cutAt);

    private Contender? Run(IReadOnlyList<PlanFamily> families, IReadOnlyList<ListGroup> groups, Heat heat, double cutAt)
    {
        Contender? winner = search.Best(families, groups, heat, cancellation);
        Shortlist = heat.Shortlist(cutAt);
        return winner;
    }
}
