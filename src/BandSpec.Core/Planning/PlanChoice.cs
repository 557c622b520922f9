using BandSpec.Core.Bands;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.Planning;

/// <summary>The plan that the search settled on, and how sure it is.</summary>
/// <param name="Plan">The best plan; the one of largest margin when none is feasible; or the plan that the requirement pins.</param>
/// <param name="Run">Its chamber run.</param>
/// <param name="PlansConsidered">How many candidate plans the answer holds against, when it is proven.</param>
/// <param name="Proven">
/// Whether the answer is proven over all candidates: not when the search was ended early, nor for a pinned plan that is not the best.
/// </param>
public sealed record PlanChoice(CompensationPlan Plan, ChamberRun Run, long PlansConsidered, bool Proven)
{
    /// <summary>How far below its margin at the nodes, relative, a choice may fall between them.</summary>
    public const double Shortfall = 1e-8;

    /// <summary>How many plans were decided one by one before the answer was there, in the last exchange round.</summary>
    public required long PlansDecided { get; init; }

    /// <summary>
    /// How many plans were discarded in groups, by a proof that holds for all of a group; the rest of those considered costs more than the
    /// choice.
    /// </summary>
    public required long PlansDiscarded { get; init; }

    /// <summary>Places between the design nodes at which an earlier choice fell short, and at which every plan was judged after that.</summary>
    public required IReadOnlyList<NodePlace> AddedNodes { get; init; }

    /// <summary>How often a choice was checked over the continuous range: 1 when the first one held.</summary>
    public required int ExchangeRounds { get; init; }

    /// <summary>The plan's least margin over every pressure and temperature, region by region.</summary>
    public required IReadOnlyList<ContinuousMargin> Everywhere { get; init; }

    /// <summary>The plan's least margin over every pressure and temperature.</summary>
    public double ContinuousMargin => Everywhere.Min(r => r.Margin);

    /// <summary>
    /// Whether the plan keeps the allowed error between the nodes as well, but for the part in 10⁸ that a choice may fall short of its nodes.
    /// </summary>
    public bool HoldsEverywhere => ContinuousMargin >= 1 - Shortfall;
}
