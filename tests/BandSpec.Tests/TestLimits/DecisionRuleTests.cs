using BandSpec.Core.Allocating;
using BandSpec.Core.Bands;
using BandSpec.Core.Requirements;
using BandSpec.Core.TestLimits;
using MathNet.Numerics;
using MathNet.Numerics.Integration;
using Xunit;

namespace BandSpec.Tests.TestLimits;

/// <summary>Decision rules through the whole verification test, against published figures and MathNet's functions.</summary>
public sealed class DecisionRuleTests
{
    private static readonly CompensationPlan Plan = CompensationPlan.Of(
        [Given.C(-20), Given.C(25), Given.C(90), Given.C(150)], 3, 3, Given.C(25), Given.Station.PressurePoints);

    /// <summary>
    /// ILAC-G8:09/2019, Table 1: a guard band of r·U leaves this specific risk, one side counted (exact tails recomputed with mpmath, check-values
    /// section 2). Asked the other way round, the risk leads to the same acceptance limits as the multiple.
    /// </summary>
    [Theory]
    [InlineData(1, 0.0227501319482)]
    [InlineData(0.83, 0.0484572262667)]
    [InlineData(1.5, 0.00134989803163)]
    public void A_specific_risk_leads_to_the_limits_of_its_multiple_of_U(double multiple, double risk)
    {
        IReadOnlyList<VerificationPoint> guarded = PointsOf(new VerificationRules(multiple, null));
        IReadOnlyList<VerificationPoint> specific = PointsOf(new VerificationRules(0, null) { Rule = DecisionRule.SpecificRisk, Risk = risk });
        foreach ((VerificationPoint g, VerificationPoint s) in guarded.Zip(specific))
        {
            Assert.Equal(g.GuardBand.Percent, s.GuardBand.Percent, 1e-9);
            Assert.Equal((g.Lower, g.Upper), (s.Lower, s.Upper));
        }
    }

    /// <summary>JCGM 106:2012, 9.5, turned round: figures recomputed with SciPy 1.10.1 and mpmath (check-values section 1a).</summary>
    [Theory]
    [InlineData(0.01, 0.0196659417)]
    [InlineData(0.005, 0.0368264182)]
    [InlineData(0.001, 0.0679017051)]
    public void Resistors_guarded_to_a_global_risk(double risk, double guardBand) => Assert.Equal(
        guardBand,
        new PointDecision(0, 0.12, 0.04, 0.2).GuardBandOf(new VerificationRules(0, null) { Rule = DecisionRule.GlobalRisk, Risk = risk }), 6e-11);

    /// <summary>
    /// The consumer's risk at the limits before rounding is the one asked for, by MathNet's adaptive quadrature of the density of true values times
    /// the chance that the reading is accepted; or the tolerance itself keeps less.
    /// </summary>
    [Theory]
    [InlineData(1e-4)]
    [InlineData(1e-3)]
    public void A_global_risk_is_kept_at_every_point(double risk)
    {
        int guarded = 0;
        foreach (VerificationPoint p in PointsOf(new VerificationRules(0, null) { Rule = DecisionRule.GlobalRisk, Risk = risk }, safetyFactor: 3, capability: 0.6))
        {
            double accepted = p.Tolerance.Percent - p.GuardBand.Percent, found = Consumer(p, accepted);
            guarded += p.GuardBand.Percent > 0 ? 1 : 0;
            Assert.True(p.GuardBand.Percent > 0 ? Math.Abs(found / risk - 1) < 1e-5 : found <= risk * (1 + 1e-5), $"{p.Id}: {found}");
            Assert.True(p.ConsumerRisk <= risk * (1 + 1e-6), p.Id);
        }

        Assert.True(guarded > 0);
    }

    [Fact]
    public void Simple_acceptance_is_a_guard_band_of_nothing() => Assert.Equal(
        PointsOf(new VerificationRules(0, null)).Select(p => (p.Lower, p.Upper, p.ConsumerRisk, p.ProducerRisk)),
        PointsOf(new VerificationRules(0, null) { Rule = DecisionRule.Simple }).Select(p => (p.Lower, p.Upper, p.ConsumerRisk, p.ProducerRisk)));

    /// <summary>Even a reading in the middle leaves 2Q(L/u) = 8.01 % at L/u = 1.75 (check-values section 2): nothing keeps 5 %, a better station would.</summary>
    [Fact]
    public void A_rule_that_cannot_be_met_says_what_uncertainty_would_do()
    {
        PointDecision point = new(0, 0.2, 1, 1.75);
        VerificationRules rules = new(0, null) { Rule = DecisionRule.SpecificRisk, Risk = 0.05 };
        Assert.Equal(point.Tolerance, point.GuardBandOf(rules));
        // At the largest uncertainty the middle alone is accepted: 2Q(L/u) = 5 %, so u = L/1.95996.
        Assert.Equal(1.75 / 1.959963984540054, point.LargestUncertainty(rules, half => half > 0), 1e-5);
        Assert.Equal(1.75 / 6, point.LargestUncertainty(new VerificationRules(3, null), half => half > 0), 1e-5);
    }

    private static double Consumer(VerificationPoint p, double accepted)
    {
        (double mean, double sigma, double u) = (p.ProcessMean.Percent, p.ProcessSigma.Percent, p.Uncertainty.Percent / 2);
        double below(double z) => SpecialFunctions.Erfc(-z / Constants.Sqrt2) / 2;
        double density(double y) => Math.Exp(-Math.Pow((y - mean) / sigma, 2) / 2) / (sigma * Constants.Sqrt2Pi)
            * (y > 0 ? below((accepted - y) / u) : below((y + accepted) / u));
        double beyond(double from, double to) => GaussLegendreRule.Integrate(density, from, to, 128);
        double l = p.Tolerance.Percent, reach = 12 * u;
        return beyond(l, l + reach) + beyond(-l - reach, -l);
    }

    private static IReadOnlyList<VerificationPoint> PointsOf(VerificationRules rules, double safetyFactor = 1.15, double capability = 1.33)
    {
        Application application = Given.Application(Given.Requirement with { Test = rules, SafetyFactor = safetyFactor, Capability = new CapabilityTarget(capability, capability) });
        BandMap bands = BandMap.Of(application, Plan);
        return VerificationPoint.AllOf(application, Plan, bands, Allocation.Of(application, Plan, bands));
    }
}
