using System.Runtime.Intrinsics;
using BandSpec.Core.Numerics.RandomStreams;
using Lanes = System.Runtime.Intrinsics.Vector512<double>;

namespace BandSpec.Core.Numerics.RareEvents;

/// <summary>The probability that all readings of a standard normal <c>x</c> lie between their limits, by plain sampling.</summary>
internal static class AcceptanceProbability
{
    private const long FirstDraws = 1 << 14;

    /// <summary>Samples until the relative standard error is reached or the draws are used up.</summary>
    public static Estimate Of(Readings readings, ulong seed, double relativeError, long mostDraws)
    {
        ReadingSampler sampler = new(readings, seed);
        long draws = 0;
        long accepted = 0;
        for (long until = FirstDraws; ; until *= 2)
        {
            for (; draws < until; draws += 8)
                accepted += sampler.Accepted((ulong)draws);
            double share = (double)accepted / draws;
            Estimate estimate = new(share, Math.Sqrt(share * (1 - share) / draws), draws);
            if (estimate.RelativeError <= relativeError || 2 * draws > mostDraws)
                return estimate;
        }
    }

    private sealed class ReadingSampler(Readings readings, ulong seed)
    {
        private readonly RandomStream stream = RandomStream.Named("acceptance", seed);
        private readonly Lanes[] normals = new Lanes[readings.Dimensions + 2 + readings.Count];

        /// <summary>How many of eight draws are accepted.</summary>
        public int Accepted(ulong first)
        {
            stream.FillNormals(Vector512.Create(first) + RandomStream.LaneNumbers, 0, normals);
            ReadOnlySpan<Lanes> x = normals.AsSpan(0, readings.Dimensions);
            ReadOnlySpan<Lanes> noise = normals.AsSpan(readings.Dimensions);
            Lanes accepted = Lanes.AllBitsSet;
            for (int v = 0; v < readings.Count; v++)
                accepted &= readings.Within(v, readings.Exact(v, x), noise);
            return System.Numerics.BitOperations.PopCount(accepted.ExtractMostSignificantBits());
        }
    }
}
