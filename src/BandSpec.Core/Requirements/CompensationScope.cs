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
}
