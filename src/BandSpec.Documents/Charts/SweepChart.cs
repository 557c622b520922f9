using System.Globalization;
using OxyPlot;
using OxyPlot.Annotations;
using OxyPlot.Axes;
using OxyPlot.Series;

namespace BandSpec.Documents.Charts;

/// <summary>The words on a chart of a sweep.</summary>
internal sealed record SweepWords(string Across, string Margin, string Yield, string Chance, string Closed, string Counted, string Sampled, string Needed);

/// <summary>
/// What one figure does when it is changed: margin, yield in percent and the chance of leaving anywhere, one below the other over the same
/// axis. The chance is drawn in powers of ten; a value without a chance has no point there.
/// </summary>
internal sealed record SweepChart(SweepWords Words, IReadOnlyList<Spot> Margins, IReadOnlyList<Spot> Yields, IReadOnlyList<Spot> Chances) : Chart
{
    private const string Margin = "margin", Yield = "yield", Chance = "chance";
    private const double Needed = 1;

    public override double Height => 330;

    protected override IReadOnlyList<KeyEntry> KeyEntries =>
    [
        KeyEntry.Line(Words.Closed, ChartStyle.Maximum, MarkerType.Circle), KeyEntry.Line(Words.Counted, ChartStyle.Typical, MarkerType.Triangle),
        KeyEntry.Line(Words.Sampled, ChartStyle.PlanLine, MarkerType.Diamond), KeyEntry.Line(Words.Needed, ChartStyle.Design),
    ];

    protected override PlotModel Plot()
    {
        var plot = ChartStyle.NewPlot();
        double first = Margins[0].X, last = Margins[^1].X, pad = last > first ? 0.03 * (last - first) : 1;
        plot.Axes.Add(ChartStyle.Axis(AxisPosition.Bottom, first - pad, last + pad));
        plot.Axes.Add(Tier(Margins.Select(s => s.Y).Append(Needed), Margin, 0.73, 1, 1e-3));
        plot.Axes.Add(Tier(Yields.Select(s => s.Y), Yield, 0.38, 0.63, 1e-3));
        plot.Annotations.Add(new LineAnnotation
        {
            Type = LineAnnotationType.Horizontal, Y = Needed, YAxisKey = Margin, Color = ChartStyle.Design.Ink, StrokeThickness = ChartStyle.Design.Width,
            LineStyle = LineStyle.DashDot,
        });
        plot.Series.Add(Line(Margins, Margin, ChartStyle.Maximum, MarkerType.Circle));
        plot.Series.Add(Line(Yields, Yield, ChartStyle.Typical, MarkerType.Triangle));
        Spot[] powers = [.. Chances.Where(s => s.Y > 0).Select(s => s with { Y = Math.Log10(s.Y) })];
        plot.Axes.Add(PowerAxis(powers));
        plot.Series.Add(Line(powers, Chance, ChartStyle.PlanLine, MarkerType.Diamond));
        return plot;
    }

    protected override void Annotate(ChartPen pen, PlotModel plot)
    {
        TitleAbove(pen, plot, plot.GetAxis(Margin), Words.Margin);
        TitleAbove(pen, plot, plot.GetAxis(Yield), Words.Yield);
        TitleAbove(pen, plot, plot.GetAxis(Chance), Words.Chance);
        TitleBelow(pen, plot, Words.Across);
    }

    private static LinearAxis Tier(IEnumerable<double> figures, string key, double start, double end, double least)
    {
        var all = figures.ToList();
        var pad = Math.Max(0.12 * (all.Max() - all.Min()), least * Math.Max(1e-9, Math.Abs(all.Max())));
        var axis = ChartStyle.Axis(AxisPosition.Left, all.Min() - pad, all.Max() + pad);
        (axis.Key, axis.StartPosition, axis.EndPosition) = (key, start, end);
        return axis;
    }

    /// <summary>Whole powers of ten around the points.</summary>
    private static LinearAxis PowerAxis(Spot[] powers)
    {
        int low = (int)Math.Floor(powers.Select(s => s.Y).DefaultIfEmpty(-1).Min()), high = (int)Math.Ceiling(powers.Select(s => s.Y).DefaultIfEmpty(0).Max());
        var axis = ChartStyle.Axis(AxisPosition.Left, low - 0.1, Math.Max(high, low + 1) + 0.1);
        (axis.Key, axis.StartPosition, axis.EndPosition) = (Chance, 0, 0.28);
        axis.MajorStep = Math.Max(1, (high - low + 4) / 5);
        axis.LabelFormatter = power => $"10{Raised((int)Math.Round(power))}";
        return axis;
    }

    private static string Raised(int power) => string.Concat(power.ToString(CultureInfo.InvariantCulture).Select(c => c == '-' ? '⁻' : "⁰¹²³⁴⁵⁶⁷⁸⁹"[c - '0']));

    private static LineSeries Line(IReadOnlyList<Spot> spots, string key, Stroke stroke, MarkerType marker)
    {
        var line = new LineSeries
        {
            YAxisKey = key, Color = stroke.Ink, StrokeThickness = stroke.Width, Dashes = ChartStyle.Dashes(stroke), MinimumSegmentLength = 0.2,
            MarkerType = marker, MarkerSize = 2.8, MarkerFill = stroke.Ink, MarkerStroke = ChartStyle.White, MarkerStrokeThickness = 0.5,
        };
        line.Points.AddRange(spots.Select(s => s.Data));
        return line;
    }
}
