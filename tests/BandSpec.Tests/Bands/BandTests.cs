using BandSpec.Core.Bands;
using BandSpec.Core.Planning;
using BandSpec.Core.Requirements;
using BandSpec.Core.Specifying;
using CsCheck;
using Xunit;

namespace BandSpec.Tests.Bands;

public sealed class BandTests
{
    private static readonly CompensationPlan Plan = CompensationPlan.Of(
        [Given.C(-20), Given.C(25), Given.C(90), Given.C(150)], 3, 3, Given.C(25), Given.Station.PressurePoints);

    /// <summary>
    /// Five sigma at an index of 1.67 and four at 1.33 (common practice: an index of 1 is three sigma): a node of margin exactly 1 leaves the
    /// design band with the fractions of check-values section 4, Cp 1.67 → 0.2722 ppm and Cp 1.33 → 33.04 ppm on one side.
    /// </summary>
    [Fact]
    public void A_margin_is_the_smaller_capability_over_its_target()
    {
        foreach (BandNode node in BandMap.Of(Given.Application(), Plan).Nodes)
        {
            double room = node.Design.Percent - node.Added.Percent;
            Assert.Equal(room / (3 * node.SigmaSample.Percent), node.CpkSample, 1e-9);
            Assert.Equal(room / (3 * node.SigmaLongRun.Percent), node.CpkLongRun, 1e-9);
            Assert.Equal(Math.Min(node.CpkSample / 1.67, node.CpkLongRun / 1.33), node.Margin, 1e-12);
            Assert.Equal(node.Margin >= 1, node.Maximum <= node.Design);
        }
    }

    [Fact]
    public void The_terms_of_a_node_make_up_its_spread()
    {
        Platform uncorrelated = Given.Platform with { Correlations = [] };
        BandMap bands = BandMap.Of(Given.Application(platform: uncorrelated), Plan);
        foreach (BandNode node in bands.Nodes)
            Assert.Equal(node.SigmaLongRun.Percent, Math.Sqrt(node.Terms.Sum(t => Math.Pow(t.SigmaLongRun.Percent, 2))), 1e-9);
    }

    [Fact]
    public void At_an_edge_both_neighbours_hold()
    {
        BandNode[] edge = [.. BandMap.Of(Given.Application(), Plan).Nodes.Where(n => n.Temperature == Given.C(40) && n.PressureFraction == 0)];
        Assert.Equal([1.6, 1.0], edge.Select(n => n.Allowed.Percent));
    }

    /// <summary>No plan's margin exceeds the bound, and a drift one way lets a plan beat the perfect correction but not the bound.</summary>
    [Fact]
    public void No_plan_beats_the_bound() => Gen.Select(Gen.Double[-0.2, 0.2], Gen.Double[-0.2, 0.2], Gen.Double[0.3, 2]).Sample(
        (zero, span, scale) =>
        {
            Ageing ageing = Given.Platform.Ageing with { Zero = Given.Spread(zero, 0.02), Span = Given.Spread(span, 0.02) };
            Platform platform = Given.Platform with
            {
                Ageing = ageing,
                RawError = [.. Given.Platform.RawError.Select(c => c with { Mean = c.Mean * scale })],
            };
            Application application = Given.Application(platform: platform);
            return BandMap.Of(application, Plan).Margin <= BandFloor.Of(application).Bound || BandMap.Of(application, Plan).Margin < 0;
        },
        iter: 50);

    [Fact]
    public void Profile_weights_add_up_to_one_life() =>
        Assert.Equal(1, ProfilePoints.Of(Given.Requirement).Sum(p => p.Weight), 1e-12);

    [Fact]
    public void The_stated_band_is_rounded_up_but_never_above_what_is_allowed_if_that_holds()
    {
        foreach (RegionBand region in SpecificationDraft.Draft(Given.Application()).Bands.Regions)
        {
            Assert.True(region.Stated >= region.Maximum);
            Assert.True(region.Stated <= region.AllowedTightest);
        }
    }

    [Fact]
    public void A_chamber_run_takes_the_time_of_its_steps()
    {
        ChamberRun run = ChamberRun.Of(Plan, Given.Station.Chamber);
        // 43 K down at 2 K/min, 170 K up at 3 K/min, 127 K down at 2 K/min; four soaks; 3 + 3·2 points.
        double minutes = (43 / 2.0) + (170 / 3.0) + (127 / 2.0) + (4 * 35) + (9 * 1.5);
        Assert.Equal(minutes, run.Length.Minutes, 1e-9);
        Assert.Equal(minutes / 60 * 95 / 48, run.CostPerUnit, 1e-9);
    }
}
