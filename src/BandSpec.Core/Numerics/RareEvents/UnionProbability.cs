using System.Runtime.Intrinsics;
using Lanes = System.Runtime.Intrinsics.Vector512<double>;

namespace BandSpec.Core.Numerics.RareEvents;

/// <summary>An estimated probability.</summary>
/// <param name="Value">The estimate.</param>
/// <param name="StandardError">Its standard error.</param>
/// <param name="Draws">How many points it rests on.</param>
internal readonly record struct Estimate(double Value, double StandardError, long Draws)
{
    /// <summary>Standard error over value; infinite for a value of 0.</summary>
    public double RelativeError => Value > 0 ? StandardError / Value : double.PositiveInfinity;
}

/// <summary>The probability that something of a union of half-spaces happens, and is accepted, by importance sampling.</summary>
internal static class UnionProbability
{
    private const int BatchesInBlock = 256;
    private const double Negligible = 1e-5;

    /// <summary>
    /// Refines an estimate until its relative standard error is reached or the draws are used up. Draws are numbered, so the result does not
    /// depend on the number of threads.
    /// </summary>
    /// <param name="events">The events.</param>
    /// <param name="readings">What has to lie between limits; <see cref="Readings.None"/> for the plain union.</param>
    /// <param name="strengths">Tilts of the mixture; a single 0 for the plain union.</param>
    /// <param name="seed">Root seed.</param>
    /// <param name="relativeError">The relative standard error to reach.</param>
    /// <param name="mostDraws">The most points to draw.</param>
    /// <param name="firstBlocks">How many blocks of 2048 points the first look takes; fewer may miss a rare event and think the error too small.</param>
    /// <param name="cancellation">Ends the refinement; the estimate so far is returned.</param>
    public static Estimate Of(
        HalfSpaces events, Readings readings, ReadOnlySpan<double> strengths, ulong seed, double relativeError, long mostDraws,
        int firstBlocks = 8, CancellationToken cancellation = default)
    {
        Tilt[] tilts = [.. strengths.ToArray().Select(s => new Tilt(readings, s))];
        HalfSpaces kept = WithoutNegligible(events, tilts);
        TiltedEvents[] laws = [.. tilts.Select(t => new TiltedEvents(kept, t))];
        if (kept.Count == 0 || laws.All(l => l.Total == 0))
            return new Estimate(0, 0, 0);
        Sums sums = default;
        for (int blocks = firstBlocks; ; blocks *= 2)
        {
            sums = Draw(kept, readings, laws, seed, sums, blocks);
            Estimate estimate = sums.Estimate;
            if (estimate.RelativeError <= relativeError || estimate.Draws + (2L * blocks * BatchesInBlock * 8) > mostDraws
                || cancellation.IsCancellationRequested)
                return estimate;
        }
    }

    /// <summary>
    /// Without the events that together, under every law, have less than 1e-5 of the probability of the likeliest: that much the union can
    /// lose at most.
    /// </summary>
    private static HalfSpaces WithoutNegligible(HalfSpaces events, Tilt[] tilts)
    {
        HashSet<int> kept = [];
        foreach (Tilt tilt in tilts)
        {
            TiltedEvents law = new(events, tilt);
            int[] rising = [.. Enumerable.Range(0, events.Count).OrderBy(law.Probability)];
            double largest = rising.Length > 0 ? law.Probability(rising[^1]) : 0;
            double dropped = 0;
            foreach (int j in rising)
                if ((dropped += law.Probability(j)) > Negligible * largest)
                    kept.Add(j);
        }
        return events.Only([.. kept.Order()]);
    }

    private static Sums Draw(HalfSpaces events, Readings readings, TiltedEvents[] laws, ulong seed, Sums before, int blocks)
    {
        Sums[] found = new Sums[blocks];
        long first = before.Draws / (BatchesInBlock * 8);
        Parallel.For(
            0, blocks, () => new UnionSampler(events, readings, laws, seed),
            (block, _, sampler) =>
            {
                found[block] = DrawBlock(sampler, (ulong)(first + block) * BatchesInBlock);
                return sampler;
            },
            _ => { });
        return found.Aggregate(before, (sum, block) => sum.Plus(block));
    }

    private static Sums DrawBlock(UnionSampler sampler, ulong firstBatch)
    {
        Lanes sum = Lanes.Zero;
        Lanes squares = Lanes.Zero;
        for (ulong batch = 0; batch < BatchesInBlock; batch++)
        {
            Lanes weights = sampler.Weights(firstBatch + batch);
            sum += weights;
            squares = Vector512.FusedMultiplyAdd(weights, weights, squares);
        }
        return new Sums(BatchesInBlock * 8, Fold(sum), Fold(squares));
    }

    private static double Fold(Lanes lanes) =>
        ((lanes[0] + lanes[1]) + (lanes[2] + lanes[3])) + ((lanes[4] + lanes[5]) + (lanes[6] + lanes[7]));

    /// <summary>Sums of weights and of their squares.</summary>
    private readonly record struct Sums(long Draws, double Sum, double Squares)
    {
        public Estimate Estimate
        {
            get
            {
                double mean = Sum / Draws;
                return new Estimate(mean, Math.Sqrt(Math.Max(0, (Squares / Draws) - (mean * mean)) / Draws), Draws);
            }
        }

        public Sums Plus(Sums other) => new(Draws + other.Draws, Sum + other.Sum, Squares + other.Squares);
    }
}
