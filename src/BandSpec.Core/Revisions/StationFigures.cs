using BandSpec.Core.Requirements;

namespace BandSpec.Core.Revisions;

/// <summary>The fields of a station as figures. Uncertainty, time and cost are harder on production.</summary>
internal sealed class StationFigures(Station station)
{
    private readonly FigureList list = new(FigureSubject.Station);

    /// <summary>All fields in the order of the file.</summary>
    public IReadOnlyList<Figure> All()
    {
        list.Text("station.name", station.Name);
        list.Error("pressure-standard.zero", station.StandardZero, Leeway.LessForProduction);
        list.Error("pressure-standard.proportional", station.StandardProportional, Leeway.LessForProduction);
        list.Error("reading-noise", station.ReadingNoise, Leeway.LessForProduction);
        list.Number("readings-averaged", station.ReadingsAveraged, "", Leeway.ForProduction);
        list.Number("soak-gradient", station.SoakGradient.Kelvin, "K", Leeway.LessForProduction);
        ListPressures("pressure-points", station.PressurePoints);
        ListPressures("test-points", station.TestPoints);
        ListChamber(station.Chamber);
        list.Number("reject-cost", station.RejectCost.Amount, station.RejectCost.Currency, Leeway.LessForProduction);
        return list.All;
    }

    private void ListPressures(string path, PressureLists lists)
    {
        list.Numbers($"{path}.reference", lists.Reference);
        list.Numbers($"{path}.others", lists.Others);
    }

    private void ListChamber(Chamber chamber)
    {
        list.Temperature("chamber.ambient", chamber.Ambient, Leeway.None);
        list.Number("chamber.heating", chamber.HeatingPerMinute.Kelvin, "K/min", Leeway.ForProduction);
        list.Number("chamber.cooling", chamber.CoolingPerMinute.Kelvin, "K/min", Leeway.ForProduction);
        list.Number("chamber.soak", chamber.Soak.Minutes, "min", Leeway.LessForProduction);
        list.Number("chamber.pressure-point", chamber.PressurePoint.Minutes, "min", Leeway.LessForProduction);
        list.Number("chamber.batch", chamber.Batch, "", Leeway.ForProduction);
        list.Number("chamber.rate", chamber.HourlyRate.Amount, $"{chamber.HourlyRate.Currency}/h", Leeway.LessForProduction);
    }
}
