using BandSpec.Core.Numerics.NestedModels;

namespace BandSpec.Core.Characterizing;

/// <summary>The most likely spreads of a set of columns, with or without correlations.</summary>
internal sealed class SpreadFit
{
    /// <summary>A hundredth of the deviance that a single parameter has to bring.</summary>
    private const double NearEnough = 0.03;

    private SpreadFit(NestedLikelihood likelihood, NestedFit fit, SharedCorrelationLaw law, bool[] within, bool[] between)
    {
        (Likelihood, Fit, Law) = (likelihood, fit, law);
        (FreeWithin, FreeBetween) = (within, between);
    }

    public NestedLikelihood Likelihood { get; }

    public NestedFit Fit { get; }

    public SharedCorrelationLaw Law { get; }

    /// <summary>Which columns may scatter within lots: all.</summary>
    public bool[] FreeWithin { get; }

    /// <summary>Which columns may scatter between lots: coefficients, when there are two lots or more.</summary>
    public bool[] FreeBetween { get; }

    /// <summary>How many means, spreads and correlations were estimated, the residual spread included.</summary>
    public int Parameters => FreeWithin.Length + Law.Start.Length + 1;

    /// <summary>The most likely spreads without correlations.</summary>
    /// <param name="sample">The readings on the columns.</param>
    /// <param name="columns">The columns.</param>
    /// <param name="restricted">Restricted likelihood, to the last digit; otherwise the full one, near enough to choose degrees by.</param>
    public static SpreadFit Of(NestedSample sample, IReadOnlyList<ReadingColumn> columns, bool restricted)
    {
        NestedLikelihood likelihood = new(sample, restricted);
        bool[] within = [.. columns.Select(_ => true)];
        bool[] between = [.. columns.Select(c => c.DiffersBetweenLots && sample.Lots.Count > 1)];
        (double[] sigma, double[] lotSigma) = NestedEstimation.RoughSpreads(likelihood, within, between);
        SharedCorrelationLaw law = new(sigma, lotSigma, [], []);
        return new SpreadFit(likelihood, NestedEstimation.Fit(likelihood, law, restricted ? 0 : NearEnough), law, within, between);
    }

    /// <summary>The most likely spreads with one more correlated pair, searched from this fit.</summary>
    public SpreadFit WithPair((int First, int Second) pair)
    {
        SharedCorrelationLaw law = Law.From(Fit.Parameters, pair);
        return new SpreadFit(Likelihood, NestedEstimation.Fit(Likelihood, law), law, FreeWithin, FreeBetween);
    }

    /// <summary>The correlated pairs with their values.</summary>
    public IEnumerable<((int First, int Second) Pair, double Value)> Correlations => Law.Pairs.Zip(Law.PairValues(Fit.Parameters));
}
