using System.Globalization;
using BandSpec.Core.Numerics.Dense;
using BandSpec.Core.Numerics.NestedModels;
using BandSpec.Tests.Numerics;
using BandSpec.Tests.Reference;
using Xunit;

namespace BandSpec.Tests.Characterizing;

/// <summary>
/// Published data sets (in the R package lme4 1.1-31, Debian bookworm) with known most likely covariances. They are balanced, so that their figures
/// have closed forms: <c>Reference/nested-models.csv</c>, 16 digits made with mpmath by the script beside it, agreeing with what lme4 prints
/// (check-values, section 8) to the four to six digits at which its search stops.
/// </summary>
public sealed class NestedModelFigures
{
    /// <summary>What <c>lmer</c> of lme4 1.1-31 prints for minus twice the logarithm of the likelihood (check-values, section 8).</summary>
    private static readonly Dictionary<string, double> FromLme4 = new()
    {
        ["sleepstudy REML"] = 1743.62827196, ["sleepstudy ML"] = 1751.93934446, ["sleepstudy-independent REML"] = 1743.66929358,
        ["sleepstudy-level REML"] = 1786.46508539, ["dyestuff REML"] = 319.654276842, ["dyestuff ML"] = 327.327059881,
        ["dyestuff2 REML"] = 161.828277812, ["dyestuff2 ML"] = 162.873036654, ["pastes REML"] = 246.990745853,
    };

    public static TheoryData<string> Models { get; } = [.. ReferenceTable.Rows("nested-models.csv").Select(cells => $"{cells[0]} {cells[1]}")];

    [Theory]
    [MemberData(nameof(Models))]
    public void The_closed_form_is_met(string model)
    {
        (NestedFit fit, double[] known) = Fit(model);
        int terms = fit.Mean.Length;
        for (int j = 0; j < terms; j++)
        {
            // The means of balanced data do not depend on how far the search went; spreads do by the square root of the deviance's last digits.
            Close.Relative(known[j], fit.Mean[j], 1e-9, "mean");
            Close.Relative(known[2 + j], Math.Sqrt(fit.MeanCovariance[j, j]), 1e-6, "error of the mean");
            Spread(known[4 + j], fit.Within[j, j], 1e-6);
        }

        if (terms > 1 && known[6] != 0)
            Assert.Equal(known[6], fit.Within[0, 1] / Math.Sqrt(fit.Within[0, 0] * fit.Within[1, 1]), 1e-6);
        Spread(known[7], fit.Between[0, 0], 1e-5);
        Close.Relative(known[8], fit.Residual, 1e-6, "residual");
        Assert.Equal(known[9], fit.Deviance, 1e-8);
        Assert.Equal(FromLme4[model], fit.Deviance, 1e-8);
    }

    [Fact]
    public void The_free_law_and_the_law_of_spreads_and_correlations_meet_in_the_same_place()
    {
        NestedLikelihood likelihood = new(ReferenceData.Sample("sleepstudy", x => [1, x]), restricted: true);
        (double[] within, double[] between) = NestedEstimation.RoughSpreads(likelihood, [true, true], [false, false]);
        NestedFit free = NestedEstimation.Fit(likelihood, new FreeCovarianceLaw(new NestedFactors(Grid.Diagonal(within), Grid.Diagonal(between))));
        double[] known = Fit("sleepstudy REML").Known;
        Assert.Equal(known[9], free.Deviance, 1e-8);
        Spread(known[4], free.Within[0, 0], 1e-5);
        Spread(known[5], free.Within[1, 1], 1e-5);
        Close.Relative(known[4] * known[5] * known[6], free.Within[0, 1], 1e-4, "covariance");
    }

    [Theory]
    [InlineData("dyestuff2 REML")]
    [InlineData("dyestuff2 ML")]
    public void At_the_boundary_the_deviance_rises_when_the_spread_leaves_zero(string model) =>
        Assert.True(Fit(model).Fit.Point.Slopes.Within[0, 0] > 0);

    private static (NestedFit Fit, double[] Known) Fit(string model)
    {
        string[] cells = ReferenceTable.Rows("nested-models.csv").Single(row => $"{row[0]} {row[1]}" == model);
        string[] words = cells[0].Split('-');
        bool isLine = words[0] == "sleepstudy", hasSlopes = isLine && words[^1] != "level", hasLots = words[0] == "pastes";
        Func<double, double[]> regressors = isLine ? x => [1, x] : _ => [1];
        NestedLikelihood likelihood = new(ReferenceData.Sample(words[0], regressors), restricted: cells[1] == "REML");
        (double[] sigma, double[] lotSigma) = NestedEstimation.RoughSpreads(
            likelihood, isLine ? [true, hasSlopes] : [true], isLine ? [false, false] : [hasLots]);
        (int, int)[] pairs = hasSlopes && words.Length == 1 ? [(0, 1)] : [];
        NestedFit fit = NestedEstimation.Fit(likelihood, new SharedCorrelationLaw(sigma, lotSigma, pairs, [.. pairs.Select(_ => 0.0)]));
        return (fit, [.. cells.Skip(2).Select(cell => double.Parse(cell, CultureInfo.InvariantCulture))]);
    }

    /// <summary>A standard deviation against a variance; one that is zero against less than a thousandth.</summary>
    private static void Spread(double expected, double variance, double tolerance)
    {
        if (expected == 0)
            Assert.InRange(Math.Sqrt(variance), 0, 1e-3);
        else
            Close.Relative(expected, Math.Sqrt(variance), tolerance, "spread");
    }
}
