using MathNet.Numerics.LinearAlgebra;

namespace BandSpec.Core.Numerics;

/// <summary>Eigenvalues of symmetric matrices.</summary>
internal static class Eigenvalues
{
    /// <summary>
    /// What an eigenvalue of a correlation matrix may be off by, for each row: its backward error is a few units of the last place of its norm,
    /// 2·10⁻¹⁶ each, and correlations are written with a handful of digits, so that 10⁻¹⁰ is far from both.
    /// </summary>
    public const double Rounding = 1e-10;

    /// <summary>The smallest eigenvalue of a symmetric matrix.</summary>
    public static double SmallestOf(double[,] symmetric) =>
        Matrix<double>.Build.DenseOfArray(symmetric).Evd(Symmetricity.Symmetric).EigenValues.Min(value => value.Real);
}
