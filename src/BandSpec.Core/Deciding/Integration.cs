using BandSpec.Core.Numerics.RareEvents;

namespace BandSpec.Core.Deciding;

/// <summary>How carefully probabilities of whole units are integrated: to two percent of themselves, or until the points are used up.</summary>
internal static class Integration
{
    private const ulong Seed = 106;
    private const double RelativeError = 0.02;
    private const long MostDraws = 1 << 14;

    /// <summary>Tilts between which accepted units with rare events are looked for, from none to three limits' worth.</summary>
    private static readonly double[] Strengths = [0, 0.5, 1.2, 3];

    /// <summary>The probability that some event happens and all readings are accepted.</summary>
    /// <exception cref="OperationCanceledException">It was ended before the probability was as certain as it should be.</exception>
    public static EstimatedProbability Of(HalfSpaces events, Readings readings, CancellationToken cancellation)
    {
        cancellation.ThrowIfCancellationRequested();
        Estimate found = UnionProbability.Of(
            events, readings, readings.Count == 0 ? [0] : Strengths, Seed, RelativeError, MostDraws, firstBlocks: 1, cancellation);
        cancellation.ThrowIfCancellationRequested();
        return EstimatedProbability.Of(found);
    }
}
