using BandSpec.Core.Numerics.RareEvents;

namespace BandSpec.Core.Deciding;

/// <summary>
/// A probability of many dependent normal events, integrated with numbered random points: the same on every machine and with any number of threads.
/// </summary>
/// <param name="Value">The probability.</param>
/// <param name="StandardError">Its standard error.</param>
public sealed record EstimatedProbability(double Value, double StandardError)
{
    private const double Quantile = 1.959963984540054;

    /// <summary>Lower end of the 95 % interval.</summary>
    public double Lower => Math.Max(0, Value - (Quantile * StandardError));

    /// <summary>Upper end of the 95 % interval.</summary>
    public double Upper => Math.Min(1, Value + (Quantile * StandardError));

    internal static EstimatedProbability Of(Estimate estimate) => new(Math.Min(1, estimate.Value), estimate.StandardError);

    /// <summary>One over the other, each with an error of its own; 0 over 0 is 0.</summary>
    internal static EstimatedProbability Quotient(EstimatedProbability above, EstimatedProbability below)
    {
        if (above.Value == 0 || below.Value == 0)
            return new(0, 0);
        double value = Math.Min(1, above.Value / below.Value), first = above.StandardError / above.Value, second = below.StandardError / below.Value;
        return new(value, value * Math.Sqrt((first * first) + (second * second)));
    }

    /// <summary>This, less and plus others; never below 0.</summary>
    internal EstimatedProbability Plus(EstimatedProbability other, int sign) => new(
        Math.Max(0, Value + (sign * other.Value)), Math.Sqrt((StandardError * StandardError) + (other.StandardError * other.StandardError)));
}
