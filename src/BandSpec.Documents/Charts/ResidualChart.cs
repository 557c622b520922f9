using OxyPlot;
using OxyPlot.Axes;
using OxyPlot.Series;

namespace BandSpec.Documents.Charts;

/// <summary>What the units' curves leave of their readings; lines at two standard deviations of a reading.</summary>
internal sealed record ResidualChart(string Across, string Error, IReadOnlyList<Spot> Residuals, double Sigma) : Chart
{
    private const string Upright = "error";

    public override double Height => 150;

    protected override IReadOnlyList<KeyEntry> KeyEntries => [];

    protected override PlotModel Plot()
    {
        var plot = ChartStyle.NewPlot();
        double first = Residuals.Min(s => s.X), last = Residuals.Max(s => s.X), pad = last > first ? 0.02 * (last - first) : 1;
        var reach = 1.1 * Math.Max(3 * Sigma, Residuals.Max(s => Math.Abs(s.Y)));
        plot.Axes.Add(ChartStyle.Axis(AxisPosition.Bottom, first - pad, last + pad));
        var upright = ChartStyle.Axis(AxisPosition.Left, -reach, reach);
        upright.Key = Upright;
        plot.Axes.Add(upright);
        var points = new ScatterSeries { YAxisKey = Upright, MarkerType = MarkerType.Square, MarkerSize = 0.5, MarkerFill = ChartStyle.Blue };
        points.Points.AddRange(Residuals.Select(s => new ScatterPoint(s.X, s.Y)));
        plot.Series.Add(points);
        foreach (var level in new[] { 2 * Sigma, -2 * Sigma })
        {
            var line = new LineSeries
            {
                YAxisKey = Upright, Color = ChartStyle.Typical.Ink, StrokeThickness = ChartStyle.Typical.Width, Dashes = ChartStyle.Dashes(ChartStyle.Typical),
            };
            line.Points.AddRange([new DataPoint(first - pad, level), new DataPoint(last + pad, level)]);
            plot.Series.Add(line);
        }
        return plot;
    }

    protected override void Annotate(ChartPen pen, PlotModel plot)
    {
        TitleAbove(pen, plot, plot.GetAxis(Upright), Error);
        TitleBelow(pen, plot, Across);
    }
}
