using OxyPlot;
using OxyPlot.Axes;
using OxyPlot.Series;

namespace BandSpec.Documents.Charts;

/// <summary>One of two specifications on a chart: its curves, and the temperatures of its plan in °C.</summary>
internal sealed record ChartedBand(BandCurves Curves, IReadOnlyList<double> PlanTemperatures);

/// <summary>
/// Two specifications over one temperature axis: allowed error and maximum band of both, the newer strong and filled, the older thin and dashed over it,
/// so that one line shows where both are the same. Errors in %FS, temperatures in °C.
/// </summary>
internal sealed record TwoBandsChart(string Across, string Error, ChartedBand Old, ChartedBand New) : Chart
{
    private static readonly Stroke OldAllowed = new(ChartStyle.Ochre, 1.1, ChartStyle.Dashed), OldMaximum = new(ChartStyle.Ochre, 1.1, ChartStyle.Dotted);

    /// <summary>Where the marks of the compensation temperatures stand, as a part of the axis: the older above, the newer below.</summary>
    private const double MarkHeight = 0.955;

    public override double Height => 262;

    protected override IReadOnlyList<KeyEntry> KeyEntries =>
    [
        KeyEntry.Line("allowed error, old", OldAllowed),
        KeyEntry.Line("allowed error, new", ChartStyle.Allowed),
        KeyEntry.Line("maximum band, old", OldMaximum),
        KeyEntry.Area("maximum band, new", ChartStyle.BlueWash, ChartStyle.Maximum),
        KeyEntry.Mark("compensation, old", MarkerType.Square, ChartStyle.Ochre),
        KeyEntry.Mark("compensation, new", MarkerType.Triangle, ChartStyle.Ink),
    ];

    protected override PlotModel Plot()
    {
        PlotModel plot = ChartStyle.NewPlot();
        IReadOnlyList<Spot>[] all = [Old.Curves.Allowed, Old.Curves.Maximum, New.Curves.Allowed, New.Curves.Maximum];
        double lower = all.Min(c => c[0].X), upper = all.Max(c => c[^1].X), pad = 0.015 * (upper - lower), reach = 1.14 * all.Max(c => c.Max(s => s.Y));
        plot.Axes.Add(ChartStyle.Axis(AxisPosition.Bottom, lower - pad, upper + pad));
        plot.Axes.Add(ChartStyle.Axis(AxisPosition.Left, -reach, reach));
        plot.Series.Add(Bands.Area(null, New.Curves.Maximum));
        foreach (bool mirrored in new[] { false, true })
        {
            plot.Series.Add(Bands.Line(null, New.Curves.Maximum, ChartStyle.Maximum, mirrored));
            plot.Series.Add(Bands.Line(null, New.Curves.Allowed, ChartStyle.Allowed, mirrored));
            plot.Series.Add(Bands.Line(null, Old.Curves.Maximum, OldMaximum, mirrored));
            plot.Series.Add(Bands.Line(null, Old.Curves.Allowed, OldAllowed, mirrored));
        }

        plot.Series.Add(Marks(Old, MarkerType.Square, ChartStyle.Ochre, MarkHeight * reach));
        plot.Series.Add(Marks(New, MarkerType.Triangle, ChartStyle.Ink, -MarkHeight * reach));
        return plot;
    }

    protected override void Annotate(ChartPen pen, PlotModel plot)
    {
        TitleAbove(pen, plot, plot.DefaultYAxis, Error);
        TitleBelow(pen, plot, Across);
    }

    private static ScatterSeries Marks(ChartedBand band, MarkerType marker, OxyColor ink, double height)
    {
        ScatterSeries series = new() { MarkerType = marker, MarkerSize = 3, MarkerFill = ink, MarkerStroke = ChartStyle.White, MarkerStrokeThickness = 0.6 };
        series.Points.AddRange(band.PlanTemperatures.Select(t => new ScatterPoint(t, height)));
        return series;
    }
}
