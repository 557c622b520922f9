namespace BandSpec.Core.Numerics;

/// <summary>
/// What the scatter within groups and between their means says about all values together: the one-way analysis of variance, and how many
/// independent values the overall figures are worth.
/// </summary>
/// <param name="Within">Mean square within groups; the overall variance when there is but one group.</param>
/// <param name="WithinFreedom">Its degrees of freedom.</param>
/// <param name="Overall">Variance of all values, n − 1 in the denominator.</param>
/// <param name="OverallFreedom">Its degrees of freedom, fewer than n − 1 when the groups differ.</param>
/// <param name="MeanVariance">Variance of the overall mean.</param>
internal readonly record struct VarianceSplit(
    double Within, double WithinFreedom, double Overall, double OverallFreedom, double MeanVariance)
{
    /// <summary>Independent values that would fix the mean as well, counted in units of the within-group variance.</summary>
    public double WithinCount => Within > 0 ? Within / MeanVariance : double.PositiveInfinity;

    /// <summary>Independent values that would fix the mean as well, counted in units of the overall variance.</summary>
    public double OverallCount => Overall > 0 ? Overall / MeanVariance : double.PositiveInfinity;

    /// <summary>
    /// Splits groups of at least one value each. NaN throughout below two values.
    /// </summary>
    /// <remarks>
    /// The overall variance is <c>((n−k)·MS_w + (k−1)·MS_b)/(n−1)</c>, whose degrees of freedom follow Satterthwaite (1946, Biometrics Bull. 2,
    /// 110-114); the mean of n values in k like groups has variance <c>MS_b/n</c>, here never taken below <c>MS_w/n</c>.
    /// </remarks>
    public static VarianceSplit Of(IReadOnlyCollection<Moments> groups)
    {
        var all = new Moments(0);
        foreach (Moments group in groups)
            all.Add(group);
        double n = all.Count, k = groups.Count, within = groups.Sum(group => group.SumOfSquares);
        double overall = all.SumOfSquares / (n - 1);
        if (k < 2 || n <= k)
            return new(overall, n - 1, overall, n - 1, overall / n);
        double meanWithin = within / (n - k), meanBetween = Math.Max(0, all.SumOfSquares - within) / (k - 1);
        double fromWithin = (n - k) * meanWithin / (n - 1), fromBetween = (k - 1) * meanBetween / (n - 1), sum = fromWithin + fromBetween;
        double freedom = sum > 0 ? sum * sum / (fromWithin * fromWithin / (n - k) + fromBetween * fromBetween / (k - 1)) : n - 1;
        return new(meanWithin, n - k, overall, Math.Clamp(freedom, 1, n - 1), Math.Max(meanBetween, meanWithin) / n);
    }
}
