using BandSpec.Core.Bands;
using BandSpec.Core.Requirements;
using BandSpec.Core.Residuals;

namespace BandSpec.Core.Planning;

/// <summary>Why the answer is what it is: what no plan can beat, what binds the chosen plan, and what single change would make it fit.</summary>
/// <param name="Floor">What a perfect correction would leave, and the bound that no correction beats.</param>
/// <param name="FloorTerms">What makes up the floor's worst node, the largest part first.</param>
/// <param name="Binding">The chosen plan's node of least margin.</param>
/// <param name="BindingTerms">What makes it up, the largest part first.</param>
/// <param name="Changes">The smallest single change of each kind that makes the requirement feasible; empty when it is.</param>
/// <param name="IsComplete">Whether every change was looked for to the end; not when the search was ended early.</param>
public sealed record Diagnosis(
    BandFloor Floor, IReadOnlyList<TermPart> FloorTerms, BandNode Binding, IReadOnlyList<TermPart> BindingTerms, IReadOnlyList<SingleChange> Changes,
    bool IsComplete)
{
    /// <summary>The diagnosis of an application with its chosen plan. Every change is verified by searching all candidate plans again.</summary>
    /// <param name="application">The application.</param>
    /// <param name="bands">The band of the chosen plan.</param>
    /// <param name="optimum">What the search chose.</param>
    /// <param name="progress">Is told how many changes are found; may be <see langword="null"/>.</param>
    /// <param name="cancellation">Ends the search for changes early.</param>
    public static Diagnosis Of(
        Application application, BandMap bands, PlanChoice optimum, IProgress<SearchProgress>? progress = null, CancellationToken cancellation = default)
    {
        ArgumentNullException.ThrowIfNull(application);
        ArgumentNullException.ThrowIfNull(bands);
        ArgumentNullException.ThrowIfNull(optimum);
        CapabilityTarget target = application.Requirement.Capability;
        BandFloor floor = BandFloor.Of(application);
        (IReadOnlyList<SingleChange> changes, bool isComplete) =
            optimum.HoldsEverywhere ? ([], true) : ChangeSearch.AllOf(application, bands, optimum, progress, cancellation);
        return new Diagnosis(floor, TermPart.AllOf(floor.Worst, target), bands.Worst, TermPart.AllOf(bands.Worst, target), changes, isComplete);
    }
}

/// <summary>
/// What one term takes of the maximum band at a node: <c>added + 3C·s²/σ</c> under the criterion that governs. Parts and the mean of the
/// residues add up to the band but for covariances between residues.
/// </summary>
/// <param name="Term">The term.</param>
/// <param name="Part">Its part, %FS.</param>
/// <param name="Share">The part as a fraction of the design band.</param>
public sealed record TermPart(ErrorTerm Term, double Part, double Share)
{
    /// <summary>The parts of a node that are not nothing, the largest first.</summary>
    internal static IReadOnlyList<TermPart> AllOf(BandNode node, CapabilityTarget target)
    {
        bool isSample = target.Sample * node.SigmaSample.Percent >= target.LongRun * node.SigmaLongRun.Percent;
        double reach = 3 * (isSample ? target.Sample : target.LongRun), sigma = (isSample ? node.SigmaSample : node.SigmaLongRun).Percent;
        double PartOf(TermShare share)
        {
            double own = (isSample ? share.SigmaSample : share.SigmaLongRun).Percent;
            return share.Added.Percent + (sigma > 0 ? reach * own * own / sigma : 0);
        }

        return
        [
            .. node.Terms.Select(t => new TermPart(t.Term, PartOf(t), PartOf(t) / node.Design.Percent)).Where(p => p.Part > 0).OrderByDescending(p => p.Part),
        ];
    }
}

/// <summary>The smallest change of one figure, everything else left alone, with which the requirement becomes feasible.</summary>
/// <param name="Key">
/// What is changed: <c>allowed-error</c>, <c>safety-factor</c>, <c>capability</c>, <c>operating-limit-lower</c> or <c>-upper</c>,
/// <c>temperatures</c>, <c>soak-gradient</c>, <c>pressure-standard</c>, <c>repeatability</c> or <c>ageing</c>.
/// </param>
/// <param name="Region">The region of an allowed error, counted from the coldest; otherwise <see langword="null"/>.</param>
/// <param name="Before">The figure as it is.</param>
/// <param name="After">
/// The figure that suffices, in whole steps of <paramref name="Step"/>: with one step less no candidate plan fits. <see langword="null"/> when
/// this change alone can never do it.
/// </param>
/// <param name="Furthest">The furthest value that was looked at.</param>
/// <param name="Step">The step of the figure.</param>
/// <param name="Unit">Its unit: <c>%FS</c>, <c>K</c>, <c>°C</c>, or empty for a count or a factor.</param>
/// <param name="Plan">A plan that fits with the change; <see langword="null"/> when there is none.</param>
public sealed record SingleChange(
    string Key, int? Region, double Before, double? After, double Furthest, double Step, string Unit, CompensationPlan? Plan)
{
    /// <summary>Whether this change alone can make the requirement feasible.</summary>
    public bool Suffices => After is not null;
}
