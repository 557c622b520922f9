using BandSpec.Core.Numerics.Dense;

namespace BandSpec.Core.Numerics.NestedModels;

/// <summary>The two factors of the nested model, relative to the residual standard deviation.</summary>
/// <param name="Within"><c>Λ_w</c>: units about their lot.</param>
/// <param name="Between"><c>Λ_l</c>: lots about the mean.</param>
internal sealed record NestedFactors(Grid Within, Grid Between);

/// <summary>Which covariances the nested model may have, as a function of free parameters that are of order 1 at the start.</summary>
internal interface ICovarianceLaw
{
    /// <summary>The parameters to start from.</summary>
    double[] Start { get; }

    /// <summary>About how strongly the deviance curves with each parameter at the start, above 0.</summary>
    double[] Curvature(int units, int lots);

    /// <summary>The factors; <see langword="null"/> where the parameters mean no covariance.</summary>
    NestedFactors? Factors(double[] parameters);

    /// <summary>The deviance's slope with respect to the parameters.</summary>
    double[] Slope(double[] parameters, NestedFactors factors, NestedSlopes slopes);

    /// <summary>
    /// A place from which the deviance falls although its slope vanishes: a spread at zero can be a summit between its two signs. Returns
    /// <see langword="null"/> when zero is where the spreads concerned belong.
    /// </summary>
    double[]? Downhill(double[] parameters, NestedSlopes slopes);
}
