using BandSpec.Core.Bands;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.Planning;

/// <summary>
/// Chooses a plan whose claim holds at every pressure and temperature: a search over nodes, then a look at everything between them; places
/// where the choice falls short of the margin it was chosen for join the nodes, and the search repeats. This is the exchange method for
/// semi-infinite problems (Blankenship &amp; Falk 1976). Nodes only lower margins, so when a choice keeps its margin everywhere, no other plan
/// beats it everywhere: the proof over nodes is then a proof over the continuous range.
/// </summary>
internal static class PlanChoosing
{
    /// <inheritdoc cref="PlanChoice.Shortfall"/>
    internal const double Shortfall = PlanChoice.Shortfall;

    /// <summary>A choice that still falls short after this many rounds is given as not proven; three or four are usual.</summary>
    private const int MostRounds = 60;

    /// <summary>The best plan by the requirement's objective.</summary>
    /// <param name="application">The application.</param>
    /// <param name="progress">Is told how far the search has come; may be <see langword="null"/>.</param>
    /// <param name="cancellation">Ends the search early; the best plan so far is then the answer, not proven.</param>
    public static PlanChoice Choose(Application application, IProgress<SearchProgress>? progress, CancellationToken cancellation) =>
        Choose(new PlanSearch(application, progress), application.Requirement.Compensation.Objective, cancellation);

    /// <summary>The best plan of a prepared search.</summary>
    public static PlanChoice Choose(PlanSearch search, PlanObjective objective, CancellationToken cancellation = default)
    {
        Application application = search.Tables.Application;
        List<NodePlace> added = [];
        SearchAnswer? answer = null;
        for (int round = 1; ; round++)
        {
            answer = answer is null ? search.Run(objective, added, cancellation) : search.RunAgain(answer, objective, added, cancellation);
            CompensationPlan plan = search.Tables.PlanOf(answer.Winner);
            IReadOnlyList<ContinuousMargin> everywhere = ContinuousMargin.AllOf(application, plan);
            List<NodePlace> shortOf = [.. Violated(everywhere, answer.Winner.Margin).Where(p => !added.Contains(p))];
            bool holds = shortOf.Count == 0;
            if (!answer.Proven)
                (plan, everywhere) = OrClimbed(plan, everywhere, search);
            if (holds || !answer.Proven || round == MostRounds)
                return new PlanChoice(plan, ChamberRun.Of(plan, application.Station.Chamber), search.PlanCount, answer.Proven && holds)
                {
                    PlansDecided = answer.Count.Decided,
                    PlansDiscarded = answer.Count.Discarded,
                    AddedNodes = added,
                    ExchangeRounds = round,
                    Everywhere = everywhere,
                };
            added = [.. added, .. shortOf];
        }
    }

    /// <summary>
    /// What a search that was ended early has to show: its plan, unless that falls short between the nodes and the plan found by climbing does not.
    /// </summary>
    private static (CompensationPlan Plan, IReadOnlyList<ContinuousMargin> Everywhere) OrClimbed(
        CompensationPlan plan, IReadOnlyList<ContinuousMargin> everywhere, PlanSearch search)
    {
        double least = everywhere.Min(r => r.Margin);
        if (least >= 1 - Shortfall)
            return (plan, everywhere);
        CompensationPlan climbed = Climbed(search);
        IReadOnlyList<ContinuousMargin> instead = ContinuousMargin.AllOf(search.Tables.Application, climbed);
        return instead.Min(r => r.Margin) > least ? (climbed, instead) : (plan, everywhere);
    }

    /// <summary>A good plan, found quickly and without proof.</summary>
    private static CompensationPlan Climbed(PlanSearch search)
    {
        Contender top = new PlanAscent(search.Tables, new MarginScore(search.Tables, []), search.Rms).Climb();
        return search.Tables.PlanOf(top);
    }

    /// <summary>
    /// A plan that is feasible at every pressure and temperature; nothing when no candidate plan is, which is then proven, or when the search is
    /// ended early.
    /// </summary>
    public static CompensationPlan? Feasible(PlanSearch search, CancellationToken cancellation = default)
    {
        List<NodePlace> added = [];
        IEnumerable<NodePlace> ShortOf(CompensationPlan plan) =>
            ContinuousMargin.AllOf(search.Tables.Application, plan).Where(r => r.Margin < 1 - Shortfall).Select(r => r.Worst).Where(p => !added.Contains(p));
        while (true)
        {
            var round = new ObjectiveSearch(search, added, cancellation);
            if (added.Count == 0 && round.Start.Margin >= 1 && search.Tables.PlanOf(round.Start) is var climbed && !ShortOf(climbed).Any())
                return climbed;
            if (round.Feasible() is not { } winner || cancellation.IsCancellationRequested)
                return null;
            CompensationPlan plan = search.Tables.PlanOf(winner);
            NodePlace[] shortOf = [.. ShortOf(plan)];
            if (shortOf.Length == 0)
                return plan;
            added.AddRange(shortOf);
        }
    }

    /// <summary>The plan that the requirement pins, judged between the nodes as well; nothing when it pins none.</summary>
    /// <param name="application">The application.</param>
    /// <param name="optimum">What the search would have chosen.</param>
    public static PlanChoice? Pinned(Application application, PlanChoice optimum)
    {
        if (application.Requirement.Compensation.Pinned is not { } pinned)
            return null;
        CompensationPlan plan = pinned.Complete(application.Requirement.Temperature.Reference, application.Platform, application.Station);
        IReadOnlyList<ContinuousMargin> everywhere = ContinuousMargin.AllOf(application, plan);
        bool isOptimum = plan.IsLike(optimum.Plan);
        return new PlanChoice(plan, ChamberRun.Of(plan, application.Station.Chamber), optimum.PlansConsidered, optimum.Proven && isOptimum)
        {
            PlansDecided = optimum.PlansDecided,
            PlansDiscarded = optimum.PlansDiscarded,
            AddedNodes = [.. Violated(everywhere, BandMap.Of(application, plan).Margin)],
            ExchangeRounds = 1,
            Everywhere = everywhere,
        };
    }

    /// <summary>
    /// The places at which a choice falls short. A plan whose added errors alone fill the band somewhere is an answer of "no" with or without
    /// further nodes.
    /// </summary>
    private static IEnumerable<NodePlace> Violated(IReadOnlyList<ContinuousMargin> everywhere, double margin) =>
        margin > 0 ? everywhere.Where(r => r.Margin < margin * (1 - Shortfall)).Select(r => r.Worst) : [];
}
