using BandSpec.Core.Numerics;
using BandSpec.Core.Numerics.RandomStreams;
using BandSpec.Core.TestLimits;

namespace BandSpec.Core.Deciding;

/// <summary>What a unit truly shows and reads at one test place, errors in %FS.</summary>
internal sealed class PlaceLaw
{
    /// <summary>The law of a place.</summary>
    /// <param name="shown">What a unit truly shows.</param>
    /// <param name="reading">Standard deviations of the reading's own noise and of its shares in the standard's two errors.</param>
    /// <param name="tolerance">The tolerance.</param>
    /// <param name="accepted">The acceptance interval.</param>
    public PlaceLaw(LinearError shown, (double Own, double CommonZero, double Common) reading, Interval tolerance, Interval accepted)
    {
        (Shown, Tolerance, Accepted) = (shown, tolerance, accepted);
        (Noise, Zero, Common) = reading;
        Sigma = shown.Sigma;
        ReadingVariance = (Noise * Noise) + (Zero * Zero) + (Common * Common);
    }

    /// <summary>What a unit truly shows, as a linear function of the numbers behind it.</summary>
    public LinearError Shown { get; }

    /// <summary>Standard deviation of what it truly shows.</summary>
    public double Sigma { get; }

    /// <summary>The tolerance.</summary>
    public Interval Tolerance { get; }

    /// <summary>The acceptance interval.</summary>
    public Interval Accepted { get; }

    /// <summary>Standard deviation of the reading's own noise.</summary>
    public double Noise { get; }

    /// <summary>Standard deviation of the standard's error that is the same in all readings.</summary>
    public double Zero { get; }

    /// <summary>Standard deviation of its share in the standard's proportional error.</summary>
    public double Common { get; }

    /// <summary>Variance of what a reading adds.</summary>
    public double ReadingVariance { get; }

    private double ReadingSigma => Math.Sqrt(ReadingVariance);

    /// <summary>Density of a true value.</summary>
    public double Density(double truth) => NormalDistribution.Density((truth - Shown.Mean) / Sigma) / Sigma;

    /// <summary>Probability that a true value is read within the acceptance interval.</summary>
    public double AcceptedGiven(double truth)
    {
        if (ReadingVariance == 0)
            return Accepted.Contains(truth) ? 1 : 0;
        (double lower, double upper, _) = Tails(truth);
        return lower - upper;
    }

    /// <summary>What the reading adds to a true value when it is accepted.</summary>
    /// <param name="truth">The true value; its acceptance is not impossible.</param>
    /// <param name="uniform">A uniform number in [0, 1).</param>
    public double ErrorGiven(double truth, double uniform)
    {
        if (ReadingVariance == 0)
            return 0;
        (double lower, double upper, int side) = Tails(truth);
        return side * ReadingSigma * NormalTail.Quantile(Math.Max(double.Epsilon, lower - (uniform * (lower - upper))));
    }

    /// <summary>Upper tails at both ends of the acceptance interval, seen from the side on which they are small; the larger comes first.</summary>
    private (double Lower, double Upper, int Side) Tails(double truth)
    {
        Interval z = Accepted.Standardize(truth, ReadingSigma);
        return z.Lower + z.Upper >= 0
            ? (NormalDistribution.UpperTail(z.Lower), NormalDistribution.UpperTail(z.Upper), 1)
            : (NormalDistribution.UpperTail(-z.Upper), NormalDistribution.UpperTail(-z.Lower), -1);
    }
}
