using OxyPlot;
using OxyPlot.Annotations;
using OxyPlot.Axes;
using OxyPlot.Series;

namespace BandSpec.Documents.Charts;

/// <summary>The words on a chart of a confidence region.</summary>
internal sealed record RegionWords(string Across, string Upright, string Region, string Estimate, string Intervals);

/// <summary>The joint confidence region of two figures: its edge, the estimate in it, and the interval of each figure alone as a box.</summary>
internal sealed record RegionChart(RegionWords Words, IReadOnlyList<Spot> Edge, Spot Estimate, Spot Lower, Spot Upper) : Chart
{
    private const string Vertical = "second";

    public override double Height => 180;

    protected override IReadOnlyList<KeyEntry> KeyEntries =>
    [
        KeyEntry.Line(Words.Region, ChartStyle.Maximum), KeyEntry.Line(Words.Intervals, ChartStyle.Design),
        KeyEntry.Mark(Words.Estimate, MarkerType.Circle, ChartStyle.Ink),
    ];

    protected override PlotModel Plot()
    {
        var plot = ChartStyle.NewPlot();
        LinearAxis level = Axis(AxisPosition.Bottom, s => s.X), upright = Axis(AxisPosition.Left, s => s.Y);
        plot.Axes.Add(level);
        upright.Key = Vertical;
        plot.Axes.Add(upright);
        var region = new PolygonAnnotation
        {
            YAxisKey = Vertical, Fill = ChartStyle.BlueWash, Stroke = ChartStyle.Maximum.Ink, StrokeThickness = ChartStyle.Maximum.Width, LineStyle = LineStyle.Solid,
            Layer = AnnotationLayer.BelowSeries,
        };
        region.Points.AddRange(Edge.Select(s => s.Data));
        plot.Annotations.Add(region);
        var box = new LineSeries
        {
            YAxisKey = Vertical, Color = ChartStyle.Design.Ink, StrokeThickness = ChartStyle.Design.Width, Dashes = ChartStyle.Dashes(ChartStyle.Design),
        };

        // An interval without an end leaves the picture at its edge.
        double right = Math.Min(Upper.X, level.Maximum), top = Math.Min(Upper.Y, upright.Maximum);
        box.Points.AddRange([new(Lower.X, Lower.Y), new(right, Lower.Y), new(right, top), new(Lower.X, top), new(Lower.X, Lower.Y)]);
        plot.Series.Add(box);
        return plot;
    }

    protected override void Annotate(ChartPen pen, PlotModel plot)
    {
        TitleAbove(pen, plot, plot.GetAxis(Vertical), Words.Upright);
        TitleBelow(pen, plot, Words.Across);
        pen.DrawMarkers(
            [new(plot.DefaultXAxis.Transform(Estimate.X), plot.GetAxis(Vertical).Transform(Estimate.Y))], MarkerType.Circle, null, [2.8], ChartStyle.Ink,
            ChartStyle.White, 0.5, EdgeRenderingMode.Automatic);
    }

    private LinearAxis Axis(AxisPosition position, Func<Spot, double> of)
    {
        double lowest = Edge.Min(of), highest = Edge.Max(of), pad = 0.08 * (highest - lowest);
        return ChartStyle.Axis(position, lowest - pad, highest + pad);
    }
}
