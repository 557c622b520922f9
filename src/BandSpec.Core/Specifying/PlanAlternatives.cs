using BandSpec.Core.Bands;
using BandSpec.Core.Planning;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.Specifying;

/// <summary>One of the plans that can be chosen instead of the one that a draft takes.</summary>
/// <param name="Number">Its number, counted from 1 over both fronts; a plan that is on both has two.</param>
/// <param name="Point">Its cost, margin and rms error.</param>
/// <param name="IsOptimum">Whether it is the plan that a draft takes when none is pinned.</param>
/// <param name="IsPinned">Whether it is the plan that the requirement pins.</param>
/// <param name="Bound">What can be claimed of its margin; <see langword="null"/> when the platform does not say what its statistics rest on.</param>
/// <param name="FurtherUnits">
/// How many more units have to be measured, in lots as large as those measured, until the bound reaches 1; 0 when it does already;
/// <see langword="null"/> when no number would do, or nothing is known of the sample.
/// </param>
public sealed record PlanAlternative(int Number, TradeoffPoint Point, bool IsOptimum, bool IsPinned, MarginBound? Bound, int? FurtherUnits);

/// <summary>The plans among which a requirement leaves a choice, each the best for its money.</summary>
/// <param name="Application">The inputs.</param>
/// <param name="ByMargin">Rising cost and rising margin.</param>
/// <param name="ByRmsError">Rising cost and falling rms error, feasible plans only.</param>
/// <param name="Optimum">The plan that a draft takes when none is pinned.</param>
/// <param name="Pinned">The plan that the requirement pins; <see langword="null"/> for none.</param>
/// <param name="Fronts">How far both fronts are known.</param>
public sealed record PlanAlternatives(
    Application Application, IReadOnlyList<PlanAlternative> ByMargin, IReadOnlyList<PlanAlternative> ByRmsError, PlanChoice Optimum, PlanChoice? Pinned,
    Tradeoff Fronts)
{
    /// <summary>All of them, by number.</summary>
    public IEnumerable<PlanAlternative> All => [.. ByMargin, .. ByRmsError];

    /// <summary>Whether both fronts are complete and the optimum is proven.</summary>
    public bool Proven => Fronts.Proven && Optimum.Proven;

    /// <summary>The alternatives of an application.</summary>
    /// <param name="application">The inputs, known to fit each other.</param>
    /// <param name="progress">Is told how far the search has come; may be <see langword="null"/>.</param>
    /// <param name="cancellation">Ends the search early; what was found so far is then the answer, and <see cref="Proven"/> says so.</param>
    public static PlanAlternatives Of(Application application, IProgress<SearchProgress>? progress = null, CancellationToken cancellation = default)
    {
        ArgumentNullException.ThrowIfNull(application);
        PlanChoice optimum = ConfidentChoice.Of(application, asked => PlanChoosing.Choose(asked, progress, cancellation));
        PlanChoice? pinned = PlanChoosing.Pinned(application, optimum);
        Tradeoff fronts = Tradeoff.Of(application, progress, cancellation);
        PlanAlternative Numbered(TradeoffPoint point, int number)
        {
            (MarginBound? bound, int? further) = ClaimOf(application, point, optimum.AddedNodes);
            return new PlanAlternative(number, point, point.Plan.IsLike(optimum.Plan), pinned is not null && point.Plan.IsLike(pinned.Plan), bound, further);
        }

        return new PlanAlternatives(
            application,
            [.. fronts.ByMargin.Select((p, i) => Numbered(p, i + 1))],
            [.. fronts.ByRmsError.Select((p, i) => Numbered(p, fronts.ByMargin.Count + i + 1))],
            optimum, pinned, fronts);
    }

    private static (MarginBound? Bound, int? FurtherUnits) ClaimOf(
        Application application, TradeoffPoint point, IReadOnlyList<NodePlace> added)
    {
        double confidence = application.Requirement.Capability.Confidence ?? MarginBound.UsualConfidence;
        BandMap bands = BandMap.Of(application, point.Plan, added);
        return MarginBound.Of(application, point.Plan, bands, confidence) is not { } bound ? (null, null)
            : (bound, bound.Lower >= 1 ? 0 : MarginBound.FurtherUnits(application, point.Plan, bands, confidence));
    }
}
