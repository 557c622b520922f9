using BandSpec.Core.Requirements;
using BandSpec.Core.Residuals;

namespace BandSpec.Core.Planning;

/// <summary>How far a search has come.</summary>
/// <param name="Done">Plans decided so far.</param>
/// <param name="Total">Plans to be decided at most; a search may end early with a proof.</param>
public readonly record struct SearchProgress(long Done, long Total);

/// <summary>
/// Finds the best plan among all candidates and proves it, by looking at every plan that could be better: whole cost levels in rising order
/// for the cheapest, everything for the other objectives. The answer does not depend on the number of threads.
/// </summary>
internal sealed class PlanSearch
{
    private readonly SearchTables tables;
    private readonly MarginScore margin;
    private readonly RmsScore rms;
    private readonly IProgress<SearchProgress>? progress;
    private readonly long total;
    private long done;

    public PlanSearch(Application application, IProgress<SearchProgress>? progress)
    {
        tables = new SearchTables(application);
        margin = new MarginScore(tables);
        rms = new RmsScore(tables);
        total = tables.Families.PlanCount();
        this.progress = progress;
    }

    /// <summary>How many candidate plans there are.</summary>
    public long PlanCount => total;

    /// <summary>The best plan by the requirement's objective; when none is feasible, the one that comes nearest.</summary>
    public PlanChoice Run(CancellationToken cancellation)
    {
        PlanObjective objective = tables.Application.Requirement.Compensation.Objective;
        Contender? winner = objective switch
        {
            PlanObjective.LeastCost => Cheapest(cancellation),
            PlanObjective.LeastError => Best(tables.Families.All, new Heat(Feasible, RmsFirst: true), cancellation),
            _ => null,
        };
        winner ??= Best(tables.Families.All, new Heat(double.NegativeInfinity, RmsFirst: false), cancellation)
            ?? throw new InvalidOperationException("an application has at least one candidate plan that its readings determine");
        CompensationPlan plan = tables.PlanOf(winner.List, winner.Zero, winner.Span);
        return new PlanChoice(plan, ChamberRun.Of(plan, tables.Application.Station.Chamber), total, Proven: true);
    }

    private const double Feasible = 1;

    /// <summary>The cheapest feasible plan: the first cost level, from the cheapest up, that has one.</summary>
    private Contender? Cheapest(CancellationToken cancellation)
    {
        IReadOnlyList<PlanFamily> families = tables.Families.All;
        for (int begin = 0, end; begin < families.Count; begin = end)
        {
            end = begin + 1;
            while (end < families.Count && families[end].Minutes <= Contest.TieAbove(families[begin].Minutes))
                end++;
            Contender? winner = Best([.. families.Skip(begin).Take(end - begin)], new Heat(Feasible, RmsFirst: false), cancellation);
            if (winner is not null)
                return winner;
        }

        return null;
    }

    /// <summary>The best plan of some families, shared out over all processors by family and second temperature.</summary>
    private Contender? Best(IReadOnlyList<PlanFamily> families, Heat heat, CancellationToken cancellation)
    {
        IEnumerable<(PlanFamily Family, int Second)> shares = families.SelectMany(f => tables.Families.SecondsOf(f).Select(s => (f, s)));
        Parallel.ForEach(
            shares,
            new ParallelOptions { CancellationToken = cancellation },
            () => new Runner(this, heat),
            (share, _, runner) => runner.Take(share.Family, share.Second),
            runner => runner.HandIn());
        return Contest.Winner(heat.Contenders, heat.RmsFirst);
    }

    private void Report(long plans)
    {
        long now = Interlocked.Add(ref done, plans);
        progress?.Report(new SearchProgress(now, total));
    }

    /// <summary>One run over some families: what a plan must reach, and who has reached it.</summary>
    private sealed class Heat(double least, bool RmsFirst)
    {
        private readonly Lock gate = new();
        private double bestMargin = double.NegativeInfinity;
        private double bestRms = double.PositiveInfinity;

        public List<Contender> Contenders { get; } = [];

        public bool RmsFirst { get; } = RmsFirst;

        /// <summary>A margin below this is out: not feasible, or beaten by more than a tie.</summary>
        public double LeastMargin => RmsFirst ? least : Math.Max(least, Contest.TieBelow(Volatile.Read(ref bestMargin)));

        /// <summary>An rms above this is out.</summary>
        public double MostRms => RmsFirst ? Contest.TieAbove(Volatile.Read(ref bestRms)) : double.PositiveInfinity;

        public void Enter(Contender contender)
        {
            lock (gate)
            {
                if (contender.Margin < LeastMargin || contender.Rms > MostRms)
                    return;
                bestMargin = Math.Max(bestMargin, contender.Margin);
                bestRms = Math.Min(bestRms, contender.Rms);
                Contenders.RemoveAll(c => c.Margin < LeastMargin || c.Rms > MostRms);
                Contenders.Add(contender);
            }
        }
    }

    /// <summary>One thread's work: fits and scores plans in memory of its own.</summary>
    private sealed class Runner(PlanSearch search, Heat heat)
    {
        private readonly PlanFit fit = new(search.tables);
        private int block;
        private long plans;

        public Runner Take(PlanFamily family, int second)
        {
            search.tables.Families.ForEachList(family, second, list => Try(list, family.Count));
            HandIn();
            return this;
        }

        public void HandIn()
        {
            search.Report(plans);
            plans = 0;
        }

        private void Try(int[] list, int temperatures)
        {
            foreach ((int zero, int span) in search.tables.Families.DegreesOf[temperatures])
            {
                plans++;
                if (!fit.To(list, CorrectionForm.For(search.tables.Application.Station, zero, span)))
                    continue;
                double least = heat.LeastMargin;
                double margin = search.margin.Of(fit, least, ref block);
                if (margin < least)
                    continue;
                double rms = search.rms.Of(fit);
                if (rms <= heat.MostRms)
                    heat.Enter(new Contender([.. list], zero, span, margin, rms));
            }
        }
    }
}
