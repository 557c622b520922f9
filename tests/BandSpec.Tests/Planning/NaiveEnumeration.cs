using BandSpec.Core.Bands;
using BandSpec.Core.Planning;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;

namespace BandSpec.Tests.Planning;

/// <summary>The best plan by looking at every one of them with the plain formulas, written apart from the search.</summary>
internal static class NaiveEnumeration
{
    /// <summary>Every candidate plan with its figures at the design nodes.</summary>
    public static List<JudgedPlan> AllOf(Application application)
    {
        CompensationScope scope = application.Requirement.Compensation;
        Temperature[] candidates = [.. CandidateTemperatures.Of(scope, application.Requirement.Temperature)];
        List<JudgedPlan> plans = [];
        for (int mask = 0; mask < 1 << candidates.Length; mask++)
        {
            Temperature[] list = [.. candidates.Where((_, i) => (mask & (1 << i)) != 0)];
            if (list.Length >= scope.FewestTemperatures && list.Length <= scope.MostTemperatures && Fits(list, application.Requirement))
                plans.AddRange(DegreesOf(list.Length, application).Select(d => Judge(application, list, d.Zero, d.Span)));
        }

        return plans;
    }

    /// <summary>The best by the requirement's objective and the ties of the method; the largest margin when none is feasible.</summary>
    public static JudgedPlan Best(Application application, List<JudgedPlan> all)
    {
        List<JudgedPlan> left = [.. all.Where(p => p.Margin >= 1)];
        PlanObjective objective = application.Requirement.Compensation.Objective;
        if (left.Count == 0)
            left = [.. all];
        else if (objective == PlanObjective.LeastCost)
            left = Least(left, p => p.Minutes);
        else if (objective == PlanObjective.LeastError)
            left = Least(left, p => p.Rms);
        else
            left = [.. all];
        left = Least(Least(left, p => -p.Margin), p => p.Rms);
        return left.OrderBy(p => string.Join(" ", p.Plan.Temperatures.Select(t => (t.Celsius + 1000).ToString("0000.000"))))
            .ThenBy(p => p.Plan.ZeroDegree).ThenBy(p => p.Plan.SpanDegree).First();
    }

    private static List<JudgedPlan> Least(List<JudgedPlan> plans, Func<JudgedPlan, double> figure)
    {
        double least = plans.Min(figure);
        return [.. plans.Where(p => figure(p) <= least + (1e-9 * Math.Abs(least)))];
    }

    private static bool Fits(Temperature[] list, Requirement requirement)
    {
        CompensationScope scope = requirement.Compensation;
        return (list[0] - requirement.Temperature.Lower).Kelvin <= scope.Reach.Kelvin + 1e-9
            && (requirement.Temperature.Upper - list[^1]).Kelvin <= scope.Reach.Kelvin + 1e-9
            && list.Zip(list.Skip(1)).All(p => (p.Second - p.First).Kelvin >= scope.Separation.Kelvin - 1e-9);
    }

    private static IEnumerable<(int Zero, int Span)> DegreesOf(int count, Application application)
    {
        int zero = Math.Min(count - 1, application.Platform.ZeroDegree), span = Math.Min(count - 1, application.Platform.SpanDegree);
        for (int z = Math.Max(1, zero - 1); z <= zero; z++)
            for (int s = Math.Max(1, span - 1); s <= span; s++)
                yield return (z, s);
    }

    private static JudgedPlan Judge(Application application, Temperature[] list, int zero, int span)
    {
        var plan = CompensationPlan.Of(
            list, zero, span, application.Requirement.Temperature.Reference, application.Station.PressurePoints);
        return new JudgedPlan(
            plan, BandMap.Of(application, plan).Margin, ProfileFigures.Of(application, plan).RmsError.Percent,
            ChamberRun.Of(plan, application.Station.Chamber).Length.Minutes);
    }
}

/// <summary>A plan with its figures.</summary>
internal sealed record JudgedPlan(CompensationPlan Plan, double Margin, double Rms, double Minutes);
