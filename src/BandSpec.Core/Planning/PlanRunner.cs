using System.Runtime.Intrinsics;

namespace BandSpec.Core.Planning;

/// <summary>One thread's work in a heat: gathers lists into batches, fits and scores them in memory of its own.</summary>
internal sealed class PlanRunner
{
    private readonly SearchTables tables;
    private readonly RmsScore rms;
    private readonly Heat heat;
    private readonly PlanFit fit;
    private readonly PlanBatch[][] batches;
    private int row;
    private long plans;

    public PlanRunner(SearchTables tables, RmsScore rms, Heat heat)
    {
        (this.tables, this.rms, this.heat) = (tables, rms, heat);
        fit = new PlanFit(tables);
        int most = tables.Application.Requirement.Compensation.MostTemperatures;
        batches = [.. Enumerable.Range(0, most + 1).Select(n => Enumerable.Range(0, n).Select(i => new PlanBatch(n, i)).ToArray())];
    }

    /// <summary>Takes up the lists of a family with a second temperature, and decides all that fill a batch.</summary>
    /// <returns>How many plans were decided.</returns>
    public long Take(PlanFamily family, int second)
    {
        tables.Families.ForEachList(family, second, Add);
        return Decided();
    }

    /// <summary>Decides what is left over in batches that were not filled.</summary>
    /// <returns>How many plans were decided.</returns>
    public long Finish()
    {
        foreach (PlanBatch batch in batches.SelectMany(b => b).Where(b => b.Count > 0))
            Decide(batch);
        return Decided();
    }

    private void Add(int[] list)
    {
        PlanBatch batch = batches[list.Length][tables.NearestIn(list)];
        batch.Add(list);
        if (batch.IsFull)
            Decide(batch);
    }

    private void Decide(PlanBatch batch)
    {
        fit.Load(batch);
        foreach ((int zero, int span) in tables.Families.DegreesOf[batch.Temperatures])
        {
            plans += batch.Count;
            Vector512<double> determined = fit.To(tables.RowsOf(zero, span));
            Vector512<double> least = Vector512.Create(heat.LeastMargin);
            Vector512<double> margin = heat.Margin.Of(fit, least[0], ref row);
            Vector512<double> passes = Vector512.GreaterThanOrEqual(margin, least) & determined;
            if (passes != Vector512<double>.Zero)
                Enter(batch, zero, span, passes, margin);
        }

        batch.Clear();
    }

    private void Enter(PlanBatch batch, int zero, int span, Vector512<double> passes, Vector512<double> margin)
    {
        Vector512<double> error = rms.Of(fit, heat.MostRms);
        for (int lane = 0; lane < batch.Count; lane++)
            if (passes.AsInt64()[lane] != 0 && error[lane] <= heat.MostRms)
                heat.Enter(new Contender([.. batch[lane]], zero, span, margin[lane], error[lane]));
    }

    private long Decided()
    {
        long decided = plans;
        plans = 0;
        return decided;
    }
}
