using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using BandSpec.Core.TestLimits;

namespace BandSpec.Core.Deciding;

/// <summary>What a decision rule means for one specification: per point, for the whole unit, and in money.</summary>
public sealed record RuleOutcome
{
    /// <summary>The rule with its parameter.</summary>
    public required VerificationRules Rules { get; init; }

    /// <summary>Whether it is the rule of the requirement.</summary>
    public required bool IsChosen { get; init; }

    /// <summary>The verification points as the rule would have them, with guard band and risks each.</summary>
    public required IReadOnlyList<VerificationPoint> Points { get; init; }

    /// <summary>
    /// Probability that a unit is accepted at every point although it is beyond the tolerance at one at least: consumer's risk of the whole unit, all points
    /// together as they depend on each other.
    /// </summary>
    public required EstimatedProbability Consumer { get; init; }

    /// <summary>Probability that a unit is rejected at some point although it is within the tolerance at all: producer's risk of the whole unit.</summary>
    public required EstimatedProbability Producer { get; init; }

    /// <summary>Probability that a unit is rejected, rightly or not.</summary>
    public required EstimatedProbability Rejected { get; init; }

    /// <summary>What rejected units cost, spread over all units made: the station's cost of a reject times <see cref="Rejected"/>.</summary>
    public required Money RejectCostPerUnit { get; init; }

    /// <summary>Ids of points at which nothing at all can be accepted; the rule cannot be met while there are any.</summary>
    public required IReadOnlyList<string> Impossible { get; init; }

    /// <summary>
    /// The expanded uncertainty <c>U</c> (k = 2) with which the rule could be met at all of those, tolerances staying as they are; <see langword="null"/> when it
    /// can be met already or when no uncertainty would do, as where a tolerance is smaller than a step of rounding.
    /// </summary>
    public PercentOfSpan? UncertaintyNeeded { get; init; }

    /// <summary>The largest consumer's risk of a single point.</summary>
    public double LargestConsumer => Points.Select(p => p.ConsumerRisk).DefaultIfEmpty(0).Max();

    /// <summary>The largest producer's risk of a single point.</summary>
    public double LargestProducer => Points.Select(p => p.ProducerRisk).DefaultIfEmpty(0).Max();
}
