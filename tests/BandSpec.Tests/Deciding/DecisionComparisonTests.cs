using BandSpec.Core.Bands;
using BandSpec.Core.Deciding;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using BandSpec.Core.Specifying;
using BandSpec.Core.TestLimits;
using BandSpec.Core.VirtualLots;
using Xunit;

namespace BandSpec.Tests.Deciding;

/// <summary>Risks of whole units and what accepted ones are worth, against virtual lots, which share no formula with them.</summary>
public sealed class DecisionComparisonTests
{
    private static readonly Lazy<Specification> Narrow = new(() => Drafted(0.3, Given.Station, null));

    /// <summary>A plan held against a part of the allowed error, so that what is rare becomes as frequent as wanted; a continuous output.</summary>
    private static Specification Drafted(double part, Station station, IReadOnlyList<Temperature>? temperatures) => SpecificationDraft.Draft(
        Given.Application(
            Given.Requirement with
            {
                AllowedError = [.. Given.Requirement.AllowedError.Select(r => r with { Limit = Given.P(r.Limit.Percent * part), LimitAtEnd = null })],
                HeldTerms = [],
                Output = Given.Requirement.Output with { Step = null, Resolution = null },
                Compensation = Given.Requirement.Compensation with { FewestTemperatures = 3, MostTemperatures = 3, CandidateStep = Given.K(20) },
                Test = new VerificationRules(1, temperatures),
                Rounding = new RoundingSteps(Given.P(0.05), Given.P(0.0001)),
            },
            station: station),
        extras: DraftExtras.Decisions);

    /// <summary>The law of a unit has, place by place, the spreads and means of the band and of the verification points.</summary>
    [Fact]
    public void The_law_of_a_unit_has_the_band_s_means_and_spreads()
    {
        Specification s = Narrow.Value;
        UnitLaw law = new(s.Application, s.Choice.Plan, [.. s.VerificationPoints.Select(TestPlace.Of)], s.Bands.Nodes);
        foreach ((VerificationPoint p, int v) in s.VerificationPoints.Select((p, v) => (p, v)))
        {
            Assert.Equal(p.ProcessMean.Percent, law.Shown(v).Mean, 1e-9);
            Assert.Equal(p.ProcessSigma.Percent, law.Shown(v).Sigma, 1e-7);
            Assert.Equal(p.Uncertainty.Percent, 2 * Math.Sqrt(law.ReadingVariance(v)), 1e-9);
        }

        foreach ((BandNode node, int n) in s.Bands.Nodes.Select((node, n) => (node, n)))
        {
            Assert.Equal(node.SigmaLongRun.Percent, law.Used(n, 1, 1).Sigma, 1e-7);
            // The band's mean magnitude is the worse of both sides and ages.
            double worst = (from side in new[] { -1, 1 } from age in new[] { 0, 1 } select law.Used(n, side, age).Mean).Max();
            Assert.Equal(node.Added.Percent, worst, 1e-9);
        }
    }

    /// <summary>With one point the whole unit is that point, for which JCGM 106:2012 has a double integral.</summary>
    [Fact]
    public void With_one_point_the_risks_of_the_unit_are_those_of_the_point()
    {
        Station station = Given.Station with { TestPoints = new PressureLists([0.5], [0.5]), ReadingNoise = Given.P(0.05) };
        Specification s = Drafted(0.35, station, [Given.C(25)]);
        foreach (RuleOutcome rule in s.Decisions!.Rules)
        {
            VerificationPoint point = Assert.Single(rule.Points);
            Same(point.ConsumerRisk, rule.Consumer);
            Same(point.ProducerRisk, rule.Producer);
        }
    }

    [Fact]
    public void Risks_of_the_unit_lie_between_the_largest_point_s_and_their_sum()
    {
        foreach (RuleOutcome rule in Narrow.Value.Decisions!.Rules)
        {
            Assert.InRange(rule.Consumer.Value, 0, rule.Points.Sum(p => p.ConsumerRisk) * 1.03);
            Assert.InRange(rule.Rejected.Value, rule.LargestProducer * 0.97, 1);
            Assert.Equal(22 * rule.Rejected.Value, rule.RejectCostPerUnit.Amount, 1e-12);
        }
    }

    [Fact]
    public void Units_made_in_the_computer_are_rejected_and_leave_as_often()
    {
        Specification s = Narrow.Value;
        LotReport report = LotReport.Of(s, LotRun.Make(LotSubject.Of(s), LotOrder.For(200_000, 16, 1), 2));
        DecisionComparison decisions = s.Decisions!;
        Counted(1 - report.Good.Value, Error(report.Good), decisions.Field.AnyUnit);
        Counted(report.AcceptedLeaving.Value, Error(report.AcceptedLeaving), decisions.Field.AcceptedUnit);
        Counted(1 - report.Steps[^3].Through.Value, Error(report.Steps[^3].Through), decisions.Chosen.Rejected);
        LeavingProbability witness = LeavingProbability.Of(s, 1, 0.01, 2_000_000);
        Assert.Equal(witness.AnyUnit.Value, decisions.Field.AnyUnit.Value, 0.04 * witness.AnyUnit.Value);
    }

