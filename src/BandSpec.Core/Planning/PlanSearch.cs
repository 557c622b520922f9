using BandSpec.Core.Bands;
using BandSpec.Core.Requirements;

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
    private const double Feasible = 1;
    private readonly IProgress<SearchProgress>? progress;
    private readonly int threads;
    private long done;

    /// <summary>Prepares the searches of an application.</summary>
    /// <param name="application">The application.</param>
    /// <param name="progress">Is told how far the search has come; may be <see langword="null"/>.</param>
    /// <param name="threads">How many threads may be used; −1 for one a processor.</param>
    public PlanSearch(Application application, IProgress<SearchProgress>? progress = null, int threads = -1)
    {
        Tables = new SearchTables(application);
        Rms = new RmsScore(Tables);
        PlanCount = Tables.Families.PlanCount();
        (this.progress, this.threads) = (progress, threads);
    }

    /// <summary>What is known of the application.</summary>
    public SearchTables Tables { get; }

    /// <summary>The score by rms error.</summary>
    public RmsScore Rms { get; }

    /// <summary>How many candidate plans there are.</summary>
    public long PlanCount { get; }

    /// <summary>The best plan by an objective; when none is feasible, the one that comes nearest.</summary>
    /// <param name="objective">The objective.</param>
    /// <param name="added">Nodes that are judged beside the design nodes.</param>
    /// <param name="cancellation">Ends the search early; the best plan met so far is then returned.</param>
    public SearchAnswer Run(PlanObjective objective, IReadOnlyList<NodePlace> added, CancellationToken cancellation = default)
    {
        var margin = new MarginScore(Tables, added);
        done = 0;
        Contender? winner = objective switch
        {
            PlanObjective.LeastCost => Cheapest(margin, cancellation),
            PlanObjective.LeastError => Best(Tables.Families.All, new Heat(margin, Feasible, rmsFirst: true), cancellation),
            _ => null,
        };
        if (!cancellation.IsCancellationRequested)
            winner ??= Best(Tables.Families.All, new Heat(margin, double.NegativeInfinity, rmsFirst: false), cancellation);
        winner ??= new PlanAscent(Tables, margin, Rms).Climb();
        return new SearchAnswer(winner, Interlocked.Read(ref done), !cancellation.IsCancellationRequested);
    }

    /// <summary>The cheapest feasible plan: the first cost level, from the cheapest up, that has one.</summary>
    private Contender? Cheapest(MarginScore margin, CancellationToken cancellation)
    {
        foreach (IReadOnlyList<PlanFamily> level in Tables.Families.CostLevels())
        {
            Contender? winner = Best(level, new Heat(margin, Feasible, rmsFirst: false), cancellation);
            if (winner is not null || cancellation.IsCancellationRequested)
                return winner;
        }

        return null;
    }

    /// <summary>
    /// The best plan of some families, shared out over the processors by family and second temperature; the best of those looked at when
    /// the search is ended early.
    /// </summary>
    private Contender? Best(IReadOnlyList<PlanFamily> families, Heat heat, CancellationToken cancellation)
    {
        IEnumerable<(PlanFamily Family, int Second)> shares = families.SelectMany(f => Tables.Families.SecondsOf(f).Select(s => (f, s)));
        try
        {
            Parallel.ForEach(
                shares,
                new ParallelOptions { CancellationToken = cancellation, MaxDegreeOfParallelism = threads },
                () => new PlanRunner(Tables, Rms, heat),
                (share, _, runner) => Take(runner, share.Family, share.Second),
                runner => Report(runner.Finish()));
        }
        catch (OperationCanceledException)
        {
            // What has been found so far is the answer; the caller marks it as not proven.
        }

        return Contest.Winner(heat.Contenders, heat.RmsFirst);
    }

    private PlanRunner Take(PlanRunner runner, PlanFamily family, int second)
    {
        Report(runner.Take(family, second));
        return runner;
    }

    private void Report(long plans)
    {
        long now = Interlocked.Add(ref done, plans);
        progress?.Report(new SearchProgress(now, PlanCount));
    }
}

/// <summary>What a search has found.</summary>
/// <param name="Winner">The best plan.</param>
/// <param name="Decided">How many plans were decided one by one.</param>
/// <param name="Proven">Whether no candidate plan is better.</param>
internal sealed record SearchAnswer(Contender Winner, long Decided, bool Proven);
