using BandSpec.Core.Numerics;

using Xunit;

namespace BandSpec.Tests.Numerics;

public sealed class GuardBandTests
{
    private static readonly Interval Resistor = new(1499.8, 1500.2);

    /// <summary>JCGM 106:2012 clause 9.5 turned round: recomputed with SciPy 1.10.1 and mpmath (check-values section 1a).</summary>
    [Theory]
    [InlineData(0.01, 0.0196659417, 0.0683840967)]
    [InlineData(0.005, 0.0368264182, 0.1064698038)]
    [InlineData(0.001, 0.0679017051, 0.2017526262)]
    public void Guard_band_for_a_global_risk(double risk, double w, double producer)
    {
        double found = GuardBand.ForConsumerRisk(1500, 0.12, 0.04, Resistor, risk);
        Assert.Equal(w, found, 6e-11);
        Assert.Equal(producer, ConformityRisk.Of(1500, 0.12, 0.04, Resistor, Resistor.Inset(found)).Producer, 6e-11);
    }

    [Theory]
    [InlineData(1e-5)]
    [InlineData(1e-8)]
    [InlineData(1e-12)]
    public void The_guard_band_found_keeps_the_risk_exactly(double risk)
    {
        double w = GuardBand.ForConsumerRisk(0.1, 0.25, 0.05, new(-1, 1), risk);
        Close.Relative(risk, ConformityRisk.Symmetric(0.1, 0.25, 0.05, 1, 1 - w).Consumer, 1e-12);
        double oneSided = GuardBand.ForConsumerRisk(0.1, 0.25, 0.05, new(double.NegativeInfinity, 1), risk);
        Interval acceptance = new(double.NegativeInfinity, 1 - oneSided);
        Close.Relative(risk, ConformityRisk.Of(0.1, 0.25, 0.05, new(double.NegativeInfinity, 1), acceptance).Consumer, 1e-12);
    }

    [Fact]
    public void No_guard_band_where_simple_acceptance_keeps_the_risk()
    {
        Assert.Equal(0, GuardBand.ForConsumerRisk(0, 0.1, 0.02, new(-1, 1), 1e-6));
        Assert.Equal(0, GuardBand.ForConsumerRisk(0, 0.25, 0, new(-1, 1), 1e-9));
        Assert.True(GuardBand.ForConsumerRisk(0, 0.25, 0.1, new(-1, 1), 1e-4, smallest: -0.5) < 0);
    }

    [Fact]
    public void A_process_all_outside_leaves_nothing_to_accept()
    {
        double w = GuardBand.ForConsumerRisk(1.1, 0, 0.05, new(-1, 1), 1e-30);
        Assert.InRange(w, 0.3, 1);
    }

    /// <summary>
    /// Both sides counted: Q(g) + Q(T/u − g) = α. Recomputed with mpmath (check-values section 2). Where none exists the best reachable
    /// risk is 8.01 %, 4.55 %, 1.24 %.
    /// </summary>
    [Theory]
    [InlineData(4, 0.05, 1.796213)]
    [InlineData(5, 0.05, 1.648767)]
    [InlineData(5, 0.025, 1.982229)]
    [InlineData(6, 0.05, 1.644918)]
    [InlineData(6, 0.025, 1.960422)]
    [InlineData(6, 0.01, 2.330939)]
    [InlineData(8, 0.05, 1.644854)]
    [InlineData(8, 0.025, 1.959964)]
    [InlineData(8, 0.01, 2.326348)]
    [InlineData(double.PositiveInfinity, 0.01, 2.326348)]
    public void Guard_band_for_a_specific_risk(double widthOverU, double risk, double factor) =>
        Assert.Equal(factor, GuardBand.ForSpecificRisk(1, widthOverU, risk)!.Value, 6e-7);

    [Theory]
    [InlineData(3.5, 0.05)]
    [InlineData(4, 0.025)]
    [InlineData(5, 0.01)]
    public void No_specific_guard_band_when_the_station_is_too_uncertain(double widthOverU, double risk)
    {
        Assert.Null(GuardBand.ForSpecificRisk(1, widthOverU, risk));
        double enough = GuardBand.LargestUncertainty(widthOverU, risk);
        Assert.True(enough < 1);
        Assert.Equal(widthOverU / 2, GuardBand.ForSpecificRisk(enough * (1 - 1e-12), widthOverU, risk)!.Value, 1e-4);
        Assert.Null(GuardBand.ForSpecificRisk(enough * (1 + 1e-12), widthOverU, risk));
    }

    [Fact]
    public void A_perfect_measurement_needs_no_guard_band() => Assert.Equal(0, GuardBand.ForSpecificRisk(0, 1, 0.01));

    [Theory]
    [InlineData(0)]
    [InlineData(1)]
    [InlineData(double.NaN)]
    public void A_risk_lies_between_0_and_1(double risk)
    {
        Assert.Throws<ArgumentOutOfRangeException>(() => GuardBand.ForSpecificRisk(1, 10, risk));
        Assert.Throws<ArgumentOutOfRangeException>(() => GuardBand.ForConsumerRisk(0, 1, 1, new(-1, 1), risk));
        Assert.Throws<ArgumentOutOfRangeException>(() => GuardBand.LargestUncertainty(1, risk));
    }
}
