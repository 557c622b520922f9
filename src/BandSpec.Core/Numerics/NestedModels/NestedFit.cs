using BandSpec.Core.Numerics.Dense;
using BandSpec.Core.Numerics.Minimizing;

namespace BandSpec.Core.Numerics.NestedModels;

/// <summary>The most likely covariances under a law, and the means that go with them.</summary>
/// <param name="Parameters">The law's parameters.</param>
/// <param name="Factors">The factors they stand for, relative to <c>σ</c>.</param>
/// <param name="Point">The likelihood there.</param>
/// <param name="End">How the search ended.</param>
/// <param name="Evaluations">How often the likelihood was evaluated.</param>
internal sealed record NestedFit(double[] Parameters, NestedFactors Factors, NestedPoint Point, MinimizingEnd End, int Evaluations)
{
    /// <summary>Minus twice the logarithm of the likelihood.</summary>
    public double Deviance => Point.Deviance;

    /// <summary>Residual standard deviation <c>σ</c>.</summary>
    public double Residual => Math.Sqrt(Point.Variance);

    /// <summary>Means <c>β</c>.</summary>
    public double[] Mean => Point.Mean;

    /// <summary>Covariance of the means, <c>σ²(XᵀV⁻¹X)⁻¹</c>.</summary>
    public Grid MeanCovariance => Point.MeanCovariance.ScaledBy(Point.Variance);

    /// <summary><c>Σ_w</c>.</summary>
    public Grid Within => Covariance(Factors.Within);

    /// <summary><c>Σ_l</c>.</summary>
    public Grid Between => Covariance(Factors.Between);

    private Grid Covariance(Grid factor) => factor.TimesTransposed(factor).ScaledBy(Point.Variance);
}
