using BandSpec.Core.Numerics.Dense;

namespace BandSpec.Core.Numerics.NestedModels;

/// <summary>
/// The likelihood of the nested random-coefficient model: unit <c>i</c> of lot <c>l</c> reads <c>y = Z(β + b_l + b_i) + ε</c> with
/// <c>b_l ~ N(0, σ²Λ_lΛ_lᵀ)</c>, <c>b_i ~ N(0, σ²Λ_wΛ_wᵀ)</c>, <c>ε ~ N(0, σ²)</c>; <c>β</c> and <c>σ²</c> are profiled out
/// (Laird &amp; Ware 1982, Biometrics 38, 963-974; restricted likelihood: Patterson &amp; Thompson 1971, Biometrika 58, 545-554; the factors
/// <c>Λ</c> relative to <c>σ</c>: Bates, Mächler, Bolker &amp; Walker 2015, J. Stat. Softw. 67(1), section 2). The factors may be singular.
/// </summary>
/// <param name="sample">The readings.</param>
/// <param name="restricted">Restricted likelihood (REML) rather than the full one (ML).</param>
internal sealed class NestedLikelihood(NestedSample sample, bool restricted)
{
    /// <summary>Readings less, with restricted likelihood, the means that are estimated: the divisor of the residual variance.</summary>
    public int Freedom { get; } = sample.Readings - (restricted ? sample.Coefficients : 0);

    /// <summary>The readings.</summary>
    public NestedSample Sample { get; } = sample;

    /// <summary>The likelihood and its slopes at two factors, each <c>q × q</c>.</summary>
    /// <exception cref="ArithmeticException">The readings do not determine the means.</exception>
    public NestedPoint At(Grid within, Grid between)
    {
        List<LotShare> lots = [.. Sample.Lots.Select(lot => new LotShare(lot, within, between))];
        OrthogonalStack whole = new(Sample.Coefficients);
        double logDeterminant = 0;
        foreach (LotShare lot in lots)
        {
            whole.AddRemainder(lot.Remainder);
            whole.Add(lot.Whitened);
            logDeterminant += lot.LogDeterminant;
        }

        (double[] mean, Grid covariance, double meansDeterminant) = Means(whole);
        double variance = whole.Remainder / Freedom;
        double deviance = logDeterminant + (restricted ? meansDeterminant : 0) + (Freedom * (1 + Math.Log(2 * Math.PI * variance)));
        NestedSlopes slopes = Slopes(lots, mean, restricted ? covariance : new Grid(mean.Length, mean.Length), variance);
        return new NestedPoint(deviance, variance, mean, covariance, slopes, lots);
    }

    /// <summary>Generalised least squares: <c>β = R⁻¹v</c>, <c>(XᵀV⁻¹X)⁻¹ = R⁻¹R⁻ᵀ</c>, <c>ln det XᵀV⁻¹X = 2Σ ln|R_jj|</c>.</summary>
    private static (double[] Mean, Grid Covariance, double LogDeterminant) Means(OrthogonalStack whole)
    {
        Grid upper = whole.Triangle;
        Grid inverse = new(upper.Rows, upper.Rows);
        double logDeterminant = 0;
        for (int i = upper.Rows - 1; i >= 0; i--)
        {
            double pivot = upper[i, i];
            if (pivot == 0 || !double.IsFinite(pivot))
                throw new ArithmeticException($"the readings do not determine the mean of coefficient {i}");
            logDeterminant += 2 * Math.Log(Math.Abs(pivot));
            Span<double> row = inverse.Row(i);
            row[i] = 1;
            for (int k = i + 1; k < upper.Rows; k++)
                Products.AddTo(row, -upper[i, k], inverse.Row(k));
            foreach (ref double cell in row)
                cell /= pivot;
        }

        return (inverse.Times(whole.Side), inverse.TimesTransposed(inverse), logDeterminant);
    }

    /// <summary>The slopes with respect to <c>ΛΛᵀ</c> of both levels: traces less squares of the weighted residuals.</summary>
    private static NestedSlopes Slopes(List<LotShare> lots, double[] mean, Grid covariance, double variance)
    {
        NestedSlopes slopes = new(mean.Length);
        foreach (LotShare lot in lots)
            lot.AddTo(slopes, mean, covariance, variance);
        return slopes;
    }
}
