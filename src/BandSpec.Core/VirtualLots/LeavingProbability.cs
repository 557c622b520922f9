using BandSpec.Core.Numerics.RareEvents;
using BandSpec.Core.Specifying;

namespace BandSpec.Core.VirtualLots;

/// <summary>
/// How probable it is that a unit leaves the allowed error somewhere: at any pressure and temperature of the map, on either side, new or at
/// the end of life. Unlike the pointwise figure, which asks about one place, this asks about all of them together; it is larger than the
/// largest pointwise probability and smaller than the sum. For normal scatter, by importance sampling of a union of half-spaces (Owen,
/// Maximov and Chertkov, Electronic Journal of Statistics 13, 2019), down to 1e-12 and below. What is not normal in a unit enters with its
/// variance: the output's steps, which matter where acceptance limits are only a few steps wide, and unsettled temperature times the unit's
/// own slope, whose tails are heavier where it is a large part of the spread; virtual lots have both as they are.
/// </summary>
public sealed record LeavingProbability
{
    /// <summary>Strengths of the tilts between which acceptance is searched for: from none to three limits' worth.</summary>
    private static readonly double[] Strengths = [0, 0.5, 1.2, 3];

    /// <summary>For any unit made.</summary>
    public required SampledProbability AnyUnit { get; init; }

    /// <summary>For a unit that the verification test accepted; not a number when nothing can be accepted.</summary>
    public required SampledProbability AcceptedUnit { get; init; }

    /// <summary>Probability that a unit is accepted.</summary>
    public required SampledProbability Accepted { get; init; }

    /// <summary>The largest probability of leaving at one place, on one side, at one age: the pointwise figure.</summary>
    public required double LargestPointwise { get; init; }

    /// <summary>The sum of those probabilities over places, sides and ages, which the union cannot exceed.</summary>
    public required double SumPointwise { get; init; }

    /// <summary>Estimates the probabilities of a specification's units.</summary>
    /// <param name="specification">The specification.</param>
    /// <param name="seed">Root seed; the same seed gives the same figures on any number of threads.</param>
    /// <param name="relativeError">The relative standard error to reach, such as 0.01.</param>
    /// <param name="mostDraws">The most draws for each figure; when they are used up the error is what it is, and is stated.</param>
    /// <param name="cancellation">Ends the refinement; the estimates so far are returned.</param>
    /// <exception cref="ArgumentOutOfRangeException">The relative error is not between 0 and 1.</exception>
    public static LeavingProbability Of(
        Specification specification, ulong seed, double relativeError, long mostDraws, CancellationToken cancellation = default)
    {
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(relativeError);
        ArgumentOutOfRangeException.ThrowIfGreaterThanOrEqual(relativeError, 1);
        LotLaw law = new(LotSubject.Of(specification));
        LinearUnit unit = new(law);
        HalfSpaces events = LeavingEvents.Of(law, unit);
        Readings readings = law.Test.Linear(law, unit);
        TiltedEvents plain = new(events, new Tilt(readings, 0));
        Readings none = Readings.None(events.Dimensions);
        Estimate any = UnionProbability.Of(events, none, [0], seed, relativeError, mostDraws, cancellation: cancellation);
        Estimate accepted = AcceptanceProbability.Of(readings, seed, relativeError / 3, mostDraws);
        Estimate both = UnionProbability.Of(events, readings, Strengths, seed, relativeError, mostDraws, cancellation: cancellation);
        return new LeavingProbability
        {
            AnyUnit = SampledProbability.Of(any),
            Accepted = SampledProbability.Of(accepted),
            AcceptedUnit = SampledProbability.Quotient(both, accepted),
            LargestPointwise = Enumerable.Range(0, events.Count).Max(plain.Probability),
            SumPointwise = plain.Total,
        };
    }
}

/// <summary>A probability found by sampling.</summary>
/// <param name="Value">The estimate.</param>
/// <param name="StandardError">Its standard error.</param>
/// <param name="Draws">How many draws it rests on.</param>
public sealed record SampledProbability(double Value, double StandardError, long Draws)
{
    private const double Quantile = 1.959963984540054;

    /// <summary>Standard error over value; infinite for a value of 0.</summary>
    public double RelativeError => Value > 0 ? StandardError / Value : double.PositiveInfinity;

    /// <summary>Lower end of the 95 % interval.</summary>
    public double Lower => Math.Max(0, Value - (Quantile * StandardError));

    /// <summary>Upper end of the 95 % interval.</summary>
    public double Upper => Math.Min(1, Value + (Quantile * StandardError));

    internal static SampledProbability Of(Estimate estimate) => new(estimate.Value, estimate.StandardError, estimate.Draws);

    /// <summary>One over the other, both from draws of their own.</summary>
    internal static SampledProbability Quotient(Estimate above, Estimate below)
    {
        double value = above.Value / below.Value;
        double relative = above.Value > 0
            ? Math.Sqrt((above.RelativeError * above.RelativeError) + (below.RelativeError * below.RelativeError))
            : 0;
        return new SampledProbability(value, value * relative, above.Draws);
    }
}
