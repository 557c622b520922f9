using System.Runtime.Intrinsics;
using BandSpec.Core.Numerics;
using BandSpec.Core.Numerics.RandomStreams;
using BandSpec.Core.TestLimits;
using Lanes = System.Runtime.Intrinsics.Vector512<double>;

namespace BandSpec.Core.Deciding;

/// <summary>
/// Consumer's risk of the whole unit: that what it truly shows is beyond the tolerance at one test place at least, and that all readings are accepted.
/// An event for each place and side, "beyond here, and accepted here", has its probability and its law in closed form; one is drawn in proportion to its
/// probability, then a true value and a reading of it, then everything else given those. A point counts by what the mixture of all events gives it, so
/// that the estimate has no bias whatever the tables' cells. Proof: METHOD.md, section 15.
/// </summary>
internal sealed class WrongAcceptance
{
    private const ulong Seed = 106;
    private const double RelativeError = 0.02;
    private const long FirstDraws = 1 << 11, MostDraws = 1 << 14;

    private readonly int dimensions;
    private readonly PlaceLaw[] places;
    private readonly WrongTail[] tails;
    private readonly double total;
    private readonly RandomStream normals = RandomStream.Named("wrong-acceptance", Seed);
    private readonly RandomStream choices = RandomStream.Named("wrong-acceptance-choice", Seed);
    private readonly Lanes[] drawn;
    private readonly double[] numbers;
    private readonly double[] truths;

    private WrongAcceptance(UnitLaw law, UnitEvents events, IReadOnlyList<VerificationPoint> points)
    {
        dimensions = law.Dimensions;
        places =
        [
            .. points.Select((point, v) => new PlaceLaw(law.Shown(v), law.ReadingErrors(v), Interval.Symmetric(point.Tolerance.Percent), events.AcceptedAt(point))),
        ];
        tails = [.. Enumerable.Range(0, places.Length).SelectMany(v => new[] { -1, 1 }.Select(side => new WrongTail(places[v], v, side))).Where(t => t.Probability > 0)];
        total = tails.Sum(t => t.Probability);
        numbers = new double[dimensions + 2 + (2 * places.Length)];
        drawn = new Lanes[numbers.Length];
        truths = new double[places.Length];
    }

    /// <summary>The risk under the limits of a set of verification points, none of them impossible.</summary>
    /// <exception cref="OperationCanceledException">It was ended before the risk was as certain as it should be.</exception>
    public static EstimatedProbability Of(UnitLaw law, UnitEvents events, IReadOnlyList<VerificationPoint> points, CancellationToken cancellation) =>
        new WrongAcceptance(law, events, points).Estimate(cancellation);

    private EstimatedProbability Estimate(CancellationToken cancellation)
    {
        if (tails.Length == 0)
            return new(0, 0);
        double sum = 0, squares = 0;
        long draws = 0;
        for (long until = FirstDraws; ; until *= 2)
        {
            cancellation.ThrowIfCancellationRequested();
            for (; draws < until; draws += Vector512<double>.Count)
                Add((ulong)draws, ref sum, ref squares);
            double mean = sum / draws, error = Math.Sqrt(Math.Max(0, (squares / draws) - (mean * mean)) / draws);
            if (mean > 0 && error <= RelativeError * mean)
                return new(mean, error);
            // No unit was accepted at all: what one draw would have weighed, about the total, tells how little that says.
            if (until == MostDraws)
                return new(mean, mean > 0 ? error : total / draws);
        }
    }

    /// <summary>Eight draws.</summary>
    private void Add(ulong first, ref double sum, ref double squares)
    {
        Vector512<ulong> units = Vector512.Create(first) + RandomStream.LaneNumbers;
        normals.FillNormals(units, 0, drawn);
        (Lanes which, Lanes cell) = choices.Uniforms(units, 0);
        (Lanes within, Lanes reading) = choices.Uniforms(units, 1);
        for (int lane = 0; lane < Vector512<double>.Count; lane++)
        {
            for (int i = 0; i < numbers.Length; i++)
                numbers[i] = drawn[i][lane];
            double weight = Weight(Chosen(which[lane]), cell[lane], within[lane], reading[lane]);
            sum += weight;
            squares += weight * weight;
        }
    }

    private WrongTail Chosen(double uniform)
    {
        double left = uniform * total;
        foreach (WrongTail tail in tails)
            if ((left -= tail.Probability) < 0)
                return tail;
        return tails[^1];
    }

    /// <summary>The weight of a draw: the density of the unit's law over that of the mixture where all readings are accepted, 0 elsewhere.</summary>
    private double Weight(WrongTail chosen, double cell, double within, double reading)
    {
        double truth = chosen.True(cell, within);
        PlaceLaw place = places[chosen.Place];
        if (place.AcceptedGiven(truth) <= 0)
            return 0;
        Move(place.Shown.Weights, place.Shown.Own, chosen.Place, truth);
        MoveNoise(place, chosen.Place, place.ErrorGiven(truth, reading));
        for (int v = 0; v < places.Length; v++)
        {
            truths[v] = v == chosen.Place ? truth : True(v);
            // The chosen place was drawn to be accepted; its reading may miss its limit by rounding only.
            if (v != chosen.Place && !places[v].Accepted.Contains(truths[v] + Noise(places[v], v)))
                return 0;
        }

        double density = 0;
        foreach (WrongTail tail in tails)
            density += tail.Probability / total * tail.DensityRatio(truths[tail.Place]);
        return density > 0 ? 1 / density : 0;
    }

    /// <summary>Gives a place a true value; the numbers behind it follow as far as they are correlated with it.</summary>
    private void Move(double[] weights, double own, int place, double truth)
    {
        double step = (truth - True(place)) / (places[place].Sigma * places[place].Sigma);
        for (int i = 0; i < dimensions; i++)
            numbers[i] += step * weights[i];
        numbers[StepOf(place)] += step * own;
    }

    private void MoveNoise(PlaceLaw place, int v, double error)
    {
        if (place.ReadingVariance == 0)
            return;
        double step = (error - Noise(place, v)) / place.ReadingVariance;
        numbers[dimensions] += step * place.Zero;
        numbers[dimensions + 1] += step * place.Common;
        numbers[NoiseOf(v)] += step * place.Noise;
    }

    private double True(int v)
    {
        LinearError shown = places[v].Shown;
        return shown.Mean + Vectors.Dot(shown.Weights, numbers.AsSpan(0, dimensions)) + (shown.Own * numbers[StepOf(v)]);
    }

    private double Noise(PlaceLaw place, int v) =>
        (place.Zero * numbers[dimensions]) + (place.Common * numbers[dimensions + 1]) + (place.Noise * numbers[NoiseOf(v)]);

    private int StepOf(int place) => dimensions + 2 + place;

    private int NoiseOf(int place) => dimensions + 2 + places.Length + place;
}
