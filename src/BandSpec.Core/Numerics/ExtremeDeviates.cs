namespace BandSpec.Core.Numerics;

/// <summary>
/// The generalized extreme studentized deviate test for outliers (Rosner 1983, Technometrics 25, 165-172): finds up to a given number without
/// being misled by several lying together. It needs only moments and the outermost values, so it runs on a stream.
/// </summary>
internal static class ExtremeDeviates
{
    /// <summary>
    /// Which of the outermost values are outliers of a normal population, at the significance level <paramref name="level"/>.
    /// </summary>
    /// <param name="moments">Moments of all values, the outermost included.</param>
    /// <param name="smallest">The smallest values, rising.</param>
    /// <param name="largest">The largest values, falling; as many as <paramref name="smallest"/>.</param>
    /// <param name="level">Chance of a finding in a normal sample, such as 0.05.</param>
    /// <returns>How many of the smallest and of the largest are outliers.</returns>
    /// <remarks>
    /// Below 15 values the approximation behind the critical values is poor for more than one outlier, so that only one is looked for, which is
    /// the exact test of Grubbs (1969). All values are taken to differ in place: smallest and largest overlap only for tiny samples.
    /// </remarks>
    public static (int Smallest, int Largest) Of(Moments moments, ReadOnlySpan<double> smallest, ReadOnlySpan<double> largest, double level)
    {
        long n = moments.Count, most = n < 3 ? 0 : n < 15 ? 1 : Math.Min(smallest.Length, n / 2);
        double mean = moments.Mean, squares = moments.SumOfSquares;
        int low = 0, high = 0;
        (int, int) found = (0, 0);
        for (int i = 1; i <= most && squares > 0; i++)
        {
            long left = n - i + 1;
            double below = mean - smallest[low], above = largest[high] - mean;
            double distance = Math.Max(below, above), deviate = distance / Math.Sqrt(squares / (left - 1));
            (low, high) = below > above ? (low + 1, high) : (low, high + 1);
            if (deviate > Critical(left, level))
                found = (low, high);
            double signed = below > above ? -below : above, shifted = signed / (left - 1);
            mean -= shifted;
            squares = Math.Max(0, squares - signed * (signed + shifted));
        }

        return found;
    }

    /// <summary><c>(n−1)·t/√(n·(n−2+t²))</c> with t the point of Student's law exceeded with probability <c>level/(2n)</c>, n values still in.</summary>
    private static double Critical(long n, double level)
    {
        double t = -NoncentralT.Quantile(level / (2 * n), n - 2, 0);
        return (n - 1) * t / Math.Sqrt(n * (n - 2 + t * t));
    }
}
