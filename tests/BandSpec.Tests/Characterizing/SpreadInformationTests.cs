using BandSpec.Core.Numerics.Dense;
using BandSpec.Core.Numerics.NestedModels;
using BandSpec.Tests.Numerics;
using Xunit;

namespace BandSpec.Tests.Characterizing;

/// <summary>The accuracy of estimated variances against the closed forms of balanced one-way data.</summary>
public sealed class SpreadInformationTests
{
    /// <summary>
    /// 6 batches of 5: <c>Var(σ̂_b²) = 2/n²·(MSB²/(b − 1) + MSE²/(b(n − 1)))</c> with the mean squares at their expectations (Searle, Casella and
    /// McCulloch 1992, section 4.5, clause from memory, not found). MSB 11271.5, MSE 2451.25: see check-value section 8, recomputed.
    /// </summary>
    [Fact]
    public void Dyestuff()
    {
        NestedLikelihood likelihood = new(ReferenceData.Sample("dyestuff", _ => [1]), restricted: true);
        (double[] within, double[] between) = NestedEstimation.RoughSpreads(likelihood, [true], [false]);
        NestedFit fit = NestedEstimation.Fit(likelihood, new SharedCorrelationLaw(within, between, [], []));
        VarianceEstimates found = VarianceEstimates.Of(likelihood, fit, [true], [false]);

        double variance = 2.0 / 25 * ((11271.5 * 11271.5 / 5) + (2451.25 * 2451.25 / 24));
        Close.Relative(Math.Sqrt(variance), found.Within[0].StandardError, 1e-5);
        Close.Relative(2451.25 * Math.Sqrt(2.0 / 24), found.Residual.StandardError, 1e-5);
        Close.Relative(2451.25 / 5, found.Within[0].Sampling, 1e-5);
        Assert.Equal(double.PositiveInfinity, found.Between[0].StandardError);
    }

    [Fact]
    public void The_fast_sums_over_lots_agree_with_the_plain_sum_over_pairs_of_readings()
    {
        NestedSample sample = ReferenceData.Sample("pastes", _ => [1]);
        NestedLikelihood likelihood = new(sample, restricted: true);
        const double Within = 9, Between = 2;
        NestedPoint point = likelihood.At(Grid.Diagonal([Math.Sqrt(Within)]), Grid.Diagonal([Math.Sqrt(Between)]));
        Grid fast = new SpreadInformation(point, [Within], [Between], likelihood.Freedom).Matrix();
        double[,] plain = PlainInformation.Of(ReferenceData.Load("pastes"), Within, Between);
        for (int a = 0; a < 3; a++)
            for (int b = 0; b < 3; b++)
                Close.Relative(plain[a, b], fast[a, b], 1e-10, $"{a},{b}");
    }
}
