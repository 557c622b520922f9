namespace BandSpec.Core.Numerics;

/// <summary>
/// What the scatter within groups and between their means says about all values together: the one-way analysis of variance, and how many
/// independent values the overall figures are worth.
/// </summary>
/// <param name="Within">Mean square within groups; the variance of all values when there is but one group.</param>
/// <param name="WithinFreedom">Its degrees of freedom.</param>
/// <param name="LongRun">
/// Variance of one value of any group, the within-group variance plus that between groups; that of all values when groups do not differ.
/// </param>
/// <param name="LongRunFreedom">Its degrees of freedom, fewer than n − 1 when the groups differ.</param>
/// <param name="MeanVariance">Variance of the overall mean.</param>
internal readonly record struct VarianceSplit(
    double Within, double WithinFreedom, double LongRun, double LongRunFreedom, double MeanVariance)
{
    /// <summary>Independent values that would fix the mean as well, counted in units of the within-group variance.</summary>
    public double WithinCount => Within > 0 ? Within / MeanVariance : double.PositiveInfinity;

    /// <summary>Independent values that would fix the mean as well, counted in units of the long-run variance.</summary>
    public double LongRunCount => LongRun > 0 ? LongRun / MeanVariance : double.PositiveInfinity;

    /// <summary>
    /// Splits groups of at least one value each. NaN throughout below two values.
    /// </summary>
    /// <remarks>
    /// With <c>n0 = (n − Σn_i²/n)/(k−1)</c> values a group, the long-run variance is <c>MS_w + (MS_b − MS_w)/n0</c>, free of bias; the variance of all
    /// values around one mean would be too small by about <c>1/k</c> of the part between groups. Its degrees of freedom follow Satterthwaite (1946,
    /// Biometrics Bull. 2, 110-114); the mean of n values has variance <c>MS_b/n</c>.
    /// </remarks>
    public static VarianceSplit Of(IReadOnlyCollection<Moments> groups)
    {
        var all = new Moments(0);
        foreach (Moments group in groups)
            all.Add(group);
        double n = all.Count, k = groups.Count, within = groups.Sum(group => group.SumOfSquares), overall = all.SumOfSquares / (n - 1);
        if (k < 2 || n <= k)
            return new(overall, n - 1, overall, n - 1, overall / n);
        double meanWithin = within / (n - k), meanBetween = Math.Max(0, all.SumOfSquares - within) / (k - 1);
        if (meanBetween <= meanWithin)
            return new(meanWithin, n - k, overall, n - 1, meanWithin / n);
        double size = (n - groups.Sum(group => (double)group.Count * group.Count) / n) / (k - 1);
        double fromWithin = meanWithin * (1 - 1 / size), fromBetween = meanBetween / size, sum = fromWithin + fromBetween;
        double freedom = sum * sum / (fromWithin * fromWithin / (n - k) + fromBetween * fromBetween / (k - 1));
        return new(meanWithin, n - k, sum, Math.Clamp(freedom, 1, n - 1), meanBetween / n);
    }
}
