using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using BandSpec.Core.Residuals;

namespace BandSpec.Core.Bands;

/// <summary>
/// The least margin of a plan over every pressure fraction and every temperature of a region, both edges included: not over nodes. It is
/// enclosed by halving rectangles, so nothing can hide between places that were looked at.
/// </summary>
/// <param name="Region">Index of the region, counted from the coldest.</param>
/// <param name="Margin">The least margin; no place of the region is below it by more than one part in 10⁹.</param>
/// <param name="Worst">Where it is taken.</param>
public sealed record ContinuousMargin(int Region, double Margin, NodePlace Worst)
{
    /// <summary>The least margins of a plan, one for each region, cold to hot.</summary>
    /// <param name="application">The application.</param>
    /// <param name="plan">The compensation plan.</param>
    public static IReadOnlyList<ContinuousMargin> AllOf(Application application, CompensationPlan plan)
    {
        ArgumentNullException.ThrowIfNull(application);
        ArgumentNullException.ThrowIfNull(plan);
        var raw = new RawError(application.Platform);
        var scale = new TemperatureScale(application.Requirement.Temperature, raw);
        var surface = new ResidueSurface(application, plan);
        var steady = new SteadyPolynomials(application);
        return
        [
            .. Enumerable.Range(0, application.Requirement.AllowedError.Count).Select(r =>
            {
                AllowedErrorRegion region = application.Requirement.AllowedError[r];
                IEnumerable<RegionPiece> pieces = RegionPiece.AllOf(application.Requirement, region, surface, steady, scale);
                (double margin, double x, double along) = new LeastMarginSearch(pieces).Run();
                return new ContinuousMargin(r, margin, new NodePlace(x, At(region, along), r));
            }),
        ];
    }

    private static Temperature At(AllowedErrorRegion region, double along) =>
        Temperature.FromCelsius(((1 - along) * region.From.Celsius) + (along * region.To.Celsius));
}