    /// <summary>Guarding trades risk of the consumer for risk of the producer; the table is the place where that shows.</summary>
    [Fact]
    public void Every_rule_stands_in_the_table_and_the_guarded_reject_more()
    {
        IReadOnlyList<RuleOutcome> rules = Narrow.Value.Decisions!.Rules;
        Assert.Equal([DecisionRule.Simple, DecisionRule.Guarded, DecisionRule.SpecificRisk, DecisionRule.GlobalRisk], rules.Select(r => r.Rules.Rule));
        Assert.Equal(DecisionRule.Guarded, Narrow.Value.Decisions!.Chosen.Rules.Rule);
        Assert.True(rules[1].Consumer.Value < rules[0].Consumer.Value && rules[1].Rejected.Value > rules[0].Rejected.Value);
    }

    /// <summary>A unit on its limit is worse than an accepted one taken at random; figures of sampled units near the limit agree with the conditioned law.</summary>
    [Fact]
    public void A_unit_on_its_limit_is_worth_what_sampled_units_near_it_are()
    {
        Specification s = Narrow.Value;
        UnitLaw law = new(s.Application, s.Choice.Plan, [.. s.VerificationPoints.Select(TestPlace.Of)], s.Bands.Nodes);
        Random random = new(5);
        (int place, int node) = (s.VerificationPoints.Count / 2, s.Bands.Nodes.ToList().IndexOf(s.Bands.Worst));
        (LinearError shown, LinearError used) = (law.Shown(place), law.Used(node, 1, 1));
        double reading = shown.Mean + (1.2 * shown.Sigma), width = 0.02 * shown.Sigma, u = Math.Sqrt(law.ReadingVariance(place));
        LinearError expected = law.Given(used, place, reading);
        List<double> found = [];
        for (int unit = 0; unit < 400_000; unit++)
        {
            double[] x = [.. Enumerable.Range(0, law.Dimensions).Select(_ => Numerics.Draws.Normal(random))];
            if (Math.Abs(shown.Mean + Dot(shown.Weights, x) + (Math.Sqrt((u * u) + (shown.Own * shown.Own)) * Numerics.Draws.Normal(random)) - reading) < width)
                found.Add(used.Mean + Dot(used.Weights, x) + (used.Own * Numerics.Draws.Normal(random)));
        }

        double mean = found.Average(), sigma = Math.Sqrt(found.Sum(f => (f - mean) * (f - mean)) / (found.Count - 1));
        Assert.Equal(expected.Mean, mean, 5 * sigma / Math.Sqrt(found.Count));
        Assert.Equal(expected.Sigma, sigma, 5 * sigma / Math.Sqrt(2 * found.Count));
        Assert.True(s.Decisions!.Field.AtLimit!.Leaving.Value > s.Decisions.Field.AcceptedUnit.Value);
    }

    /// <summary>
    /// Promised of every unit, each limit leaves a unit that reads exactly on it the capability over lots everywhere, and one limit at least just that; what such
    /// a unit is worth rises by orders of magnitude, and more units are rejected.
    /// </summary>
    [Fact]
    public void Promised_of_every_unit_a_unit_on_its_limit_keeps_the_band_with_the_capability()
    {
        Specification population = Drafted(0.6, Given.Station, null);
        Requirement asked = population.Application.Requirement with { Test = population.Application.Requirement.Test with { Promise = Promise.EveryUnit } };
        Specification everyUnit = SpecificationDraft.Draft(Given.Application(asked), extras: DraftExtras.Decisions);
        UnitLaw law = new(everyUnit.Application, everyUnit.Choice.Plan, [.. everyUnit.VerificationPoints.Select(TestPlace.Of)], everyUnit.Bands.Nodes);
        double least = double.PositiveInfinity;
        foreach ((VerificationPoint p, int v) in everyUnit.VerificationPoints.Select((p, v) => (p, v)))
            foreach (double reading in new[] { p.Lower, p.Upper }.Select(r => 100 * (r - p.Nominal) / asked.Output.Span))
                for (int n = 0; n < law.Nodes; n++)
                    foreach ((int side, int age) in UnitLaw.Sides)
                    {
                        LinearError error = law.Given(law.Used(n, side, age), v, reading);
                        least = Math.Min(least, (everyUnit.Bands.Nodes[n].Design.Percent - error.Mean) / (3 * error.Sigma));
                    }

        Assert.InRange(least, asked.Capability.LongRun - 1e-9, asked.Capability.LongRun + 0.02);
        Assert.All(everyUnit.VerificationPoints.Zip(population.VerificationPoints), pair => Assert.True(pair.First.Upper <= pair.Second.Upper && pair.First.Lower >= pair.Second.Lower));
        Assert.True(everyUnit.Decisions!.Field.AtLimit!.Leaving.Value < population.Decisions!.Field.AtLimit!.Leaving.Value / 10);
        Assert.True(everyUnit.Decisions.Chosen.Rejected.Value > population.Decisions.Chosen.Rejected.Value);
    }

