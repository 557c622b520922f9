using BandSpec.Core.Bands;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.Planning;

/// <summary>
/// Finds the smallest change of one figure that makes a requirement feasible. What no correction can beat says cheaply where there is no hope;
/// plans met on the way tell how far they need the change; that no candidate plan does with one step less is proven by a search of all of them.
/// </summary>
internal sealed class ChangeSearch
{
    private readonly PossibleChange change;
    private readonly List<KnownPlan> known;

    private readonly CancellationToken cancellation;

    private ChangeSearch(PossibleChange change, CompensationPlan known, CancellationToken cancellation) =>
        (this.change, this.known, this.cancellation) = (change, [new KnownPlan(change, known)], cancellation);

    /// <summary>The smallest change of every kind, side by side; only those that were found when the search is ended early.</summary>
    public static (IReadOnlyList<SingleChange> Found, bool IsComplete) AllOf(
        Application application, BandMap bands, PlanChoice optimum, IProgress<SearchProgress>? progress, CancellationToken cancellation)
    {
        PossibleChange[] possible = [.. new PossibleChanges(application).All(bands.Worst.Temperature)];
        var found = new SingleChange?[possible.Length];
        int done = 0;
        Parallel.For(0, possible.Length, i =>
        {
            found[i] = new ChangeSearch(possible[i], optimum.Plan, cancellation).Find();
            progress?.Report(new SearchProgress(Interlocked.Increment(ref done), possible.Length, OfChanges: true));
        });
        return ([.. found.OfType<SingleChange>()], found.All(change => change is not null));
    }

    /// <summary>The change; nothing when the search is ended early.</summary>
    private SingleChange? Find()
    {
        SingleChange found = Search();
        return cancellation.IsCancellationRequested ? null : found;
    }

    private SingleChange Search()
    {
        if (change.Steps == 0 || !MayFit(change.Steps))
            return Answer(null);
        int suffices = LeastForKnown(change.Steps);
        if (suffices > change.Steps && !IsFeasibleAfter(change.Steps))
            return Answer(null);
        int fails = LastWithoutHope();
        suffices = Math.Min(LeastForKnown(change.Steps), change.Steps);
        bool isClose = true;
        while (suffices - fails > 1 && !cancellation.IsCancellationRequested)
        {
            // The step just short of what the known plans need decides most often; where it does not, halving is quicker.
            int next = isClose ? suffices - 1 : (fails + suffices) / 2;
            isClose = false;
            if (IsFeasibleAfter(next))
                suffices = Math.Min(next, LeastForKnown(next));
            else
                fails = next;
        }

        return Answer(suffices);
    }

    /// <summary>Whether what no correction can beat leaves a chance after some steps.</summary>
    private bool MayFit(int steps) => change.After(steps) is { } changed && BandFloor.Of(changed).Bound >= 1 - PlanChoosing.Shortfall;

    /// <summary>The most steps after which there is no chance for any plan; 0 when there is a chance after one, since nothing fits without a change.</summary>
    private int LastWithoutHope()
    {
        int hopeless = 0, hope = change.Steps;
        while (hope - hopeless > 1)
            (hopeless, hope) = MayFit((hopeless + hope) / 2) ? (hopeless, (hopeless + hope) / 2) : ((hopeless + hope) / 2, hope);
        return hopeless;
    }

    private SingleChange Answer(int? steps) => new(
        change.Key, change.Region, change.Before, steps is { } s ? change.At(s) : null, change.At(change.Steps), Math.Abs(change.Step), change.Unit,
        steps is { } found ? known.LastOrDefault(p => p.Fits(found))?.Plan : null);

    /// <summary>The fewest steps, of at most a number, after which a known plan fits; more than that when none does.</summary>
    private int LeastForKnown(int most) => known.Aggregate(most + 1, (best, plan) => Math.Min(best, plan.Least(Math.Min(best, most))));

    private bool IsFeasibleAfter(int steps)
    {
        if (known.Any(p => p.Fits(steps)))
            return true;
        if (change.After(steps) is not { } changed || PlanChoosing.Feasible(new PlanSearch(changed), cancellation) is not { } plan)
            return false;
        known.Add(new KnownPlan(change, plan));
        return true;
    }
}
