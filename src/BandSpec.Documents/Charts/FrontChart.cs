using BandSpec.Documents.Fonts;
using OxyPlot;
using OxyPlot.Annotations;
using OxyPlot.Axes;
using OxyPlot.Series;

namespace BandSpec.Documents.Charts;

/// <summary>The words on a chart of fronts.</summary>
internal sealed record FrontWords(string Across, string Margin, string Rms, string Best, string Fits, string Short, string Taken, string Needed);

/// <summary>A plan on a front: its cost, its figure, whether it keeps the allowed error, and its number.</summary>
internal readonly record struct FrontSpot(double Cost, double Figure, bool Fits, string Number);

/// <summary>
/// What more money buys: the best margin for a cost as stairs, since a plan is bought whole, and below on the same axis the smallest rms error of
/// the plans that fit. Every step carries its plan, full where it keeps the allowed error and hollow where it falls short; the plan that is taken
/// wears a ring. Costs in the currency of the axis' title, errors in %FS.
/// </summary>
internal sealed record FrontChart(FrontWords Words, IReadOnlyList<FrontSpot> Margins, IReadOnlyList<FrontSpot> Errors, Spot Taken) : Chart
{
    private const string Upper = "margin", Lower = "rms";
    private const double Needed = 1, RingSize = 6.2, LabelGap = 7.5;
    private static readonly Stroke Best = new(ChartStyle.Blue, 1.3);

    public override double Height => Errors.Count == 0 ? 200 : 300;

    protected override IReadOnlyList<KeyEntry> KeyEntries =>
    [
        KeyEntry.Line(Words.Best, Best),
        KeyEntry.Mark(Words.Fits, MarkerType.Circle, ChartStyle.Ink),
        new KeyEntry(Words.Short, (pen, at) => Dot(pen, new(at.X + KeyEntry.SwatchWidth / 2, at.Y), fits: false)),
        new KeyEntry(Words.Taken, (pen, at) => Ring(pen, new(at.X + KeyEntry.SwatchWidth / 2, at.Y), RingSize - 1.6)),
        KeyEntry.Line(Words.Needed, ChartStyle.Design),
    ];

    private double Cheapest => Math.Min(Margins[0].Cost, Taken.X);

    private double Dearest => Margins.Concat(Errors).Max(s => s.Cost);

    protected override PlotModel Plot()
    {
        var plot = ChartStyle.NewPlot();
        double pad = Math.Max(0.04 * (Dearest - Cheapest), 0.01 * Dearest), end = Dearest + pad;
        plot.Axes.Add(ChartStyle.Axis(AxisPosition.Bottom, Cheapest - pad, end));
        plot.Axes.Add(Tier(Margins.Select(s => s.Figure).Append(Needed).Append(Taken.Y), Upper, Errors.Count == 0 ? 0 : 0.47, 1, 0.16));
        AddStairs(plot, Margins, Upper, end);
        plot.Annotations.Add(new LineAnnotation
        {
            Type = LineAnnotationType.Horizontal, Y = Needed, YAxisKey = Upper, Color = ChartStyle.Design.Ink, StrokeThickness = ChartStyle.Design.Width,
            LineStyle = LineStyle.DashDot,
        });
        if (Errors.Count == 0) return plot;
        plot.Axes.Add(Tier(Errors.Select(s => s.Figure), Lower, 0, 0.34, 0.42));
        AddStairs(plot, Errors, Lower, end);
        return plot;
    }

    protected override void Annotate(ChartPen pen, PlotModel plot)
    {
        TitleAbove(pen, plot, plot.GetAxis(Upper), Words.Margin);
        TitleBelow(pen, plot, Words.Across);
        Ring(pen, Place(plot, Upper, Taken.X, Taken.Y), RingSize);
        Mark(pen, plot, Margins, Upper, above: true);
        if (Errors.Count == 0) return;
        TitleAbove(pen, plot, plot.GetAxis(Lower), Words.Rms);
        Mark(pen, plot, Errors, Lower, above: false);
    }

    // The room below is that of the numbers, where they stand below.
    private static LinearAxis Tier(IEnumerable<double> figures, string key, double start, double end, double below)
    {
        var all = figures.ToList();
        var height = Math.Max(all.Max() - all.Min(), 5e-3 * Math.Abs(all.Max()));
        var axis = ChartStyle.Axis(AxisPosition.Left, all.Min() - below * height, all.Max() + 0.16 * height);
        (axis.Key, axis.StartPosition, axis.EndPosition) = (key, start, end);
        return axis;
    }

    // A plan is bought whole: between two of a front the cheaper one is still the best there is.
    private static void AddStairs(PlotModel plot, IReadOnlyList<FrontSpot> front, string key, double end)
    {
        var stairs = new StairStepSeries
        {
            YAxisKey = key, Color = Best.Ink, StrokeThickness = Best.Width, VerticalStrokeThickness = 0.6, VerticalLineStyle = LineStyle.Dot,
        };
        stairs.Points.AddRange(front.Select(s => new DataPoint(s.Cost, s.Figure)));
        stairs.Points.Add(new DataPoint(end, front[^1].Figure));
        plot.Series.Add(stairs);
    }

    // Numbers stand on the side that the stairs leave free; where two would stand on one another, the dearer plan goes without.
    private static void Mark(ChartPen pen, PlotModel plot, IReadOnlyList<FrontSpot> front, string key, bool above)
    {
        var free = double.NegativeInfinity;
        foreach (var spot in front)
        {
            var at = Place(plot, key, spot.Cost, spot.Figure);
            Dot(pen, at, spot.Fits);
            var half = Typeface.Of(Face.Regular).Width(spot.Number, ChartStyle.LabelSize) / 2;
            if (at.X - half < free) continue;
            Note(
                pen, new(at.X, at.Y + (above ? -LabelGap : LabelGap)), spot.Number, HorizontalAlignment.Center,
                above ? VerticalAlignment.Bottom : VerticalAlignment.Top, ChartStyle.Ink);
            free = at.X + half + 1.5;
        }
    }

    private static ScreenPoint Place(PlotModel plot, string key, double x, double y) =>
        new(plot.DefaultXAxis.Transform(x), plot.GetAxis(key).Transform(y));

    private static void Dot(ChartPen pen, ScreenPoint at, bool fits) => pen.DrawMarkers(
        [at], MarkerType.Circle, null, [fits ? 3 : 2.6], fits ? ChartStyle.Ink : ChartStyle.White, fits ? ChartStyle.White : ChartStyle.Ink,
        fits ? 0.5 : 0.9, EdgeRenderingMode.Automatic);

    private static void Ring(ChartPen pen, ScreenPoint at, double size) => pen.DrawMarkers(
        [at], MarkerType.Circle, null, [size], ChartStyle.OchreWash, ChartStyle.Ochre, 1.2, EdgeRenderingMode.Automatic);
}
