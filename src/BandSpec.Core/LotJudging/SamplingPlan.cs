using BandSpec.Core.Numerics;

namespace BandSpec.Core.LotJudging;

/// <summary>What has to be observed on a sample so that a capability is proven.</summary>
/// <param name="Units">Units in the sample.</param>
/// <param name="Observe">The smallest observed index whose lower confidence limit reaches the capability demanded.</param>
/// <param name="Chance">
/// How likely a process of the expected capability, centred, shows at least that index; <see langword="null"/> when no capability is expected.
/// </param>
public sealed record SamplingStep(int Units, double Observe, double? Chance)
{
    /// <summary>The sizes a plan shows.</summary>
    public static IReadOnlyList<int> UsualSizes { get; } = [5, 10, 15, 20, 25, 30, 40, 50, 77, 100, 125, 150, 200, 300, 500, 1000];

    /// <summary>
    /// One step. The index to observe is a third of the one-sided tolerance factor for the fraction <c>Φ(3C)</c> (ISO 16269-6): reaching it proves
    /// C whatever the process' place between the limits.
    /// </summary>
    /// <param name="units">Units in the sample, at least 2.</param>
    /// <param name="demanded">The capability to prove, above 0.</param>
    /// <param name="confidence">Confidence of the proof, between 0 and 1.</param>
    /// <param name="expected">The capability that the process is thought to have; may be <see langword="null"/>.</param>
    /// <exception cref="ArgumentOutOfRangeException">A number is out of its range.</exception>
    public static SamplingStep Of(int units, double demanded, double confidence, double? expected = null)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(units, 2);
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(demanded);
        if (!(confidence is > 0 and < 1))
            throw new ArgumentOutOfRangeException(nameof(confidence), confidence, "a confidence lies between 0 and 1");
        double scale = 3 * Math.Sqrt(units), observe = NoncentralT.Quantile(confidence, units - 1, scale * demanded) / scale;
        return new(units, observe, expected is { } index ? CapabilityLaw.AtLeast(observe, index, 0, units, units - 1) : null);
    }

    /// <summary>
    /// The fewest units with which a process of the expected capability, centred, passes with the chance asked for; <see langword="null"/> when more
    /// than a million would be needed, as when it hardly exceeds what is demanded.
    /// </summary>
    /// <param name="demanded">The capability to prove, above 0.</param>
    /// <param name="confidence">Confidence of the proof, between 0 and 1.</param>
    /// <param name="expected">The capability that the process is thought to have.</param>
    /// <param name="chance">How likely it is to pass, such as 0.9.</param>
    public static SamplingStep? Smallest(double demanded, double confidence, double expected, double chance)
    {
        const int Most = 1_000_000;
        bool passes(int units) => Of(units, demanded, confidence, expected).Chance >= chance;
        if (expected <= demanded)
            return null;
        int fails = 1, holds = 2;
        while (!passes(holds))
        {
            if (holds >= Most)
                return null;
            (fails, holds) = (holds, Math.Min(2 * holds, Most));
        }

        while (holds - fails > 1)
            (fails, holds) = passes((fails + holds) / 2) ? (fails, (fails + holds) / 2) : ((fails + holds) / 2, holds);
        return Of(holds, demanded, confidence, expected);
    }
}
