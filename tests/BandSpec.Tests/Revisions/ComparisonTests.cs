using BandSpec.Core.Requirements;
using BandSpec.Core.Revisions;
using BandSpec.Core.Specifying;
using Xunit;

namespace BandSpec.Tests.Revisions;

public sealed class ComparisonTests
{
    [Fact]
    public void A_specification_compared_with_itself_has_no_change() =>
        Assert.All(Drafted.Variants, s => Assert.True(Comparison.Of(s, s).IsEmpty));

    [Fact]
    public void Drafted_again_from_equal_inputs_it_has_no_change_either() =>
        Assert.True(Comparison.Of(Drafted.First, Drafted.Of(Drafted.Requirement)).IsEmpty);

    [Fact]
    public void Comparing_the_other_way_round_exchanges_old_and_new_and_tighter_and_looser()
    {
        foreach (Specification a in Drafted.Variants)
            foreach (Specification b in Drafted.Variants)
            {
                Comparison forth = Comparison.Of(a, b), back = Comparison.Of(b, a);
                AssertMirrored(forth.Inputs, back.Inputs);
                AssertMirrored(forth.Outcome, back.Outcome);
                Assert.Equal(forth.LimitsDiffer, back.LimitsDiffer);
            }
    }

    [Fact]
    public void Every_changed_field_is_named_with_its_path_and_its_unit()
    {
        Comparison comparison = Comparison.Of(Drafted.First, Drafted.Variants[^1]);
        string[] lines = [.. comparison.Inputs.Select(c => $"{c.Subject} {c.Name}: {c.Old?.Text ?? "-"} > {c.New?.Text ?? "-"}")];
        Assert.Contains("Requirement pressure.upper: 25 bar > 400 psi", lines);
        Assert.Contains("Requirement specification.changes[1]: - > C, 2027-01-05: Other skid", lines);
        Assert.Contains("Requirement temperature.profile[-20 °C … 10 °C].dwell: 1500 h > -", lines);
        Assert.Contains("Requirement further-terms[Supply ripple].shape: constant > -", lines);
        Assert.Contains("Platform raw-error.zero.0.sigma: 2.5 %FS > -", lines);
        Assert.Contains("Platform raw-error.correlations[zero.1, span.1]: 0.35 > -", lines);
        Assert.Contains("Station test-points.reference: 0, 0.25, 0.5, 0.75, 1 > 0, 0.4, 1", lines);
        Assert.Contains("Station chamber.rate: 95 EUR/h > 80 USD/h", lines);
    }

    [Fact]
    public void A_region_whose_edge_moves_is_one_change_at_each_side_of_the_edge()
    {
        AllowedErrorRegion[] regions = [.. Drafted.Requirement.AllowedError];
        regions[0] = regions[0] with { To = Given.C(50) };
        regions[1] = regions[1] with { From = Given.C(50) };
        Comparison comparison = Comparison.Of(Drafted.First, Drafted.Of(Drafted.Requirement with { AllowedError = regions }));
        Assert.Equal(["allowed-error[0].to", "allowed-error[1].from"], comparison.Inputs.Select(c => c.Name));
        FigureChange between = Assert.Single(comparison.Outcome, c => c.Name == "tightest allowed error");
        Assert.Equal(("40 °C … 50 °C", "1 %FS", "1.6 %FS"), (between.Place, between.Old?.Text, between.New?.Text));
        Assert.Equal((Bearing.Looser, Bearing.Looser), (between.ForProduction, between.ForCustomer));
    }

    [Fact]
    public void A_guard_band_taken_away_is_looser_for_production_and_leaves_the_customers_tolerance()
    {
        Comparison comparison = Comparison.Of(Drafted.First, Drafted.Of(Drafted.Requirement with { Test = new VerificationRules(0, null) }));
        FigureChange[] limits = [.. comparison.Outcome.Where(c => c.Name is "upper limit" or "lower limit")];
        Assert.NotEmpty(limits);
        Assert.All(limits, c => Assert.Equal((Bearing.Looser, Bearing.Neutral), (c.ForProduction, c.ForCustomer)));
        Assert.DoesNotContain(comparison.Outcome, c => c.Name == "tolerance");
        Assert.True(comparison.LimitsDiffer);
    }

    [Fact]
    public void More_ageing_takes_margin_from_production_and_promises_the_customer_less()
    {
        Comparison comparison = Comparison.Of(Drafted.First, Drafted.Variants[5]);
        FigureChange aged = Assert.Single(comparison.Outcome, c => c.Name == "age factor");
        FigureChange margin = Assert.Single(comparison.Outcome, c => c.Subject == FigureSubject.Margin && c.Name == "margin");
        FigureChange hottest = Assert.Single(comparison.Outcome, c => c.Name == "maximum band" && c.Place == "130 °C … 150 °C");
        Bearing bearing = aged.New!.Number > aged.Old!.Number ? Bearing.Tighter : Bearing.Looser;
        Assert.Equal((bearing, Turned(bearing)), (margin.ForProduction, margin.ForCustomer));
        Assert.Equal(Turned(bearing), hottest.ForCustomer);
    }

    [Fact]
    public void A_title_moves_no_limit()
    {
        SpecificationIdentity identity = Drafted.Requirement.Identity with { Title = "Brine line, second well" };
        Comparison comparison = Comparison.Of(Drafted.First, Drafted.Of(Drafted.Requirement with { Identity = identity }));
        Assert.Equal("specification.title", Assert.Single(comparison.Inputs).Name);
        Assert.Empty(comparison.Outcome);
        Assert.False(comparison.LimitsDiffer);
    }

    [Fact]
    public void A_point_is_compared_with_the_point_at_its_place_whatever_its_name()
    {
        Station station = Given.Station with { TestPoints = new PressureLists([0, 0.1, 0.25, 0.5, 0.75, 1], [0, 1]) };
        Comparison comparison = Comparison.Of(Drafted.First, Drafted.Of(Drafted.Requirement, station: station));
        FigureChange[] points = [.. comparison.Outcome.Where(c => c.Subject == FigureSubject.Verification)];
        Assert.NotEmpty(points);
        Assert.All(points, c => Assert.Null(c.Old));
        Assert.All(points, c => Assert.StartsWith("25 °C, 10 % of span", c.Place, StringComparison.Ordinal));
        Assert.True(comparison.LimitsDiffer);
    }

    private static void AssertMirrored(IReadOnlyList<FigureChange> forth, IReadOnlyList<FigureChange> back)
    {
        Assert.Equal(forth.Count, back.Count);
        foreach (FigureChange change in forth)
        {
            FigureChange mirrored = Assert.Single(back, b => (b.Subject, b.Name, b.Place) == (change.Subject, change.Name, change.Place));
            Assert.Equal((change.Old, change.New), (mirrored.New, mirrored.Old));
            Assert.Equal((Turned(change.ForProduction), Turned(change.ForCustomer)), (mirrored.ForProduction, mirrored.ForCustomer));
            Assert.Equal(change.Movement, mirrored.Movement);
        }
    }

    private static Bearing Turned(Bearing bearing) => bearing switch
    {
        Bearing.Tighter => Bearing.Looser,
        Bearing.Looser => Bearing.Tighter,
        _ => Bearing.Neutral,
    };
}
