using BandSpec.Core.Bands;
using BandSpec.Core.Planning;
using BandSpec.Core.Requirements;
using BandSpec.Core.Specifying;
using CsCheck;
using Xunit;

namespace BandSpec.Tests.Planning;

/// <summary>Choosing a plan whose claim holds between the nodes, pinned plans, and a search that is ended early.</summary>
public sealed class PlanChoosingTests
{
    private static readonly CompensationScope Small = Given.Requirement.Compensation with { CandidateStep = Given.K(10), MostTemperatures = 4 };

    [Fact]
    public void The_choice_keeps_its_margin_at_every_place()
    {
        Application application = Given.Application();
        PlanChoice choice = PlanChoosing.Choose(application, null, default);
        Assert.True(choice.Proven);
        Assert.NotEmpty(choice.AddedNodes);
        Assert.True(choice.ExchangeRounds > 1);
        Assert.Equal(BandMap.Of(application, choice.Plan, choice.AddedNodes).Margin, choice.ContinuousMargin, 1e-7);
        Assert.True(BandMap.Of(application, choice.Plan).Margin > choice.ContinuousMargin * (1 + 1e-6));
    }

    [Fact]
    public void The_largest_margin_is_that_of_the_best_of_all_plans_over_the_continuous_range()
    {
        Application application = Given.Application(
            Given.Requirement with { SafetyFactor = 2, Compensation = Small with { CandidateStep = Given.K(20), Objective = PlanObjective.MostMargin } });
        double best = PlansOf(application).Max(p => ContinuousMargin.AllOf(application, p).Min(r => r.Margin));
        Assert.Equal(best, PlanChoosing.Choose(application, null, default).ContinuousMargin, best * 2e-8);
    }

    [Fact]
    public void A_pinned_plan_is_used_as_given_and_judged_beside_the_optimum()
    {
        var pinned = new PinnedPlan([Given.C(-17), Given.C(28), Given.C(141)], 2, null);
        Specification specification = SpecificationDraft.Draft(
            Given.Application(Given.Requirement with { Compensation = Small with { Pinned = pinned } }));
        Assert.Equal(pinned.Temperatures, specification.Choice.Plan.Temperatures);
        Assert.Equal((2, 2), (specification.Choice.Plan.ZeroDegree, specification.Choice.Plan.SpanDegree));
        Assert.False(specification.Choice.Proven);
        Assert.True(specification.Optimum.Proven);
        Assert.True(specification.Optimum.Run.CostPerUnit < specification.Choice.Run.CostPerUnit);
        Assert.Equal(specification.Bands.Margin, specification.Choice.ContinuousMargin, 1e-7);
    }

    [Fact]
    public void A_pinned_plan_that_is_the_optimum_is_proven()
    {
        Application application = Given.Application(Given.Requirement with { Compensation = Small });
        CompensationPlan best = PlanChoosing.Choose(application, null, default).Plan;
        var pinned = new PinnedPlan(best.Temperatures, best.ZeroDegree, best.SpanDegree);
        Assert.True(SpecificationDraft.Draft(Given.Application(Given.Requirement with { Compensation = Small with { Pinned = pinned } })).Choice.Proven);
    }

    [Theory]
    [InlineData(PlanObjective.LeastCost)]
    [InlineData(PlanObjective.MostMargin)]
    [InlineData(PlanObjective.LeastError)]
    public void A_search_ended_early_still_has_a_plan_and_says_that_it_is_not_proven(PlanObjective objective)
    {
        Application application = Given.Application(Given.Requirement with { Compensation = Small with { Objective = objective } });
        PlanChoice choice = PlanChoosing.Choose(application, null, new CancellationToken(canceled: true));
        Assert.False(choice.Proven);
        Assert.True(choice.PlansDecided < choice.PlansConsidered);
        Assert.True(BandMap.Of(application, choice.Plan).Margin > 1);
    }

    [Fact]
    public void Further_rounds_choose_from_the_shortlist_what_a_search_of_all_plans_would_choose()
    {
        int fromShortlist = 0;
        RandomApplications.Small.Sample(
            application =>
            {
                PlanObjective objective = application.Requirement.Compensation.Objective;
                var search = new PlanSearch(application);
                SearchAnswer first = search.Run(objective, []);
                CompensationPlan plan = search.Tables.PlanOf(first.Winner.List, first.Winner.Zero, first.Winner.Span);
                NodePlace[] added = [.. ContinuousMargin.AllOf(application, plan).Select(r => r.Worst)];
                SearchAnswer again = search.RunAgain(first, objective, added), afresh = new PlanSearch(application).Run(objective, added);
                if (first.Shortlist!.WinnerOver(search.Tables, new MarginScore(search.Tables, added)) is not null)
                    Interlocked.Increment(ref fromShortlist);
                return again.Winner.List.SequenceEqual(afresh.Winner.List)
                    && (again.Winner.Zero, again.Winner.Span, again.Winner.Margin) == (afresh.Winner.Zero, afresh.Winner.Span, afresh.Winner.Margin);
            },
            iter: 60);
        Assert.True(fromShortlist > 20, $"{fromShortlist} answers came from a shortlist");
    }

    private static IEnumerable<CompensationPlan> PlansOf(Application application)
    {
        var tables = new SearchTables(application);
        List<CompensationPlan> plans = [];
        foreach (PlanFamily family in tables.Families.All)
            foreach (int second in tables.Families.SecondsOf(family))
                tables.Families.ForEachList(family, second, list => plans.AddRange(
                    tables.Families.DegreesOf[family.Count].Select(d => tables.PlanOf(list, d.Zero, d.Span))));
        return plans;
    }
}
