using BandSpec.Core.Numerics.RandomStreams;

namespace BandSpec.Core.Numerics.RareEvents;

/// <summary>Events under a tilted law: how probable each is, and how to draw from the law given that one of them happens.</summary>
internal sealed class TiltedEvents
{
    private readonly HalfSpaces events;
    private readonly double[] standardized;
    private readonly double[] spreads;
    private readonly double[] probabilities;
    private readonly double[] cumulative;
    private readonly double[][] covariances;

    /// <summary>The events under a law.</summary>
    public TiltedEvents(HalfSpaces events, Tilt tilt)
    {
        (this.events, Tilt) = (events, tilt);
        covariances = [.. Enumerable.Range(0, events.Count).Select(j => tilt.Covariance(events.Weight(j)))];
        spreads = [.. Enumerable.Range(0, events.Count).Select(j =>
            Math.Sqrt(Vectors.Dot(events.Weight(j), covariances[j]) + (events.Own(j) * events.Own(j))))];
        standardized = [.. Enumerable.Range(0, events.Count).Select(j =>
            (events.Threshold(j) - Vectors.Dot(events.Weight(j), tilt.Mean)) / spreads[j])];
        probabilities = [.. standardized.Select(NormalTail.Probability)];
        cumulative = new double[events.Count];
        for (int j = 0; j < events.Count; j++)
            cumulative[j] = Total += probabilities[j];
    }

    /// <summary>The law.</summary>
    public Tilt Tilt { get; }

    /// <summary>The sum of the events' probabilities, <c>μ̄</c>: a bound of the union's.</summary>
    public double Total { get; }

    /// <summary>The probability of an event.</summary>
    public double Probability(int j) => probabilities[j];

    /// <summary>An event, drawn in proportion to its probability.</summary>
    /// <param name="uniform">A uniform number in [0, 1).</param>
    public int Choose(double uniform)
    {
        int found = Array.BinarySearch(cumulative, uniform * Total);
        return Math.Min(found < 0 ? ~found : found + 1, cumulative.Length - 1);
    }

    /// <summary>
    /// Moves a draw of the law so that an event happens: the event's quantity is drawn anew from its upper tail, and everything else follows
    /// as far as it is correlated with it.
    /// </summary>
    /// <param name="j">The event.</param>
    /// <param name="uniform">A uniform number in [0, 1).</param>
    /// <param name="x">A draw of the law on entry, of the law given the event on return.</param>
    /// <param name="own">The event's own number, likewise; of no meaning for an event without.</param>
    public void Move(int j, double uniform, Span<double> x, ref double own)
    {
        double tail = (1 - uniform) * probabilities[j];
        double target = NormalTail.Quantile(tail) * spreads[j];
        double now = Vectors.Dot(events.Weight(j), x) - Vectors.Dot(events.Weight(j), Tilt.Mean) + (events.Own(j) * own);
        double step = (target - now) / (spreads[j] * spreads[j]);
        double[] covariance = covariances[j];
        for (int i = 0; i < x.Length; i++)
            x[i] = Math.FusedMultiplyAdd(step, covariance[i], x[i]);
        own += step * events.Own(j);
    }
}
