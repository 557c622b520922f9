using BandSpec.Core.Quantities;

namespace BandSpec.Core.Requirements;

/// <summary>Which of the feasible plans is the best.</summary>
public enum PlanObjective
{
    /// <summary>The cheapest per unit.</summary>
    LeastCost,

    /// <summary>The one with the largest margin.</summary>
    MostMargin,

    /// <summary>The one with the smallest dwell-weighted rms error.</summary>
    LeastError,
}

/// <summary>Which compensation plans may be considered, and which of them is best.</summary>
public sealed record CompensationScope
{
    /// <summary>Candidate temperatures are the multiples of this step in the operating range, its two ends and the reference temperature.</summary>
    public required TemperatureDifference CandidateStep { get; init; }

    /// <summary>The fewest plan temperatures, at least 2.</summary>
    public required int FewestTemperatures { get; init; }

    /// <summary>The most plan temperatures, at least the fewest.</summary>
    public required int MostTemperatures { get; init; }

    /// <summary>How far apart two neighbours of a plan have to be at least.</summary>
    public required TemperatureDifference Separation { get; init; }

    /// <summary>
    /// The furthest the operating range may extend beyond the outermost plan temperatures: a polynomial is not to be trusted far outside its
    /// points.
    /// </summary>
    public required TemperatureDifference Reach { get; init; }

    /// <summary>Which of the feasible plans is chosen.</summary>
    public required PlanObjective Objective { get; init; }

    /// <summary>A plan to be used as given; <see langword="null"/> to have one chosen. The search then only says what it would have chosen.</summary>
    public PinnedPlan? Pinned { get; init; }
}

/// <summary>A compensation plan that somebody fixed.</summary>
/// <param name="Temperatures">Plan temperatures, rising, at least two, inside the operating range; they need not be candidates.</param>
/// <param name="ZeroDegree">
/// Degree of the zero correction, 1 to one less than the number of temperatures and to the platform's; <see langword="null"/> for the highest.
/// </param>
/// <param name="SpanDegree">Degree of the span correction, likewise.</param>
public sealed record PinnedPlan(IReadOnlyList<Temperature> Temperatures, int? ZeroDegree, int? SpanDegree)
{
    /// <summary>The whole plan, with the degrees that were left open and the station's pressures.</summary>
    /// <param name="reference">The requirement's reference temperature.</param>
    /// <param name="platform">The platform, for its highest degrees.</param>
    /// <param name="station">The station, for its pressures.</param>
    public CompensationPlan Complete(Temperature reference, Platform platform, Station station)
    {
        ArgumentNullException.ThrowIfNull(platform);
        ArgumentNullException.ThrowIfNull(station);
        int most = Temperatures.Count - 1;
        return CompensationPlan.Of(
            Temperatures, ZeroDegree ?? Math.Min(most, platform.ZeroDegree), SpanDegree ?? Math.Min(most, platform.SpanDegree),
            reference, station.PressurePoints);
    }
}
