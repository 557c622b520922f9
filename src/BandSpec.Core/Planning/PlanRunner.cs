using System.Runtime.Intrinsics;

namespace BandSpec.Core.Planning;

/// <summary>One thread's work in a heat: gathers lists into batches, fits and scores them in memory of its own.</summary>
internal sealed class PlanRunner
{
    private readonly SearchTables tables;
    private readonly RmsScore rms;
    private readonly Heat heat;
    private readonly PlanFit fit;
    private readonly Dictionary<ListGroup, PlanBatch[]> batches = [];
    private int row;
    private SearchCount count;

    public PlanRunner(SearchTables tables, RmsScore rms, Heat heat)
    {
        (this.tables, this.rms, this.heat) = (tables, rms, heat);
        fit = new PlanFit(tables);
    }

    /// <summary>Takes up the lists of a share that no cut discards, and decides all that fill a batch.</summary>
    /// <returns>How many plans were decided and discarded.</returns>
    public SearchCount Take(ListGroup group, PlanFamily family, int second)
    {
        if (!batches.TryGetValue(group, out PlanBatch[]? own))
            batches.Add(group, own = [.. Enumerable.Range(0, family.Count).Select(i => new PlanBatch(family.Count, i))]);
        var walk = new ListWalk(tables, family, group, list => Add(list, group, own));
        walk.Through(second);
        count += new SearchCount(0, walk.Discarded);
        return Counted();
    }

    /// <summary>Decides what is left over in batches that were not filled.</summary>
    /// <returns>How many plans were decided and discarded.</returns>
    public SearchCount Finish()
    {
        foreach ((ListGroup group, PlanBatch[] own) in batches)
            foreach (PlanBatch batch in own.Where(b => b.Count > 0))
                Decide(batch, group);
        return Counted();
    }

    private void Add(int[] list, ListGroup group, PlanBatch[] own)
    {
        PlanBatch batch = own[tables.NearestIn(list)];
        batch.Add(list);
        if (batch.IsFull)
            Decide(batch, group);
    }

    private void Decide(PlanBatch batch, ListGroup group)
    {
        fit.Load(batch);
        count += new SearchCount(batch.Count, 0);
        Vector512<double> determined = fit.To(group.Rows);
        Vector512<double> least = Vector512.Create(heat.LeastMargin);
        Vector512<double> margin = heat.Margin.Of(fit, least[0], ref row);
        Vector512<double> passes = Vector512.GreaterThanOrEqual(margin, least) & determined;
        if (passes.AsInt64() != Vector512<long>.Zero)
            Enter(batch, group, passes, margin);
        batch.Clear();
    }

    private void Enter(PlanBatch batch, ListGroup group, Vector512<double> passes, Vector512<double> margin)
    {
        Vector512<double> error = rms.Of(fit, heat.MostRms);
        for (int lane = 0; lane < batch.Count; lane++)
            if (passes.AsInt64()[lane] != 0 && error[lane] <= heat.MostRms)
                heat.Enter(new Contender([.. batch[lane]], group.Form.Zero, group.Form.Span, margin[lane], error[lane]));
    }

    private SearchCount Counted()
    {
        SearchCount counted = count;
        count = default;
        return counted;
    }
}

/// <summary>How many plans a search has dealt with.</summary>
/// <param name="Decided">Decided one by one.</param>
/// <param name="Discarded">Discarded by cuts, in groups.</param>
internal readonly record struct SearchCount(long Decided, long Discarded)
{
    /// <summary>Both together.</summary>
    public static SearchCount operator +(SearchCount a, SearchCount b) => new(a.Decided + b.Decided, a.Discarded + b.Discarded);
}
