using BandSpec.Core.Numerics.Dense;

namespace BandSpec.Core.Numerics.NestedModels;

/// <summary>The likelihood at one pair of factors.</summary>
/// <param name="Deviance">Minus twice the logarithm of the profiled likelihood.</param>
/// <param name="Variance">The residual variance <c>σ²</c> that goes with it.</param>
/// <param name="Mean">The means <c>β</c>.</param>
/// <param name="MeanCovariance">Covariance of the means as a multiple of <c>σ²</c>.</param>
/// <param name="Slopes">How the deviance changes with the covariances.</param>
/// <param name="Lots">What each lot contributed, for what is predicted and judged afterwards.</param>
internal sealed record NestedPoint(
    double Deviance, double Variance, double[] Mean, Grid MeanCovariance, NestedSlopes Slopes, IReadOnlyList<LotShare> Lots);

/// <summary>
/// How the profiled deviance changes with the covariances relative to <c>σ²</c>: <c>d dev = tr(W·dΣ_w) + tr(B·dΣ_l)</c>, with
/// <c>W = Σ_i (Z_iᵀPZ_i − Z_iᵀPy yᵀPZ_i/σ²)</c> over units and <c>B</c> likewise over lots
/// (<c>P = V⁻¹ − V⁻¹X(XᵀV⁻¹X)⁻¹XᵀV⁻¹</c>; Searle, Casella &amp; McCulloch, Variance Components, 1992, section 6.6).
/// </summary>
/// <param name="size">How many coefficients there are.</param>
internal sealed class NestedSlopes(int size)
{
    /// <summary><c>W</c>, symmetric.</summary>
    public Grid Within { get; } = new(size, size);

    /// <summary><c>B</c>, symmetric.</summary>
    public Grid Between { get; } = new(size, size);
}
