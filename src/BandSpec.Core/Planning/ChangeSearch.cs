using BandSpec.Core.Bands;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.Planning;

/// <summary>
/// Finds the smallest change of one figure that makes a requirement feasible. Plans met on the way tell cheaply how far they need the change;
/// that no candidate plan does with one step less is proven by a search of all of them.
/// </summary>
internal sealed class ChangeSearch
{
    private readonly PossibleChange change;
    private readonly List<CompensationPlan> known;

    private ChangeSearch(PossibleChange change, IEnumerable<CompensationPlan> known) => (this.change, this.known) = (change, [.. known]);

    /// <summary>The smallest change of every kind.</summary>
    public static IReadOnlyList<SingleChange> AllOf(Application application, BandMap bands, PlanChoice optimum) =>
    [
        .. new PossibleChanges(application).All(bands.Worst.Temperature).Select(c => new ChangeSearch(c, [optimum.Plan]).Find()),
    ];

    private SingleChange Find()
    {
        int fails = 0, suffices = LeastForKnown(change.Steps);
        if (suffices > change.Steps && (change.Steps == 0 || !IsFeasibleAfter(change.Steps)))
            return Answer(null);
        suffices = Math.Min(LeastForKnown(change.Steps), change.Steps);
        bool isClose = true;
        while (suffices - fails > 1)
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

    private SingleChange Answer(int? steps) => new(
        change.Key, change.Region, change.Before, steps is { } s ? change.At(s) : null, change.At(change.Steps), Math.Abs(change.Step), change.Unit,
        steps is { } found ? known.LastOrDefault(p => Fits(p, found)) : null);

    /// <summary>The fewest steps, of at most a number, after which a known plan fits; more than that when none does.</summary>
    private int LeastForKnown(int most)
    {
        int best = most + 1;
        foreach (CompensationPlan plan in known.Where(p => Fits(p, most)))
        {
            int fails = -1, fits = Math.Min(best, most);
            if (!Fits(plan, fits))
                continue;
            while (fits - fails > 1)
            {
                int middle = (fits + fails) / 2;
                if (Fits(plan, middle))
                    fits = middle;
                else
                    fails = middle;
            }

            best = fits;
        }

        return best;
    }

    private bool IsFeasibleAfter(int steps)
    {
        if (known.Any(p => Fits(p, steps)))
            return true;
        if (change.After(steps) is not { } changed || PlanChoosing.Feasible(new PlanSearch(changed)) is not { } plan)
            return false;
        known.Add(plan);
        return true;
    }

    /// <summary>Whether a plan, with the pressures it has, is a candidate after the change and keeps every allowance.</summary>
    private bool Fits(CompensationPlan plan, int steps)
    {
        if (change.After(steps) is not { } changed)
            return false;
        OperatingTemperature range = changed.Requirement.Temperature;
        CompensationScope scope = changed.Requirement.Compensation;
        bool isCandidate = plan.Temperatures.Count <= scope.MostTemperatures
            && plan.Temperatures.All(CandidateTemperatures.Of(scope, range).Contains)
            && (plan.Temperatures[0] - range.Lower).Kelvin <= scope.Reach.Kelvin + 1e-9
            && (range.Upper - plan.Temperatures[^1]).Kelvin <= scope.Reach.Kelvin + 1e-9;
        return isCandidate && ContinuousMargin.AllOf(changed, plan).All(r => r.Margin >= 1 - PlanChoosing.Shortfall);
    }
}
