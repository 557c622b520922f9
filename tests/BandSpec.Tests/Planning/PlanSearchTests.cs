using BandSpec.Core.Bands;
using BandSpec.Core.Planning;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using CsCheck;
using Xunit;

namespace BandSpec.Tests.Planning;

/// <summary>The search against enumeration, its cuts against what they discard, and what must not change an answer.</summary>
public sealed class PlanSearchTests
{
    [Fact]
    public void Every_answer_is_that_of_enumeration_ties_included() => RandomApplications.Small.Sample(
        application =>
        {
            List<JudgedPlan> all = NaiveEnumeration.AllOf(application);
            JudgedPlan best = NaiveEnumeration.Best(application, all);
            var search = new PlanSearch(application);
            Contender winner = search.Run(application.Requirement.Compensation.Objective, []).Winner;
            CompensationPlan found = search.Tables.PlanOf(winner.List, winner.Zero, winner.Span);
            return all.Count == search.PlanCount && IsAsGood(all, best, found, application);
        },
        iter: 40);

    [Theory]
    [InlineData(PlanObjective.MostMargin, 1.15)]
    [InlineData(PlanObjective.MostMargin, 2.4)]
    [InlineData(PlanObjective.LeastError, 1.15)]
    [InlineData(PlanObjective.LeastCost, 2.0)]
    public void No_figure_depends_on_the_number_of_threads(PlanObjective objective, double safety)
    {
        Application application = Given.Application(Given.Requirement with
        {
            SafetyFactor = safety,
            Compensation = Given.Requirement.Compensation with { MostTemperatures = 5, Objective = objective },
        });
        SearchAnswer one = new PlanSearch(application, threads: 1).Run(objective, []);
        foreach (int threads in new[] { 2, 5 })
        {
            SearchAnswer many = new PlanSearch(application, threads: threads).Run(objective, []);
            Assert.Equal(one.Winner.List, many.Winner.List);
            Assert.Equal((one.Winner.Zero, one.Winner.Span), (many.Winner.Zero, many.Winner.Span));
            Assert.Equal(BitConverter.DoubleToInt64Bits(one.Winner.Margin), BitConverter.DoubleToInt64Bits(many.Winner.Margin));
            Assert.Equal(BitConverter.DoubleToInt64Bits(one.Winner.Rms), BitConverter.DoubleToInt64Bits(many.Winner.Rms));
            Assert.Equal(one.Count, many.Count);
        }
    }

    [Theory]
    [InlineData(1.15)]
    [InlineData(2.2)]
    [InlineData(2.6)]
    public void A_cut_discards_no_plan_that_reaches_the_margin_it_was_made_for(double safety)
    {
        Application application = Given.Application(Given.Requirement with
        {
            SafetyFactor = safety,
            Compensation = Given.Requirement.Compensation with { MostTemperatures = 5 },
        });
        var tables = new SearchTables(application);
        double level = 0.97 * new PlanAscent(tables, new MarginScore(tables, []), new RmsScore(tables)).Climb().Margin;
        long discarded = 0, cuts = 0;
        foreach (ListGroup group in new CutMaking(tables, []).CutAt(level))
        {
            cuts += group.Cuts.Count;
            discarded += DiscardedIn(group, tables, level);
        }

        Assert.True(cuts > 0);
        Assert.True(discarded > 1000);
    }

    [Fact]
    public void A_margin_is_the_same_when_all_errors_and_allowances_are_scaled_together()
    {
        SearchAnswer plain = Search(Given.Application(SmallScope), PlanObjective.MostMargin);
        SearchAnswer scaled = Search(ScaledApplication(0.5), PlanObjective.MostMargin);
        Assert.Equal(plain.Winner.List, scaled.Winner.List);
        Assert.Equal(plain.Winner.Margin, scaled.Winner.Margin, 1e-10);
        Assert.Equal(plain.Winner.Rms, 2 * scaled.Winner.Rms, 1e-10);
    }

    [Fact]
    public void The_largest_margin_never_falls_when_an_allowance_widens_and_never_rises_when_a_noise_grows() => Gen.Select(
        Gen.Double[1, 1.5], Gen.Double[1, 3], Gen.Int[0, 2]).Sample(
        (wider, louder, region) =>
        {
            double before = Search(Given.Application(SmallScope), PlanObjective.MostMargin).Winner.Margin;
            AllowedErrorRegion[] allowances =
            [
                .. SmallScope.AllowedError.Select((a, i) => i != region ? a : a with
                {
                    Limit = Given.P(a.Limit.Percent * wider),
                    LimitAtEnd = a.LimitAtEnd is { } end ? Given.P(end.Percent * wider) : null,
                }),
            ];
            double after = Search(Given.Application(SmallScope with { AllowedError = allowances }), PlanObjective.MostMargin).Winner.Margin;
            Station noisy = Given.Station with
            {
                ReadingNoise = Given.P(Given.Station.ReadingNoise.Percent * louder), SoakGradient = Given.K(0.25 * louder),
            };
            double worse = Search(Given.Application(SmallScope, station: noisy), PlanObjective.MostMargin).Winner.Margin;
            return after >= before * (1 - 1e-12) && worse <= before * (1 + 1e-12);
        },
        iter: 12);

