using BandSpec.Core.Requirements;

namespace BandSpec.Core.Planning;

/// <summary>A plan that nothing beats in two figures at once.</summary>
/// <param name="Plan">The plan.</param>
/// <param name="CostPerUnit">Cost of the chamber time for one unit, in the currency of the station's hourly rate.</param>
/// <param name="Margin">Least margin over every pressure and temperature.</param>
/// <param name="RmsError">Dwell-weighted rms error, %FS.</param>
/// <param name="Proven">
/// Whether no candidate plan of the same or less cost is better. Not where even a unit without scatter would not fit: such plans are ordered at
/// the nodes only.
/// </param>
public sealed record TradeoffPoint(CompensationPlan Plan, double CostPerUnit, double Margin, double RmsError, bool Proven);

/// <summary>
/// What more money buys: the complete fronts of cost against margin and of cost against rms error. Between neighbours of a front lies no plan
/// that is cheaper than the dearer and better than the cheaper of them; every point is the best of all candidate plans of its cost.
/// </summary>
/// <param name="ByMargin">Rising cost and rising margin, over all candidate plans.</param>
/// <param name="ByRmsError">Rising cost and falling rms error, over the feasible ones; empty when none is feasible.</param>
/// <param name="PlansConsidered">How many candidate plans the fronts hold against.</param>
/// <param name="Proven">Whether both fronts are complete; not when the search was ended early.</param>
public sealed record Tradeoff(
    IReadOnlyList<TradeoffPoint> ByMargin, IReadOnlyList<TradeoffPoint> ByRmsError, long PlansConsidered, bool Proven)
{
    /// <summary>
    /// The cost per unit up to which the front of margins is complete; <see langword="null"/> when the search was ended before its first level.
    /// </summary>
    public double? MarginCompleteTo { get; init; }

    /// <summary>The same for the front of rms errors.</summary>
    public double? RmsErrorCompleteTo { get; init; }

    /// <summary>The fronts of an application.</summary>
    /// <param name="application">The application.</param>
    /// <param name="progress">Is told how far the search has come, every plan counting once for each front; may be <see langword="null"/>.</param>
    /// <param name="cancellation">Ends the search early; the fronts are then complete up to some cost only.</param>
    public static Tradeoff Of(Application application, IProgress<SearchProgress>? progress = null, CancellationToken cancellation = default)
    {
        ArgumentNullException.ThrowIfNull(application);
        var search = new PlanSearch(application);
        var fronts = new FrontSearch(search, progress, cancellation);
        (Front byMargin, Front byRms) = (fronts.ByMargin(), fronts.ByRmsError());
        return new Tradeoff(byMargin.Points, byRms.Points, search.PlanCount, byMargin.IsComplete && byRms.IsComplete)
        {
            MarginCompleteTo = byMargin.CompleteTo, RmsErrorCompleteTo = byRms.CompleteTo,
        };
    }
}
