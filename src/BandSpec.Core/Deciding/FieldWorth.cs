using BandSpec.Core.Numerics.RareEvents;
using BandSpec.Core.Requirements;
using BandSpec.Core.TestLimits;

namespace BandSpec.Core.Deciding;

/// <summary>
/// What a unit is worth in the field: how probable it is that it leaves the allowed error anywhere in the operating map, at any pressure and temperature,
/// new or at the end of life. The closed form's normal law is conditioned on the test readings.
/// </summary>
public sealed record FieldWorth
{
    /// <summary>For any unit made, tested or not.</summary>
    public required EstimatedProbability AnyUnit { get; init; }

    /// <summary>For a unit that the verification test accepted; 0 when nothing can be accepted.</summary>
    public required EstimatedProbability AcceptedUnit { get; init; }

    /// <summary>
    /// For a unit that reads exactly on an acceptance limit of one point: the limit of all points where that is worst, by the sum over places, sides and
    /// ages; <see langword="null"/> when nothing can be accepted.
    /// </summary>
    public LimitWorth? AtLimit { get; init; }

    /// <summary>The largest probability of leaving at one place, on one side, at one age, of any unit: the pointwise figure, in closed form.</summary>
    public required double LargestPointwise { get; init; }

    /// <summary>The worth under the limits of a set of verification points.</summary>
    /// <exception cref="OperationCanceledException">It was ended before all probabilities were there.</exception>
    internal static FieldWorth Of(
        Application application, UnitLaw law, RuleOutcome rule, IReadOnlyList<double> allowed, CancellationToken cancellation)
    {
        IReadOnlyList<VerificationPoint> points = rule.Points;
        UnitEvents events = new(law, application);
        HalfSpaces leaving = events.Leaving(allowed);
        bool canAccept = rule.Impossible.Count == 0;
        EstimatedProbability accepted = new EstimatedProbability(1, 0).Plus(rule.Rejected, -1);
        EstimatedProbability any = new(0, 0), both = new(0, 0);
        LimitWorth? limit = null;
        Parallel.Invoke(
            new ParallelOptions { CancellationToken = cancellation },
            () => any = Integration.Of(leaving, Readings.None(law.Dimensions), cancellation),
            () => both = canAccept ? Integration.Of(leaving, events.Readings(points), cancellation) : both,
            () => limit = canAccept ? WorstLimit(events, law, points, allowed, cancellation) : null);
        return new FieldWorth
        {
            LargestPointwise = law.LargestPointwise(allowed), AnyUnit = any, AcceptedUnit = EstimatedProbability.Quotient(both, accepted), AtLimit = limit,
        };
    }

    private static LimitWorth WorstLimit(
        UnitEvents events, UnitLaw law, IReadOnlyList<VerificationPoint> points, IReadOnlyList<double> allowed, CancellationToken cancellation)
    {
        (int place, double reading) = (from v in Enumerable.Range(0, points.Count)
                                       let limits = events.AcceptedAt(points[v])
                                       from at in new[] { limits.Lower, limits.Upper }
                                       select (v, at)).MaxBy(limit => law.SumGiven(limit.v, limit.at, allowed));
        HalfSpaces leaving = events.Leaving(allowed, error => law.Given(error, place, reading));
        return new(points[place].Id, reading, Integration.Of(leaving, Readings.None(law.Dimensions), cancellation));
    }
}

/// <summary>A unit that reads exactly on an acceptance limit.</summary>
/// <param name="Point">Id of the point.</param>
/// <param name="Reading">The reading as an error, %FS: the limit, with its sign.</param>
/// <param name="Leaving">How probable it is that it leaves the allowed error anywhere.</param>
public sealed record LimitWorth(string Point, double Reading, EstimatedProbability Leaving);
