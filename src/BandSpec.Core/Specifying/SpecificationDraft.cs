using BandSpec.Core.Allocating;
using BandSpec.Core.Bands;
using BandSpec.Core.Deciding;
using BandSpec.Core.Planning;
using BandSpec.Core.Requirements;
using BandSpec.Core.TestLimits;

namespace BandSpec.Core.Specifying;

/// <summary>The main story: from an application to its finished specification.</summary>
public static class SpecificationDraft
{
    /// <summary>
    /// Chooses the compensation plan, works out its band, shares out the allowed error and derives the test limits. That no plan fits is an
    /// answer like any other: see <see cref="Specification.Feasible"/>. A plan that the requirement pins is judged as given.
    /// </summary>
    /// <param name="application">The inputs, known to fit each other.</param>
    /// <param name="progress">Is told how far the search has come, from several threads; may be <see langword="null"/>.</param>
    /// <param name="extras">What is worked out beside the specification.</param>
    /// <param name="cancellation">
    /// Ends the search early: the specification is then that of the best plan so far, and <see cref="PlanChoice.Proven"/> says so. What was asked for
    /// beside it and not come to is left out, and <see cref="Specification.LeftOut"/> says so.
    /// </param>
    public static Specification Draft(
        Application application, IProgress<SearchProgress>? progress = null, DraftExtras extras = DraftExtras.None,
        CancellationToken cancellation = default)
    {
        ArgumentNullException.ThrowIfNull(application);
        PlanChoice optimum = ConfidentChoice.Of(application, asked => PlanChoosing.Choose(asked, progress, cancellation));
        PlanChoice choice = PlanChoosing.Pinned(application, optimum) ?? optimum;
        BandMap bands = BandMap.Of(application, choice.Plan, choice.AddedNodes);
        bool fits = bands.Margin >= 1 && choice.HoldsEverywhere;
        bool isDiagnosed = optimum.Proven && (extras.HasFlag(DraftExtras.Diagnosis) || (!fits && extras.HasFlag(DraftExtras.DiagnosisOfNo)));
        Allocation allocation = Allocation.Of(application, choice.Plan, bands);
        double confidence = application.Requirement.Capability.Confidence ?? MarginBound.UsualConfidence;
        MarginBound? bound = MarginBound.Of(application, choice.Plan, bands, confidence);
        DecisionComparison? decisions = extras.HasFlag(DraftExtras.Decisions)
            ? UnlessStopped(() => DecisionComparison.Of(application, choice.Plan, bands, allocation, cancellation)) : null;
        IReadOnlyList<MarginGain>? gains = extras.HasFlag(DraftExtras.Gains)
            ? UnlessStopped(() => MarginGain.AllOf(application, choice.Plan, cancellation)) : null;
        return new Specification
        {
            Application = application,
            Choice = choice,
            Optimum = optimum,
            Bands = bands,
            Bound = bound,
            FurtherUnits = bound is { Lower: < 1 } ? MarginBound.FurtherUnits(application, choice.Plan, bands, confidence) : null,
            Floor = BandFloor.Of(application),
            Profile = ProfileFigures.Of(application, choice.Plan),
            Allocation = allocation,
            DerivedLimits = DerivedLimit.AllOf(application, choice.Plan, allocation),
            VerificationPoints = VerificationPoint.AllOf(application, choice.Plan, bands, allocation),
            Diagnosis = isDiagnosed ? Diagnosis.Of(application, bands, optimum, progress, cancellation) : null,
            Decisions = decisions,
            Gains = gains,
            LeftOut = extras & ((decisions is null ? DraftExtras.Decisions : 0) | (gains is null ? DraftExtras.Gains : 0)),
        };
    }

    /// <summary>A part of the record, or nothing when the draft was stopped before the part was finished.</summary>
    private static T? UnlessStopped<T>(Func<T> part)
        where T : class
    {
        try
        {
            return part();
        }
        catch (OperationCanceledException)
        {
            return null;
        }
    }
}

/// <summary>What can be worked out beside a specification; takes a second or so each.</summary>
[Flags]
public enum DraftExtras
{
    /// <summary>Nothing more.</summary>
    None = 0,

    /// <summary>Why the answer is what it is.</summary>
    Diagnosis = 1,

    /// <summary>The same when the answer is no, with the single changes that would make the requirement feasible.</summary>
    DiagnosisOfNo = 2,

    /// <summary>What a small change of each input does to the margin.</summary>
    Gains = 4,

    /// <summary>Every decision rule beside the others, and what accepted units are worth in the field.</summary>
    Decisions = 8,

    /// <summary>What a package has unless more is asked for.</summary>
    Usual = DiagnosisOfNo | Decisions,

    /// <summary>Everything there is.</summary>
    All = Diagnosis | DiagnosisOfNo | Gains | Decisions,
}
