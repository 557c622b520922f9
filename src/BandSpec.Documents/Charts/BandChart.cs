using OxyPlot;
using OxyPlot.Annotations;
using OxyPlot.Axes;
using OxyPlot.Series;

namespace BandSpec.Documents.Charts;

/// <summary>The words on a band chart.</summary>
internal sealed record BandWords(
    string Across, string Error, string Dwell, string Allowed, string Design, string Maximum, string Typical, string Plan, string Worst);

/// <summary>
/// The promise in one picture: allowed, maximum and typical error over temperature as bands about zero, the compensation temperatures
/// marked, and on the same temperature axis the time the transmitter spends there. The design band is the allowed error divided by the
/// safety factor; without one it is left empty. Errors in %FS, temperatures in °C, dwell in percent.
/// </summary>
internal sealed record BandChart(
    BandWords Words,
    IReadOnlyList<Spot> Allowed,
    IReadOnlyList<Spot> Design,
    IReadOnlyList<Spot> Maximum,
    IReadOnlyList<Spot> Typical,
    IReadOnlyList<double> PlanTemperatures,
    Spot Worst,
    IReadOnlyList<DwellBin> Dwell) : Chart
{
    private const string Error = "error", Time = "time";

    public override double Height => 262;

    protected override IReadOnlyList<KeyEntry> KeyEntries =>
    [
        KeyEntry.Line(Words.Allowed, ChartStyle.Allowed),
        .. Design.Count == 0 ? Array.Empty<KeyEntry>() : [KeyEntry.Line(Words.Design, ChartStyle.Design)],
        KeyEntry.Area(Words.Maximum, ChartStyle.BlueWash, ChartStyle.Maximum),
        KeyEntry.Line(Words.Typical, ChartStyle.Typical),
        KeyEntry.Mark(Words.Plan, MarkerType.Triangle, ChartStyle.Ink, ChartStyle.PlanLine),
        KeyEntry.Mark(Words.Worst, MarkerType.Diamond, ChartStyle.Ink),
    ];

    protected override PlotModel Plot()
    {
        var plot = ChartStyle.NewPlot();
        double lower = Allowed[0].X, upper = Allowed[^1].X, pad = 0.015 * (upper - lower);
        var reach = 1.12 * Allowed.Concat(Maximum).Max(s => s.Y);
        plot.Axes.Add(ChartStyle.Axis(AxisPosition.Bottom, lower - pad, upper + pad));
        plot.Axes.Add(Tier(ChartStyle.Axis(AxisPosition.Left, -reach, reach), Error, Dwell.Count == 0 ? 0 : 0.36, 1));
        if (Dwell.Count > 0) DwellChart.AddBars(plot, Dwell, Tier(DwellChart.UprightAxis(Dwell), Time, 0, 0.22), Time);
        Bands.Add(plot, Error, Allowed, Design, Maximum, Typical);
        foreach (var temperature in PlanTemperatures) plot.Annotations.Add(PlanLine(temperature));
        plot.Series.Add(Points(MarkerType.Triangle, PlanTemperatures.Select(t => new DataPoint(t, -reach * 0.955))));
        plot.Series.Add(Points(MarkerType.Diamond, [Worst.Data, Worst.Mirrored]));
        return plot;
    }

    protected override void Annotate(ChartPen pen, PlotModel plot)
    {
        TitleAbove(pen, plot, plot.GetAxis(Error), Words.Error);
        if (Dwell.Count > 0)
        {
            TitleAbove(pen, plot, plot.GetAxis(Time), Words.Dwell);
            DwellChart.LabelBars(pen, plot, Dwell, Time);
        }
        TitleBelow(pen, plot, Words.Across);
    }

    private static LinearAxis Tier(LinearAxis axis, string key, double start, double end)
    {
        (axis.Key, axis.StartPosition, axis.EndPosition) = (key, start, end);
        return axis;
    }

    private static LineAnnotation PlanLine(double temperature) => new()
    {
        Type = LineAnnotationType.Vertical,
        X = temperature,
        YAxisKey = Error,
        Color = ChartStyle.PlanLine.Ink,
        StrokeThickness = ChartStyle.PlanLine.Width,
        LineStyle = LineStyle.Dot,
    };

    private static ScatterSeries Points(MarkerType marker, IEnumerable<DataPoint> points)
    {
        var series = new ScatterSeries
        {
            YAxisKey = Error,
            MarkerType = marker,
            MarkerSize = 3.2,
            MarkerFill = ChartStyle.Ink,
            MarkerStroke = ChartStyle.White,
            MarkerStrokeThickness = 0.6,
        };
        series.Points.AddRange(points.Select(p => new ScatterPoint(p.X, p.Y)));
        return series;
    }
}
