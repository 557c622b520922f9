using BandSpec.Core.Numerics;
using BandSpec.Tests.Reference;

using Xunit;

namespace BandSpec.Tests.Numerics;

public sealed class ConformityRiskTests
{
    private const double Infinite = double.PositiveInfinity;

    /// <summary>conformity-risk.csv: mpmath quadrature, SciPy's bivariate normal as witness; recomputed.</summary>
    [Fact]
    public void Agrees_with_the_table_down_to_tiny_risks()
    {
        foreach (double[] row in ReferenceTable.Numbers("conformity-risk.csv"))
        {
            static double end(double value) => Math.Abs(value) == 1000 ? Math.Sign(value) * Infinite : value;
            Interval tolerance = new(end(row[3]), end(row[4])), acceptance = new(end(row[5]), end(row[6]));
            ConformityRisks risks = ConformityRisk.Of(row[0], row[1], row[2], tolerance, acceptance);
            string what = string.Join(' ', row[..7]);
            const double Allowed = 1e-13;
            Close.Relative(row[7], risks.Consumer, Allowed, $"consumer {what}");
            Close.Relative(row[8], risks.Producer, Allowed, $"producer {what}");
            Close.Relative(row[9], risks.Acceptance, Allowed, $"accepted {what}");
            Close.Relative(row[10], risks.Conformance, Allowed, $"conforming {what}");
        }
    }

    /// <summary>
    /// JCGM 106:2012 clause 9.5, resistors 1500 Ω ± 0.2 Ω, u0 = 0.12 Ω, u_m = 0.04 Ω. Inputs found in a secondary text; figures recomputed
    /// with SciPy 1.10.1 and mpmath (check-values section 1a). A teaching copy prints 0.905 for p_c; 0.904419 is right (trap T9).
    /// </summary>
    [Theory]
    [InlineData(-0.08, 0.06940461001, 0.000680600974, 0.9731433, 0.0713200)]
    [InlineData(-0.04, 0.04489816528, 0.007097031855, 0.9422204, 0.0476514)]
    [InlineData(0, 0.01894220672, 0.03720780018, 0.8861537, 0.0213758)]
    [InlineData(0.01, 0.0139623173, 0.05145757444, 0.8669240, 0.0161056)]
    [InlineData(0.02, 0.009878291522, 0.06902651046, 0.8452711, 0.0116865)]
    [InlineData(0.04, 0.004334072222, 0.1146565784, 0.7940968, 0.0054579)]
    [InlineData(0.08, 0.0004686335989, 0.2476696402, 0.6572183, 0.0007131)]
    public void Resistor_production(double w, double consumer, double producer, double accepted, double nonconformingGivenAccepted)
    {
        ConformityRisks risks = ConformityRisk.Symmetric(0, 0.12, 0.04, 0.2, 0.2 - w);
        Close.Relative(consumer, risks.Consumer, 1e-9);
        Close.Relative(producer, risks.Producer, 1e-9);
        Assert.Equal(accepted, risks.Acceptance, 5e-8);
        Assert.Equal(nonconformingGivenAccepted, risks.NonconformingGivenAccepted, 5e-8);
        // The source took 1499.8 and 1500.2 as doubles, which are off by 1e-13 relative to the tolerance.
        Close.Relative(0.9044192954544461, risks.Conformance, 1e-12);
    }

    [Fact]
    public void The_four_ways_to_end_add_up()
    {
        ConformityRisks risks = ConformityRisk.Of(0.3, 0.4, 0.2, new(-1, 0.8), new(-0.9, 0.9));
        double acceptedConforming = risks.Acceptance - risks.Consumer;
        Assert.Equal(risks.Conformance, acceptedConforming + risks.Producer, 1e-15);
    }

    [Fact]
    public void A_process_without_spread_is_one_value()
    {
        ConformityRisks inside = ConformityRisk.Symmetric(0.3, 0, 0.1, 0.5, 0.4);
        Close.Relative(NormalDistribution.UpperTail(1) + NormalDistribution.UpperTail(7), inside.Producer, 1e-14);
        Assert.Equal((0, 1), (inside.Consumer, inside.Conformance));
        ConformityRisks outside = ConformityRisk.Symmetric(0.6, 0, 0.1, 0.5, 0.4);
        Close.Relative(NormalDistribution.FractionBetween(new(-10, -2)), outside.Consumer, 1e-14);
        Assert.Equal((0, 0), (outside.Producer, outside.Conformance));
        Assert.Equal(new(0, 0, 1, 1), ConformityRisk.Symmetric(0.5, 0, 0, 0.5, 0.5));
        Assert.Equal(new(0, 1, 0, 1), ConformityRisk.Symmetric(0.5, 0, 0, 0.5, 0.4));
        Assert.Equal(new(1, 0, 1, 0), ConformityRisk.Symmetric(0.5, 0, 0, 0.4, 0.5));
    }

    [Fact]
    public void A_perfect_measurement_errs_only_where_the_limits_differ()
    {
        ConformityRisks guarded = ConformityRisk.Symmetric(0, 0.25, 0, 1, 0.75);
        Assert.Equal(0, guarded.Consumer);
        Close.Relative(2 * NormalDistribution.FractionBetween(new(3, 4)), guarded.Producer, 1e-15);
        ConformityRisks lenient = ConformityRisk.Symmetric(0, 0.25, 0, 0.75, 1);
        Assert.Equal(0, lenient.Producer);
        Close.Relative(2 * NormalDistribution.FractionBetween(new(3, 4)), lenient.Consumer, 1e-15);
    }

    [Fact]
    public void An_empty_acceptance_interval_rejects_all() =>
        Assert.Equal(new(0, NormalDistribution.FractionBetween(new(-4, 4)), 0, NormalDistribution.FractionBetween(new(-4, 4))),
            ConformityRisk.Symmetric(0, 0.25, 0.1, 1, -0.01));

    /// <summary>The naive way: a fine midpoint sum over the true value.</summary>
    [Fact]
    public void Agrees_with_a_plain_sum()
    {
        // The limits ±0.7 fall on edges between steps, so that the sum is of second order.
        const int Steps = 70_000;
        double mean = 0.1, sigma = 0.3, u = 0.15, consumer = 0;
        for (int k = 0; k < Steps; k++)
        {
            double y = -3.5 + 7 * (k + 0.5) / Steps;
            if (Math.Abs(y) <= 0.7)
                continue;
            double accepted = NormalDistribution.Cumulative((0.6 - y) / u) - NormalDistribution.Cumulative((-0.6 - y) / u);
            consumer += NormalDistribution.Density((y - mean) / sigma) / sigma * accepted * 7 / Steps;
        }
        Close.Relative(consumer, ConformityRisk.Symmetric(mean, sigma, u, 0.7, 0.6).Consumer, 1e-6);
    }
}
