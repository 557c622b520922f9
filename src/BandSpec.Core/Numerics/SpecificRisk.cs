namespace BandSpec.Core.Numerics;

/// <summary>
/// What one reading says about the item it was taken from (JCGM 106:2012 clauses 6 and 7), with or without knowledge of the process.
/// </summary>
internal static class SpecificRisk
{
    /// <summary>
    /// Probability that the true value lies outside the tolerance when the item read <paramref name="reading"/> and nothing else is known:
    /// the truth is <c>N(reading, u²)</c>. One-sided at distance w inside a limit it is <c>Q(w/u)</c>. With u = 0 it is 0 or 1.
    /// </summary>
    public static double Nonconforming(double reading, double u, Interval tolerance)
    {
        if (u == 0)
            return tolerance.Contains(reading) ? 0 : 1;
        Interval z = tolerance.Standardize(reading, u);
        return NormalDistribution.UpperTail(z.Upper) + NormalDistribution.Cumulative(z.Lower);
    }

    /// <summary>
    /// Mean and standard deviation of the true value of an item that read <paramref name="reading"/>, from a process <c>N(mean, sigma²)</c>:
    /// <c>(σ²x + u²m)/(σ² + u²)</c> and <c>σu/√(σ² + u²)</c>. With both spreads 0 the mean is kept.
    /// </summary>
    public static (double Mean, double Sigma) Posterior(double reading, double mean, double sigma, double u)
    {
        double total = Math.Sqrt(sigma * sigma + u * u);
        if (total == 0)
            return (mean, 0);
        double weight = sigma / total * (sigma / total);
        return (mean + weight * (reading - mean), sigma / total * u);
    }

    /// <summary>Probability of nonconformance of an item that read <paramref name="reading"/>, the process being known.</summary>
    public static double NonconformingFromProcess(double reading, double mean, double sigma, double u, Interval tolerance)
    {
        (double posteriorMean, double posteriorSigma) = Posterior(reading, mean, sigma, u);
        return Nonconforming(posteriorMean, posteriorSigma, tolerance);
    }
}