    /// <summary>
    /// Units drawn one by one, tested with the output's steps as normal errors, and counted: beyond a tolerance and accepted, within all and rejected.
    /// </summary>
    [Fact]
    public void Risks_of_the_unit_are_what_counting_finds()
    {
        Requirement stepped = Narrow.Value.Application.Requirement with { Output = Given.Requirement.Output with { Step = 5.0 / 16384, Resolution = "14 bit" }, Test = new VerificationRules(0, null) };
        Specification s = SpecificationDraft.Draft(Given.Application(stepped), extras: DraftExtras.Decisions);
        UnitLaw law = new(s.Application, s.Choice.Plan, [.. s.VerificationPoints.Select(TestPlace.Of)], s.Bands.Nodes);
        (LinearError Shown, (double Own, double Zero, double Common) Reading, VerificationPoint Point)[] test =
            [.. s.VerificationPoints.Select((p, v) => (law.Shown(v), law.ReadingErrors(v), p))];
        Random random = new(11);
        double next() => Numerics.Draws.Normal(random);
        const int Units = 150_000;
        (int consumer, int producer) = (0, 0);
        for (int unit = 0; unit < Units; unit++)
        {
            double[] x = [.. Enumerable.Range(0, law.Dimensions).Select(_ => next())];
            (double zero, double common) = (next(), next());
            (bool within, bool accepted) = (true, true);
            foreach ((LinearError shown, (double Own, double Zero, double Common) reading, VerificationPoint p) in test)
            {
                double truth = shown.Mean + Dot(shown.Weights, x) + (shown.Own * next());
                double read = p.Nominal + ((truth + (reading.Own * next()) + (reading.Zero * zero) + (reading.Common * common)) * stepped.Output.Span / 100);
                within &= Math.Abs(truth) <= p.Tolerance.Percent;
                accepted &= read >= p.Lower && read <= p.Upper;
            }

            consumer += !within && accepted ? 1 : 0;
            producer += within && !accepted ? 1 : 0;
        }

        static double error(int count) => Math.Sqrt(count) / Units;
        Assert.True(consumer > 20 && producer > 200, $"{consumer} and {producer} say too little");
        Counted((double)consumer / Units, error(consumer), s.Decisions!.Chosen.Consumer);
        Counted((double)producer / Units, error(producer), s.Decisions.Chosen.Producer);
    }

    /// <summary>Risks of 1e-3 and of 1e-10 alike are known to a few percent; and the pointwise figure lies below that of all places, their sum above.</summary>
    [Fact]
    public void However_small_a_risk_is_it_is_known_to_a_few_percent()
    {
        DecisionComparison decisions = Narrow.Value.Decisions!;
        foreach (RuleOutcome rule in decisions.Rules)
            Assert.InRange(rule.Consumer.StandardError, 0, 0.1 * rule.Consumer.Value);
        Assert.InRange(decisions.Field.AnyUnit.Value, decisions.Field.LargestPointwise, 4 * Narrow.Value.Bands.Nodes.Count * decisions.Field.LargestPointwise);
    }

    private static double Dot(double[] a, double[] b) => a.Zip(b, (x, y) => x * y).Sum();

    private static double Error(Rate rate) => Math.Sqrt(rate.DesignEffect * rate.Value * (1 - rate.Value) / rate.Of);

    private static void Same(double exact, EstimatedProbability found) =>
        Assert.True(Math.Abs(exact - found.Value) <= (4.5 * found.StandardError) + (1e-5 * exact) + 1e-15, $"{exact:G5} exact, {found.Value:G5} ± {found.StandardError:G2}");

    /// <summary>Within 4.5 standard errors and 4 %, for what the closed form takes for normal and a virtual lot does not (METHOD, section 13).</summary>
    private static void Counted(double counted, double error, EstimatedProbability found) => Assert.True(
        Math.Abs(counted - found.Value) <= (4.5 * Math.Sqrt((error * error) + (found.StandardError * found.StandardError))) + (0.04 * counted),
        $"{counted:G4} ± {error:G2} counted, {found.Value:G4} ± {found.StandardError:G2} integrated");
}
