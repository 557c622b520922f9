using BandSpec.Core.Numerics.NestedModels;
using Xunit;

namespace BandSpec.Tests.Characterizing;

/// <summary>
/// Published data sets (in the R package lme4 1.1-31, Debian bookworm) with known most likely covariances. The balanced ones have closed forms:
/// the covariance between subjects of their own least-squares lines, less what noise adds. Figures recomputed in R 4.2.2 and from the closed
/// form with mpmath to 12 digits and more; lme4's own search stops at four to five digits, so its printed figures are not used as expectations.
/// </summary>
public sealed class NestedModelFigures
{
    private static readonly Func<double, double[]> Line = x => [1, x];
    private static readonly Func<double, double[]> Level = _ => [1];

    [Theory]
    [InlineData(true, 251.40510484848, 10.467285959596, 24.740451464404, 5.9221331037319, 0.065551319654974, 1743.62827196)]
    [InlineData(false, 251.40510484848, 10.467285959596, 23.780566999193, 5.7168345425077, 0.081320075361983, 1751.93934446)]
    public void Sleepstudy_with_correlated_lines(bool restricted, double level, double slope, double s0, double s1, double r, double deviance)
    {
        NestedFit fit = Fit("sleepstudy", Line, restricted, [true, true], [false, false], [(0, 1)]);
        Near(level, fit.Mean[0]);
        Near(slope, fit.Mean[1]);
        Near(s0, Math.Sqrt(fit.Within[0, 0]), 1e-6);
        Near(s1, Math.Sqrt(fit.Within[1, 1]), 1e-6);
        Assert.Equal(r, fit.Within[0, 1] / Math.Sqrt(fit.Within[0, 0] * fit.Within[1, 1]), 6);
        Near(25.591815626725, fit.Residual, 1e-7);
        Assert.Equal(deviance, fit.Deviance, 8);
    }

    [Fact]
    public void The_free_law_and_the_law_of_spreads_and_correlations_meet_in_the_same_place()
    {
        NestedLikelihood likelihood = new(ReferenceData.Sample("sleepstudy", Line), restricted: true);
        (double[] within, double[] between) = NestedEstimation.RoughSpreads(likelihood, [true, true], [false, false]);
        NestedFactors start = new(Core.Numerics.Dense.Grid.Diagonal(within), Core.Numerics.Dense.Grid.Diagonal(between));
        NestedFit fit = NestedEstimation.Fit(likelihood, new FreeCovarianceLaw(start));
        Assert.Equal(1743.62827196, fit.Deviance, 8);
        Near(612.08993866253, fit.Within[0, 0], 1e-5);
        Near(9.6043333167441, fit.Within[0, 1], 1e-4);
        Near(35.071660498317, fit.Within[1, 1], 1e-5);
        Near(6.8245565321, Math.Sqrt(fit.MeanCovariance[0, 0]), 1e-6);
        Near(1.5457888963, Math.Sqrt(fit.MeanCovariance[1, 1]), 1e-6);
    }

    [Fact]
    public void Sleepstudy_with_independent_lines()
    {
        NestedFit fit = Fit("sleepstudy", Line, true, [true, true], [false, false], []);
        Assert.Equal(1743.66929358, fit.Deviance, 7);
        Near(25.051330, Math.Sqrt(fit.Within[0, 0]), 1e-5);
        Near(5.988172, Math.Sqrt(fit.Within[1, 1]), 1e-5);
        Near(25.565285, fit.Residual, 1e-6);
    }

    [Fact]
    public void Sleepstudy_with_a_common_slope()
    {
        NestedFit fit = Fit("sleepstudy", Line, true, [true, false], [false, false], []);
        Assert.Equal(1786.46508539, fit.Deviance, 7);
        Near(37.123827, Math.Sqrt(fit.Within[0, 0]), 1e-6);
        Near(30.991234, fit.Residual, 1e-6);
        Near(9.746716, Math.Sqrt(fit.MeanCovariance[0, 0]), 1e-6);
        Near(0.804221, Math.Sqrt(fit.MeanCovariance[1, 1]), 1e-6);
    }

    [Theory]
    [InlineData(true, 42.000595233877, 49.510099979701, 319.654276842)]
    [InlineData(false, 37.260345319566, 49.510099979701, 327.327059881)]
    public void Dyestuff(bool restricted, double spread, double residual, double deviance)
    {
        NestedFit fit = Fit("dyestuff", Level, restricted, [true], [false], []);
        Near(1527.5, fit.Mean[0]);
        Near(spread, Math.Sqrt(fit.Within[0, 0]), 1e-6);
        Near(residual, fit.Residual, 1e-7);
        Assert.Equal(deviance, fit.Deviance, 8);
    }

    [Theory]
    [InlineData(true, 3.715684274, 161.828277812, 0.678388)]
    [InlineData(false, 3.653231351, 162.873036654, 0.666986)]
    public void Dyestuff2_has_its_spread_at_the_boundary(bool restricted, double residual, double deviance, double standardError)
    {
        NestedFit fit = Fit("dyestuff2", Level, restricted, [true], [false], []);
        Near(5.6656, fit.Mean[0]);
        Assert.InRange(Math.Sqrt(fit.Within[0, 0]), 0, 1e-3);
        Near(residual, fit.Residual, 1e-6);
        Assert.Equal(deviance, fit.Deviance, 8);
        Near(standardError, Math.Sqrt(fit.MeanCovariance[0, 0]), 2e-6);
        Assert.True(fit.Point.Slopes.Within[0, 0] > 0, "the deviance rises when the spread leaves zero");
    }

    [Fact]
    public void Pastes_are_nested_casks_in_batches()
    {
        NestedFit fit = Fit("pastes", Level, true, [true], [true], []);
        Near(60.053333333, fit.Mean[0]);
        Near(0.676870, Math.Sqrt(fit.MeanCovariance[0, 0]), 1e-6);
        Near(2.9040776, Math.Sqrt(fit.Within[0, 0]), 1e-6);
        Near(1.2873652, Math.Sqrt(fit.Between[0, 0]), 1e-5);
        Near(0.8234075, fit.Residual, 1e-6);
        Assert.Equal(246.990745853, fit.Deviance, 8);
    }

    private static NestedFit Fit(
        string name, Func<double, double[]> regressors, bool restricted, bool[] within, bool[] between, (int, int)[] pairs)
    {
        NestedLikelihood likelihood = new(ReferenceData.Sample(name, regressors), restricted);
        (double[] sigma, double[] lotSigma) = NestedEstimation.RoughSpreads(likelihood, within, between);
        return NestedEstimation.Fit(likelihood, new SharedCorrelationLaw(sigma, lotSigma, pairs, [.. pairs.Select(_ => 0.0)]));
    }

    /// <summary>Relative agreement; 1e-9 where nothing else is said, since the means do not depend on how far the search went.</summary>
    private static void Near(double expected, double actual, double tolerance = 1e-9) =>
        Assert.InRange(actual, expected - (tolerance * Math.Abs(expected)), expected + (tolerance * Math.Abs(expected)));
}
