using BandSpec.Core.Bands;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.Planning;

/// <summary>How far a search has come.</summary>
/// <param name="Done">Plans decided or discarded so far; changes found so far.</param>
/// <param name="Total">Plans or changes there are; a search of plans may end early with a proof.</param>
/// <param name="OfChanges">Whether changes are counted that would make a requirement feasible.</param>
public readonly record struct SearchProgress(long Done, long Total, bool OfChanges = false);

/// <summary>
/// The searches of one application. Each finds the best plan of some families and proves it: every plan is looked at, or discarded by a cut
/// that proves it not good enough. No result depends on the number of threads.
/// </summary>
internal sealed class PlanSearch
{
    private readonly IProgress<SearchProgress>? progress;
    private readonly Lock gate = new();
    private SearchCount count;

    /// <summary>Prepares the searches of an application.</summary>
    /// <param name="application">The application.</param>
    /// <param name="progress">Is told how far a search has come, from several threads; may be <see langword="null"/>.</param>
    /// <param name="threads">How many threads may be used; −1 for one a processor.</param>
    public PlanSearch(Application application, IProgress<SearchProgress>? progress = null, int threads = -1)
    {
        Tables = new SearchTables(application);
        Rms = new RmsScore(Tables);
        PlanCount = Tables.Families.PlanCount();
        (this.progress, Threads) = (progress, threads);
    }

    /// <summary>How many threads may be used; −1 for one a processor.</summary>
    public int Threads { get; }

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
        count = default;
        var search = new ObjectiveSearch(this, added, cancellation);
        Contender winner = search.Best(objective);
        return new SearchAnswer(winner, search.Shortlist, count, !cancellation.IsCancellationRequested);
    }

    /// <summary>The best plan when nodes have joined those of an earlier answer, from its shortlist if that decides.</summary>
    /// <param name="before">A proven answer by the same objective.</param>
    /// <param name="objective">The objective.</param>
    /// <param name="added">All nodes that are judged beside the design nodes, those of the earlier answer among them.</param>
    /// <param name="cancellation">Ends the search early; the best plan met so far is then returned.</param>
    public SearchAnswer RunAgain(SearchAnswer before, PlanObjective objective, IReadOnlyList<NodePlace> added, CancellationToken cancellation = default) =>
        before.Shortlist?.WinnerOver(Tables, new MarginScore(Tables, added)) is { } winner
            ? before with { Winner = winner }
            : Run(objective, added, cancellation);

    /// <summary>
    /// The best plan of some families in some groups, shared out over the processors by group, family and second temperature; the best of
    /// those looked at when the search is ended early.
    /// </summary>
    public Contender? Best(IReadOnlyList<PlanFamily> families, IReadOnlyList<ListGroup> groups, Heat heat, CancellationToken cancellation)
    {
        IEnumerable<(ListGroup Group, PlanFamily Family, int Second)> shares =
            from g in groups
            from f in families
            where f.Count == g.Form.Count
            from second in Tables.Families.SecondsOf(f)
            select (g, f, second);
        try
        {
            Parallel.ForEach(
                shares,
                new ParallelOptions { CancellationToken = cancellation, MaxDegreeOfParallelism = Threads },
                () => new PlanRunner(Tables, Rms, heat),
                (share, _, runner) => Take(runner, share.Group, share.Family, share.Second),
                runner => Report(runner.Finish()));
        }
        catch (OperationCanceledException)
        {
            // What has been found so far is the answer; the caller marks it as not proven.
        }

        return Contest.Winner(heat.Contenders, heat.RmsFirst);
    }

    private PlanRunner Take(PlanRunner runner, ListGroup group, PlanFamily family, int second)
    {
        Report(runner.Take(group, family, second));
        return runner;
    }

    private void Report(SearchCount more)
    {
        SearchCount now;
        lock (gate)
            now = count += more;
        progress?.Report(new SearchProgress(Math.Min(now.Decided + now.Discarded, PlanCount), PlanCount));
    }
}

/// <summary>What a search has found.</summary>
/// <param name="Winner">The best plan.</param>
/// <param name="Shortlist">The plans from which further nodes may choose another; nothing when a search was not run to its end.</param>
/// <param name="Count">How many plans were decided and discarded; a plan that was looked at twice counts twice.</param>
/// <param name="Proven">Whether no candidate plan is better.</param>
internal sealed record SearchAnswer(Contender Winner, Shortlist? Shortlist, SearchCount Count, bool Proven);
