using BandSpec.Core.Numerics;

using Xunit;

namespace BandSpec.Tests.Numerics;

public sealed class SpecificRiskTests
{
    private const double Infinite = double.PositiveInfinity;

    /// <summary>
    /// ILAC-G8:09/2019 Table 1, guard band w in units of U = 2u, against exact normal tails (mpmath, recomputed; check-values section 2).
    /// The published "&lt; 0.16 %" for 3u and "&lt; 1 ppm" for 6u are loose bounds (trap T4).
    /// </summary>
    [Theory]
    [InlineData(3, 9.86587645038e-10, 1e-6)]
    [InlineData(1.5, 0.00134989803163, 0.0016)]
    [InlineData(1, 0.0227501319482, 0.025)]
    [InlineData(0.83, 0.0484572262667, 0.05)]
    [InlineData(0, 0.5, 0.5)]
    public void Guard_band_rules(double r, double exact, double published)
    {
        double u = 0.02, risk = SpecificRisk.Nonconforming(1 - r * 2 * u, u, new(-Infinite, 1));
        Close.Relative(exact, risk, 1e-11);
        Assert.True(risk <= published);
    }

    /// <summary>One-sided tails at factors in common use; 1.64 is slightly above 5 % (mpmath, recomputed; check-values section 2).</summary>
    [Theory]
    [InlineData(1.28, 0.100272567954)]
    [InlineData(1.64, 0.0505025834741)]
    [InlineData(1.645, 0.0499849055391)]
    [InlineData(1.65, 0.0494714680336)]
    [InlineData(1.96, 0.0249978951482)]
    [InlineData(2.58, 0.00494001575777)]
    public void One_sided_tails(double factor, double risk) => Close.Relative(risk, SpecificRisk.Nonconforming(-factor, 1, new(-Infinite, 0)), 1e-11);

    /// <summary>
    /// JCGM 106:2012 worked examples: Zener diode and oil viscosity. Inputs from memory, not found; results recomputed with mpmath
    /// (check-values section 1c); the document prints 0.92 and 0.66.
    /// </summary>
    [Theory]
    [InlineData(-5.47, 0.05, -Infinite, -5.40, 0.9192433)]
    [InlineData(13.6, 1.8, 12.5, 16.3, 0.6626298)]
    public void Conforming_probability_of_one_item(double reading, double u, double lower, double upper, double conforming) =>
        Assert.Equal(conforming, 1 - SpecificRisk.Nonconforming(reading, u, new(lower, upper)), 6e-8);

    /// <summary>Resistor of JCGM 106:2012 clause 9.5 with known process: recomputed with SciPy 1.10.1 (check-values section 1a).</summary>
    [Fact]
    public void Posterior_of_a_resistor_at_its_limits()
    {
        (double mean, double sigma) = SpecificRisk.Posterior(1500.18, 1500, 0.12, 0.04);
        Assert.Equal(1500.162, mean, 1e-10);
        Assert.Equal(0.0379473319, sigma, 6e-11);
        Interval tolerance = new(1499.8, 1500.2);
        Assert.Equal(0.8416803504, 1 - SpecificRisk.NonconformingFromProcess(1500.18, 1500, 0.12, 0.04, tolerance), 6e-11);
        Assert.Equal(0.7009192737, 1 - SpecificRisk.NonconformingFromProcess(1500.2, 1500, 0.12, 0.04, tolerance), 6e-11);
        Assert.Equal(1500.18, SpecificRisk.Posterior(1500.2, 1500, 0.12, 0.04).Mean, 1e-10);
    }

    [Fact]
    public void Without_any_spread_the_truth_is_known()
    {
        Assert.Equal((1, 0), SpecificRisk.Posterior(3, 1, 0, 0));
        Assert.Equal(0, SpecificRisk.Nonconforming(1, 0, new(-1, 1)));
        Assert.Equal(1, SpecificRisk.NonconformingFromProcess(0, 1.1, 0, 0, new(-1, 1)));
    }
}
