namespace BandSpec.Core.Numerics.NestedModels;

/// <summary>A variance estimated as the excess of a mean square over what the members' own estimates scatter.</summary>
/// <param name="Variance">The estimate, not negative.</param>
/// <param name="Sampling">The mean square's part that is only the members' own uncertainty, not negative.</param>
/// <param name="StandardError">Standard error of the estimate from the expected information, positive; infinite when the readings say nothing.</param>
internal readonly record struct VarianceEstimate(double Variance, double Sampling, double StandardError)
{
    /// <summary>
    /// Degrees of freedom of the mean square: <c>2(σ² + v)²/Var(σ̂²)</c> (Satterthwaite 1946, Biometrics Bull. 2, 110-114). For complete
    /// readings the number of members less one for each mean taken out.
    /// </summary>
    public double Freedom => 2 * (Variance + Sampling) * (Variance + Sampling) / (StandardError * StandardError);

    /// <summary>
    /// Interval of the standard deviation: that of the mean square by its chi-square law, less the sampling part, which is known far better
    /// (Williams 1962, Biometrika 49, 278-281, and Tukey 1951). Reaches down to zero where the members' scatter can be all sampling.
    /// </summary>
    /// <param name="confidence">Two-sided confidence, such as 0.95.</param>
    public Interval SpreadInterval(double confidence)
    {
        if (!double.IsFinite(StandardError) || !(Freedom > 0))
            return new Interval(0, double.PositiveInfinity);
        double square = Variance + Sampling, freedom = Math.Max(1, Freedom), tail = (1 - confidence) / 2, sampling = Sampling;
        double Root(double quantile) => Math.Sqrt(Math.Max(0, (square * freedom / ChiSquared.Quantile(quantile, freedom)) - sampling));
        return new Interval(Root(1 - tail), Root(tail));
    }
}
