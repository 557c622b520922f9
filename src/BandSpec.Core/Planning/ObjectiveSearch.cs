using BandSpec.Core.Bands;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.Planning;

/// <summary>The way to the best plan by each objective, over one set of nodes.</summary>
internal sealed class ObjectiveSearch
{
    private const double Feasible = 1;

    /// <summary>After so many plans in cost levels without a feasible one, making cuts pays.</summary>
    private const long ManyPlans = 20_000;

    private readonly PlanSearch search;
    private readonly CancellationToken cancellation;
    private readonly MarginScore margin;
    private readonly CutMaking cuts;
    private readonly Contender start;

    public ObjectiveSearch(PlanSearch search, IReadOnlyList<NodePlace> added, CancellationToken cancellation)
    {
        (this.search, this.cancellation) = (search, cancellation);
        margin = new MarginScore(search.Tables, added);
        cuts = new CutMaking(search.Tables, added);
        start = new PlanAscent(search.Tables, margin, search.Rms).Climb();
    }

    private PlanFamilies Families => search.Tables.Families;

    /// <summary>The best plan by an objective; when none is feasible, the one of largest margin.</summary>
    public Contender Best(PlanObjective objective) => objective switch
    {
        PlanObjective.LeastCost => Cheapest(),
        PlanObjective.LeastError => LeastError(),
        _ => MostMargin(),
    };

    /// <summary>The best of all plans by margin, whether feasible or not; begins with a plan found by climbing, which most plans cannot reach.</summary>
    private Contender MostMargin()
    {
        var heat = new Heat(margin, double.NegativeInfinity, rmsFirst: false);
        heat.Enter(start);
        return search.Best(Families.All, cuts.CutAt(Contest.TieBelow(start.Margin)), heat, cancellation) ?? start;
    }

    private Contender LeastError()
    {
        Contender best = BestKnown();
        if (best.Margin < Feasible)
            return best;
        var heat = new Heat(margin, Feasible, rmsFirst: true);
        heat.Enter(best);
        return search.Best(Families.All, cuts.CutAt(Feasible), heat, cancellation) ?? best;
    }

    /// <summary>A feasible plan, if climbing finds one; otherwise the best of all by margin, which tells whether there is any.</summary>
    private Contender BestKnown() => start.Margin >= Feasible ? start : MostMargin();

    /// <summary>The cheapest feasible plan: of the first cost level, from the cheapest up, that has one.</summary>
    private Contender Cheapest()
    {
        Contender best = BestKnown();
        if (best.Margin < Feasible)
            return best;
        IReadOnlyList<ListGroup> groups = cuts.Uncut();
        long passed = 0;
        bool areCut = false;
        foreach (IReadOnlyList<PlanFamily> level in Families.CostLevels())
        {
            Contender? winner = search.Best(level, groups, new Heat(margin, Feasible, rmsFirst: false), cancellation);
            if (winner is not null || cancellation.IsCancellationRequested)
                return winner ?? best;
            passed += level.Sum(f => Families.ListsIn(f) * Families.DegreesOf[f.Count].Count);
            if (areCut || passed < ManyPlans)
                continue;
            groups = cuts.CutAt(Feasible);
            areCut = true;
        }

        return best;
    }
}
