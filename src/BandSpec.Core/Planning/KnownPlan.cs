using BandSpec.Core.Bands;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.Planning;

/// <summary>A plan met while a change was looked for: how far the change has to go for it to fit. Nothing is worked out twice.</summary>
/// <param name="change">The change.</param>
/// <param name="plan">The plan.</param>
internal sealed class KnownPlan(PossibleChange change, CompensationPlan plan)
{
    private const double Enough = 1 - PlanChoosing.Shortfall;

    private readonly Dictionary<int, bool> fits = [];

    /// <summary>The plan.</summary>
    public CompensationPlan Plan => plan;

    /// <summary>Whether the plan, with the pressures it has, is a candidate after some steps and keeps every allowance.</summary>
    public bool Fits(int steps)
    {
        if (!fits.TryGetValue(steps, out bool known))
            fits.Add(steps, known = MayFit(steps) && ContinuousMargin.AllOf(change.After(steps)!, plan).All(r => r.Margin >= Enough));
        return known;
    }

    /// <summary>
    /// The fewest steps, of at most a number, after which the plan fits; more than that when it does not. The nodes, much quicker asked, tell where to
    /// begin: mostly there or one step later it fits between them as well.
    /// </summary>
    public int Least(int most)
    {
        if (!Fits(most))
            return most + 1;
        int first = First(-1, most, MayFit);
        return Fits(first) ? first : First(first, most, Fits);
    }

    /// <summary>The first step from which something holds: not after <paramref name="fails"/>, but after <paramref name="holds"/>.</summary>
    private static int First(int fails, int holds, Func<int, bool> question)
    {
        if (holds > fails + 1 && question(fails + 1))
            return fails + 1;
        while (holds - fails > 1)
            (fails, holds) = question((fails + holds) / 2) ? (fails, (fails + holds) / 2) : ((fails + holds) / 2, holds);
        return holds;
    }

    /// <summary>Whether the plan is a candidate after some steps and keeps every allowance at the nodes.</summary>
    private bool MayFit(int steps)
    {
        if (change.After(steps) is not { } changed)
            return false;
        OperatingTemperature range = changed.Requirement.Temperature;
        CompensationScope scope = changed.Requirement.Compensation;
        bool isCandidate = plan.Temperatures.Count <= scope.MostTemperatures
            && plan.Temperatures.All(CandidateTemperatures.Of(scope, range).Contains)
            && (plan.Temperatures[0] - range.Lower).Kelvin <= scope.Reach.Kelvin + 1e-9
            && (range.Upper - plan.Temperatures[^1]).Kelvin <= scope.Reach.Kelvin + 1e-9;
        return isCandidate && BandMap.Of(changed, plan).Margin >= Enough;
    }
}
