using BandSpec.Core.Allocating;
using BandSpec.Core.Bands;
using BandSpec.Core.Deciding;
using BandSpec.Core.Planning;
using BandSpec.Core.Requirements;
using BandSpec.Core.TestLimits;

namespace BandSpec.Core.Specifying;

/// <summary>Everything that was found for one application: the finished record that documents and files are written from.</summary>
public sealed record Specification
{
    /// <summary>The inputs.</summary>
    public required Application Application { get; init; }

    /// <summary>The compensation plan: the chosen one, or the one that the requirement pins.</summary>
    public required PlanChoice Choice { get; init; }

    /// <summary>What the search would have chosen; the same as <see cref="Choice"/> unless the requirement pins a plan.</summary>
    public required PlanChoice Optimum { get; init; }

    /// <summary>Its band.</summary>
    public required BandMap Bands { get; init; }

    /// <summary>What can be claimed of the margin; <see langword="null"/> when the platform does not say what its statistics rest on.</summary>
    public MarginBound? Bound { get; init; }

    /// <summary>
    /// How many more units have to be measured until the bound reaches 1; <see langword="null"/> when it does already, or when no number would do.
    /// </summary>
    public int? FurtherUnits { get; init; }

    /// <summary>What a perfect correction would leave.</summary>
    public required BandFloor Floor { get; init; }

    /// <summary>What a unit does over the temperature profile.</summary>
    public required ProfileFigures Profile { get; init; }

    /// <summary>How the allowed error is shared out.</summary>
    public required Allocation Allocation { get; init; }

    /// <summary>Limits of derived figures.</summary>
    public required IReadOnlyList<DerivedLimit> DerivedLimits { get; init; }

    /// <summary>The points of the verification test.</summary>
    public required IReadOnlyList<VerificationPoint> VerificationPoints { get; init; }

    /// <summary>Every decision rule beside the others, and what accepted units are worth; <see langword="null"/> unless it was asked for.</summary>
    public DecisionComparison? Decisions { get; init; }

    /// <summary>
    /// Why the answer is what it is and, when no plan fits, what would make one fit; <see langword="null"/> unless it was asked for.
    /// </summary>
    public Diagnosis? Diagnosis { get; init; }

    /// <summary>What each input's small change does to the plan's margin; <see langword="null"/> unless it was asked for.</summary>
    public IReadOnlyList<MarginGain>? Gains { get; init; }

    /// <summary>What was asked for and is left out, since the draft was stopped: <see cref="Decisions"/>, <see cref="Gains"/>, both or neither.</summary>
    public DraftExtras LeftOut { get; init; }

    /// <summary>Whether everything was worked out to its end; not when the draft was stopped.</summary>
    public bool IsComplete => Optimum.Proven && Diagnosis is not { IsComplete: false } && LeftOut == DraftExtras.None;

    /// <summary>
    /// Whether the plan keeps the allowed error with the stated capability everywhere; with the stated confidence, when one is stated.
    /// </summary>
    public bool Feasible => Bands.Margin >= 1 && Choice.HoldsEverywhere
        && (Application.Requirement.Capability.Confidence is null || Bound is not { Lower: < 1 });
}
