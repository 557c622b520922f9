using OxyPlot;
using OxyPlot.Axes;
using OxyPlot.Series;

namespace BandSpec.Documents.Charts;

/// <summary>The words on a chart of many units' curves.</summary>
internal sealed record CurvesWords(string Across, string Error, string Units, string LeftOut, string Mean, string Spread);

/// <summary>One thin line a unit over temperature, dotted for those that were left out, the mean of the family and how far three standard deviations reach about it.</summary>
internal sealed record CurvesChart(
    CurvesWords Words, IReadOnlyList<IReadOnlyList<Spot>> Units, IReadOnlyList<IReadOnlyList<Spot>> LeftOut, IReadOnlyList<Spot> Mean, IReadOnlyList<Spot> Above, IReadOnlyList<Spot> Below) : Chart
{
    private const string Error = "error";
    private static readonly Stroke UnitLine = new(ChartStyle.Frame, 0.35);

    private static readonly Stroke LeftOutLine = new(ChartStyle.Ink, 0.9, ChartStyle.Dotted);

    public override double Height => 210;

    protected override IReadOnlyList<KeyEntry> KeyEntries =>
    [
        KeyEntry.Line(Words.Units, UnitLine), .. LeftOut.Take(1).Select(_ => KeyEntry.Line(Words.LeftOut, LeftOutLine)),
        KeyEntry.Line(Words.Mean, ChartStyle.Maximum), KeyEntry.Line(Words.Spread, ChartStyle.Typical),
    ];

    protected override PlotModel Plot()
    {
        var plot = ChartStyle.NewPlot();
        var all = Units.Concat(LeftOut).SelectMany(u => u).Concat(Above).Concat(Below).ToList();
        double lowest = all.Min(s => s.Y), highest = all.Max(s => s.Y), pad = 0.05 * Math.Max(highest - lowest, 1e-6);
        plot.Axes.Add(ChartStyle.Axis(AxisPosition.Bottom, Mean[0].X, Mean[^1].X));
        var upright = ChartStyle.Axis(AxisPosition.Left, lowest - pad, highest + pad);
        upright.Key = Error;
        plot.Axes.Add(upright);
        foreach (var unit in Units) plot.Series.Add(Line(unit, UnitLine));
        foreach (var unit in LeftOut) plot.Series.Add(Line(unit, LeftOutLine));
        plot.Series.Add(Line(Above, ChartStyle.Typical));
        plot.Series.Add(Line(Below, ChartStyle.Typical));
        plot.Series.Add(Line(Mean, ChartStyle.Maximum));
        return plot;
    }

    protected override void Annotate(ChartPen pen, PlotModel plot)
    {
        TitleAbove(pen, plot, plot.GetAxis(Error), Words.Error);
        TitleBelow(pen, plot, Words.Across);
    }

    private static LineSeries Line(IReadOnlyList<Spot> spots, Stroke stroke)
    {
        var line = new LineSeries
        {
            YAxisKey = Error, Color = stroke.Ink, StrokeThickness = stroke.Width, Dashes = ChartStyle.Dashes(stroke), MinimumSegmentLength = 0.2,
        };
        line.Points.AddRange(spots.Select(s => s.Data));
        return line;
    }
}
