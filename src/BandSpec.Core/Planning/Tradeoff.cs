using BandSpec.Core.Requirements;

namespace BandSpec.Core.Planning;

/// <summary>A plan that nothing beats in two figures at once.</summary>
/// <param name="Plan">The plan.</param>
/// <param name="CostPerUnit">Cost of the chamber time for one unit, in the currency of the station's hourly rate.</param>
/// <param name="Margin">Least margin over every pressure and temperature.</param>
/// <param name="RmsError">Dwell-weighted rms error, %FS.</param>
public sealed record TradeoffPoint(CompensationPlan Plan, double CostPerUnit, double Margin, double RmsError);

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
    /// <summary>The fronts of an application.</summary>
    /// <param name="application">The application.</param>
    /// <param name="progress">Is told how far the search has come; may be <see langword="null"/>.</param>
    /// <param name="cancellation">Ends the search early; the fronts are then complete up to some cost only.</param>
    public static Tradeoff Of(Application application, IProgress<SearchProgress>? progress = null, CancellationToken cancellation = default)
    {
        ArgumentNullException.ThrowIfNull(application);
        var search = new PlanSearch(application, progress);
        var fronts = new FrontSearch(search, cancellation);
        return new Tradeoff(fronts.ByMargin(), fronts.ByRmsError(), search.PlanCount, !cancellation.IsCancellationRequested);
    }
}
