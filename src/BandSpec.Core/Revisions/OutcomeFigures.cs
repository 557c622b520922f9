using BandSpec.Core.Allocating;
using BandSpec.Core.Bands;
using BandSpec.Core.Specifying;
using BandSpec.Core.TestLimits;

namespace BandSpec.Core.Revisions;

/// <summary>What was found for an application, as figures.</summary>
/// <param name="specification">The record.</param>
/// <param name="stretches">Where figures by region are told.</param>
internal sealed class OutcomeFigures(Specification specification, IReadOnlyList<TemperatureStretch> stretches)
{
    /// <summary>All figures, from the band to the limits.</summary>
    public IReadOnlyList<Figure> All() =>
        [.. Band(), .. Margin(), .. new PlanFigures(specification).All(), .. Allocation(), .. DerivedLimits(), .. new VerificationFigures(specification).All()];

    private IReadOnlyList<Figure> Band()
    {
        FigureList list = new(FigureSubject.Band);
        foreach ((RegionBand region, string place) in ByStretch(specification.Bands.Regions))
        {
            list.Error("tightest allowed error", region.AllowedTightest, Leeway.ForBoth, place);
            list.Error("maximum band", region.Maximum, Leeway.ForCustomer, place);
            list.Error("stated band", region.Stated, Leeway.ForCustomer, place);
            list.Error("typical band", region.Typical, Leeway.ForCustomer, place);
            list.Number("margin", region.Margin, "", Leeway.OfMargin, place);
        }

        return list.All;
    }

    private IReadOnlyList<Figure> Margin()
    {
        FigureList list = new(FigureSubject.Margin);
        BandNode worst = specification.Bands.Worst;
        list.Text("feasible", specification.Feasible ? "yes" : "no");
        list.Number("margin", specification.Bands.Margin, "", Leeway.OfMargin);
        list.Number("margin between the nodes too", specification.Choice.ContinuousMargin, "", Leeway.OfMargin);
        if (specification.Bound is { } bound)
            list.Number("margin that can be claimed", bound.Lower, "", Leeway.OfMargin);
        list.Number("floor margin", specification.Floor.Margin, "", Leeway.ForProduction);
        list.Number("worst temperature", worst.Temperature.Celsius, "°C", Leeway.None);
        list.Number("worst pressure fraction", worst.PressureFraction, "", Leeway.None);
        list.Error("rms error over the profile", specification.Profile.RmsError, Leeway.ForCustomer);
        list.Number("probability outside over the profile", specification.Profile.OutsideProbability, "", Leeway.ForCustomer);
        list.Number("equivalent ageing time", specification.Profile.EquivalentTime.Hours, "h", Leeway.LessForProduction);
        list.Number("age factor", specification.Profile.AgeFactor, "", Leeway.LessForProduction);
        return list.All;
    }

    private IReadOnlyList<Figure> Allocation()
    {
        FigureList list = new(FigureSubject.Allocation);
        IReadOnlyList<TermAllocation> terms = specification.Allocation.Terms;
        foreach ((TermAllocation term, string place) in terms.Where(t => t.Region is null).Select(t => (t, "")).Concat(ByRegion(terms, t => t.Region)))
        {
            string where = place.Length == 0 ? term.Term.Key : $"{term.Term.Key}, {place}";
            list.Error("limit", term.Limit, Leeway.ForProduction, where);
            list.Number("multiplier", term.Multiplier, "", Leeway.ForProduction, where);
            list.Text("held", term.Held ? "yes" : "no", where);
        }

        return list.All;
    }

    private IReadOnlyList<Figure> DerivedLimits()
    {
        FigureList list = new(FigureSubject.DerivedLimits);
        foreach (DerivedLimit limit in specification.DerivedLimits.Where(l => l.Region is null))
            list.Error(limit.Name, limit.Limit, Leeway.ForBoth);
        foreach ((DerivedLimit limit, string place) in ByRegion(specification.DerivedLimits, l => l.Region))
            list.Error(limit.Name, limit.Limit, Leeway.ForBoth, place);
        return list.All;
    }

    private IEnumerable<(T Item, string Place)> ByStretch<T>(IReadOnlyList<T> byRegion) =>
        from stretch in stretches
        let region = stretch.RegionIn(specification.Bands)
        where region is not null
        select (byRegion[region.Value], stretch.ToString());

    private IEnumerable<(T Item, string Place)> ByRegion<T>(IReadOnlyList<T> items, Func<T, int?> regionOf) =>
        from stretch in stretches
        let region = stretch.RegionIn(specification.Bands)
        where region is not null
        from item in items
        where regionOf(item) == region
        select (item, stretch.ToString());
}