    [Theory]
    [InlineData(PlanObjective.LeastCost)]
    [InlineData(PlanObjective.MostMargin)]
    [InlineData(PlanObjective.LeastError)]
    public void Disturbing_any_one_temperature_of_the_choice_gives_no_better_answer(PlanObjective objective)
    {
        Application application = Given.Application(SmallScope with { SafetyFactor = 2 });
        var search = new PlanSearch(application);
        Contender winner = search.Run(objective, []).Winner;
        var margin = new MarginScore(search.Tables, []);
        foreach (int[] near in Disturbed(winner.List).Where(search.Tables.Families.Allows))
        {
            (double m, double rms, double minutes) = Judge(search, margin, near, winner);
            double own = Judge(search, margin, winner.List, winner).Minutes;
            Assert.False(objective switch
            {
                PlanObjective.LeastCost => m >= 1 && minutes < own - 1e-6,
                PlanObjective.LeastError => m >= 1 && rms < winner.Rms * (1 - 2e-9),
                _ => m > winner.Margin * (1 + 2e-9),
            });
        }
    }

    private static Requirement SmallScope { get; } = Given.Requirement with
    {
        Compensation = Given.Requirement.Compensation with { CandidateStep = Given.K(10), MostTemperatures = 4 },
    };

    private static SearchAnswer Search(Application application, PlanObjective objective) => new PlanSearch(application).Run(objective, []);

    private static IEnumerable<int[]> Disturbed(int[] list)
    {
        for (int i = 0; i < list.Length; i++)
            foreach (int step in new[] { -1, 1 })
            {
                int[] moved = [.. list];
                moved[i] += step;
                yield return moved;
            }
    }

    private static (double Margin, double Rms, double Minutes) Judge(PlanSearch search, MarginScore margin, int[] list, Contender like)
    {
        var batch = new PlanBatch(list.Length, search.Tables.NearestIn(list));
        batch.Add(list);
        var fit = new PlanFit(search.Tables);
        fit.Load(batch);
        fit.To(search.Tables.RowsOf(like.Zero, like.Span));
        int row = 0;
        CompensationPlan plan = search.Tables.PlanOf(list, like.Zero, like.Span);
        return (
            margin.Of(fit, double.NegativeInfinity, ref row)[0], search.Rms.Of(fit, double.PositiveInfinity)[0],
            ChamberRun.Of(plan, search.Tables.Application.Station.Chamber).Length.Minutes);
    }

    /// <summary>Looks at all lists of a group that cuts discard, and holds each against the level.</summary>
    private static long DiscardedIn(ListGroup group, SearchTables tables, double level)
    {
        var margin = new MarginScore(tables, []);
        var fit = new PlanFit(tables);
        long discarded = 0;
        int row = 0;
        foreach (PlanFamily family in tables.Families.All.Where(f => f.Count == group.Form.Count))
            foreach (int second in tables.Families.SecondsOf(family))
            {
                HashSet<string> visited = [];
                var walk = new ListWalk(tables, family, group, list => visited.Add(string.Join(" ", list)));
                walk.Through(second);
                discarded += walk.Discarded;
                long missing = 0;
                tables.Families.ForEachList(family, second, list =>
                {
                    if (visited.Contains(string.Join(" ", list)))
                        return;
                    missing++;
                    var batch = new PlanBatch(list.Length, tables.NearestIn(list));
                    batch.Add(list);
                    fit.Load(batch);
                    fit.To(group.Rows);
                    Assert.True(margin.Of(fit, level, ref row)[0] < level);
                });
                Assert.Equal(missing, walk.Discarded);
            }

        return discarded;
    }

    /// <summary>A plan that enumeration finds as good: the same one, or one whose figures tie to within the rounding of the two ways.</summary>
    private static bool IsAsGood(List<JudgedPlan> all, JudgedPlan best, CompensationPlan found, Application application)
    {
        if (found.Temperatures.SequenceEqual(best.Plan.Temperatures) && (found.ZeroDegree, found.SpanDegree) == (best.Plan.ZeroDegree, best.Plan.SpanDegree))
            return true;
        JudgedPlan same = all.Single(p => p.Plan.Temperatures.SequenceEqual(found.Temperatures)
            && (p.Plan.ZeroDegree, p.Plan.SpanDegree) == (found.ZeroDegree, found.SpanDegree));
        // Where not even added errors fit, the search prefers the plan that lacks the least room, the plain ratio the one that scatters most.
        return best.Margin < 0 && same.Margin < 0 && BandMap.Of(application, found).Worst.Added >= BandMap.Of(application, found).Worst.Design;
    }

    private static Application ScaledApplication(double factor)
    {
        Platform p = Given.Platform;
        PercentOfSpan By(PercentOfSpan e) => Given.P(e.Percent * factor);
        Spread Of(Spread s) => new(By(s.Mean), By(s.Sigma));
        Station s = Given.Station;
        Requirement r = SmallScope;
        return Given.Application(
            r with
            {
                AllowedError = [.. r.AllowedError.Select(a => a with { Limit = By(a.Limit), LimitAtEnd = a.LimitAtEnd is { } end ? By(end) : null })],
                HeldTerms = [],
                FurtherTerms = [.. r.FurtherTerms.Select(f => f with { Bound = By(f.Bound), Sigma = By(f.Sigma) })],
                Output = r.Output with { Step = r.Output.Step * factor, Resolution = null },
            },
            p with
            {
                RawError = [.. p.RawError.Select(c => c with { Mean = c.Mean * factor, Sigma = c.Sigma * factor, LotSigma = c.LotSigma * factor })],
                PressureHysteresis = Of(p.PressureHysteresis), ThermalHysteresis = Of(p.ThermalHysteresis), Repeatability = By(p.Repeatability),
                Ageing = p.Ageing with { Zero = Of(p.Ageing.Zero), Span = Of(p.Ageing.Span) },
            },
            s with { StandardZero = By(s.StandardZero), StandardProportional = By(s.StandardProportional), ReadingNoise = By(s.ReadingNoise) });
    }
}
