using OxyPlot;
using OxyPlot.Axes;
using OxyPlot.Series;

namespace BandSpec.Documents.Charts;

/// <summary>The units of one storage: what they drifted in the mean at each time, the law's curve, and the label at its end.</summary>
internal sealed record StorageDrift(string Label, IReadOnlyList<Spot> Means, IReadOnlyList<Spot> Curve);

/// <summary>The words on a chart of drift.</summary>
internal sealed record DriftWords(string Across, string Error, string Means, string Law);

/// <summary>Mean drift of the stored units over time, one curve a storage temperature, each with its shape of marks and its temperature at the end.</summary>
internal sealed record DriftChart(DriftWords Words, IReadOnlyList<StorageDrift> Storages) : Chart
{
    private const string Upright = "drift";
    private const double RoomForLabels = 0.12;
    private static readonly MarkerType[] Shapes = [MarkerType.Circle, MarkerType.Square, MarkerType.Triangle, MarkerType.Diamond];

    public override double Height => 180;

    protected override IReadOnlyList<KeyEntry> KeyEntries =>
        [KeyEntry.Mark(Words.Means, MarkerType.Circle, ChartStyle.Ink), KeyEntry.Line(Words.Law, ChartStyle.Maximum)];

    protected override PlotModel Plot()
    {
        var plot = ChartStyle.NewPlot();
        var all = Storages.SelectMany(s => s.Means.Concat(s.Curve)).ToList();
        double lowest = Math.Min(0, all.Min(s => s.Y)), highest = Math.Max(0, all.Max(s => s.Y)), pad = 0.08 * Math.Max(highest - lowest, 1e-6);
        plot.Axes.Add(ChartStyle.Axis(AxisPosition.Bottom, 0, all.Max(s => s.X) * (1 + RoomForLabels)));
        var upright = ChartStyle.Axis(AxisPosition.Left, lowest - pad, highest + pad);
        upright.Key = Upright;
        plot.Axes.Add(upright);
        foreach (var storage in Storages)
        {
            var curve = new LineSeries { YAxisKey = Upright, Color = ChartStyle.Maximum.Ink, StrokeThickness = ChartStyle.Maximum.Width };
            curve.Points.AddRange(storage.Curve.Select(s => s.Data));
            plot.Series.Add(curve);
        }

        return plot;
    }

    protected override void Annotate(ChartPen pen, PlotModel plot)
    {
        TitleAbove(pen, plot, plot.GetAxis(Upright), Words.Error);
        TitleBelow(pen, plot, Words.Across);
        double used = double.PositiveInfinity;
        foreach (var (storage, i) in Storages.Select((storage, i) => (storage, i)).OrderBy(s => s.storage.Curve[^1].Y))
        {
            // Labels of curves that end close together stand above one another.
            ScreenPoint end = Place(plot, storage.Curve[^1]);
            used = Math.Min(end.Y, used - ChartStyle.LabelSize - 1);
            pen.DrawMarkers(
                [.. storage.Means.Select(s => Place(plot, s)), new(end.X + 7, used)], Shapes[i % Shapes.Length], null, [2.6], ChartStyle.Ink,
                ChartStyle.White, 0.5, EdgeRenderingMode.Automatic);
            Note(pen, new(end.X + 13, used), storage.Label, HorizontalAlignment.Left, VerticalAlignment.Middle, ChartStyle.Ink);
        }
    }

    private static ScreenPoint Place(PlotModel plot, Spot spot) => new(plot.DefaultXAxis.Transform(spot.X), plot.GetAxis(Upright).Transform(spot.Y));
}
