using BandSpec.Core.Allocating;
using BandSpec.Core.Bands;
using BandSpec.Core.Residuals;

namespace BandSpec.Core.TestLimits;

/// <summary>The variance of what comes through the correction when each term takes all that was allocated to it.</summary>
internal static class AllocatedVariance
{
    private static readonly ErrorTerm[] Residues = [ErrorTerm.ZeroResidue, ErrorTerm.SpanResidue, ErrorTerm.LinearityResidue];

    /// <summary>
    /// <c>Σ m_i² s_i² + Σ 2 m_i m_j max(0, c_ij)</c> over the three residues, plus carried noise with its multiplier and the standard with 1.
    /// </summary>
    /// <param name="shares">What compensation leaves.</param>
    /// <param name="covariance">Its covariances by group, within a lot or over lots.</param>
    /// <param name="multipliers">The allocation.</param>
    /// <param name="region">Index of the region whose multipliers hold.</param>
    public static double Of(ResidueShares shares, double[,] covariance, Multipliers multipliers, int region)
    {
        double noise = multipliers.Of(ErrorTerm.CarriedNoise, region);
        double sum = (noise * noise * shares.Carried) + shares.Standard;
        for (int i = 0; i < Residues.Length; i++)
            for (int j = 0; j < Residues.Length; j++)
                sum += multipliers.Of(Residues[i], region) * multipliers.Of(Residues[j], region) * Math.Max(0, covariance[i, j]);
        return sum;
    }
}
