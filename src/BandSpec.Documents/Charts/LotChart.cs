using OxyPlot;
using OxyPlot.Axes;
using OxyPlot.Series;

namespace BandSpec.Documents.Charts;

/// <summary>The words on a chart of a lot's values.</summary>
internal sealed record LotWords(
    string Order, string Share, string Error, string Tolerance, string Acceptance, string Values, string Mean, string Normal);

/// <summary>Consecutive values of a lot, one or many: the numbers of the first and the last, their mean, smallest and largest in %FS.</summary>
internal sealed record RunSpan(double First, double Last, double Mean, double Smallest, double Largest);

/// <summary>A bin of a histogram: from and to in %FS, share of all values in percent.</summary>
internal sealed record ValueBin(double From, double To, double Share);

/// <summary>The values of one characteristic as a chart shows them, in %FS.</summary>
/// <param name="Tolerance">Half width of the tolerance.</param>
/// <param name="Acceptance">Acceptance limits inside it, lower then upper; none for a derived figure.</param>
/// <param name="Run">The values in their order.</param>
/// <param name="Bins">Their histogram.</param>
/// <param name="Normal">The normal law through them: error and share in percent of a bin, in rising order; may be empty.</param>
/// <param name="Mean">Their mean.</param>
internal sealed record LotValues(
    double Tolerance, IReadOnlyList<double> Acceptance, IReadOnlyList<RunSpan> Run, IReadOnlyList<ValueBin> Bins, IReadOnlyList<Spot> Normal,
    double Mean);

/// <summary>
/// One characteristic of a lot against its limits: on the left the values in their order, on the right the same as a histogram, on one
/// upright axis, so that limits run through both. Values far beyond the limits are marked at the edge.
/// </summary>
internal sealed record LotChart(LotWords Words, LotValues Values) : Chart
{
    private const string Error = "error", Order = "order", Share = "share";
    private const double OrderEnd = 0.68, ShareStart = 0.73, MostReach = 2.2;
    private const int MostMarked = 60, MostOutlined = 30;
    private static readonly Stroke Line = new(ChartStyle.Blue, 0.7);

    /// <summary>How far a chart reaches on either side of zero, %FS.</summary>
    public double Reach => Math.Min(
        MostReach * Values.Tolerance,
        1.12 * Math.Max(Values.Tolerance, Values.Run.Max(r => Math.Max(Math.Abs(r.Smallest), Math.Abs(r.Largest)))));

    public override double Height => 128;

    protected override IReadOnlyList<KeyEntry> KeyEntries =>
    [
        KeyEntry.Line(Words.Tolerance, ChartStyle.Allowed),
        .. Values.Acceptance.Count == 0 ? Array.Empty<KeyEntry>() : [KeyEntry.Line(Words.Acceptance, ChartStyle.Design)],
        KeyEntry.Area(Words.Values, ChartStyle.BlueWash, Line),
        KeyEntry.Line(Words.Mean, ChartStyle.PlanLine),
        .. Values.Normal.Count == 0 ? Array.Empty<KeyEntry>() : [KeyEntry.Line(Words.Normal, ChartStyle.Typical)],
    ];

    private bool IsCondensed => Values.Run.Any(r => r.Last > r.First);

    protected override PlotModel Plot()
    {
        var plot = ChartStyle.NewPlot();
        var upright = ChartStyle.Axis(AxisPosition.Left, -Reach, Reach);
        upright.Key = Error;
        plot.Axes.Add(upright);
        plot.Axes.Add(Level(Order, 0, OrderEnd));
        plot.Axes.Add(Level(Share, ShareStart, 1));
        AddBins(plot);
        AddRun(plot);
        foreach (var axis in new[] { Order, Share })
        {
            AddLevel(plot, axis, Values.Mean, ChartStyle.PlanLine);
            foreach (var limit in new[] { -Values.Tolerance, Values.Tolerance }) AddLevel(plot, axis, limit, ChartStyle.Allowed);
            foreach (var limit in Values.Acceptance) AddLevel(plot, axis, limit, ChartStyle.Design);
        }
        return plot;
    }

    protected override void Annotate(ChartPen pen, PlotModel plot)
    {
        TitleAbove(pen, plot, plot.GetAxis(Error), Words.Error);
        foreach (var (key, title) in new[] { (Order, Words.Order), (Share, Words.Share) })
        {
            var axis = plot.GetAxis(key);
            Note(
                pen, new(Math.Max(axis.ScreenMin.X, axis.ScreenMax.X), plot.PlotBounds.Bottom - 1), title, HorizontalAlignment.Right,
                VerticalAlignment.Bottom, ChartStyle.Soft);
        }
    }

    private (double From, double To) EndsOf(string axis) => axis == Order
        ? (0.5, Values.Run[^1].Last + 0.5)
        : (0, 1.12 * Values.Bins.Select(b => b.Share).Concat(Values.Normal.Select(s => s.X)).Max());

    private LinearAxis Level(string key, double start, double end)
    {
        var (from, to) = EndsOf(key);
        var axis = ChartStyle.Axis(AxisPosition.Bottom, from, to);
        (axis.Key, axis.StartPosition, axis.EndPosition) = (key, start, end);
        return axis;
    }

    private void AddBins(PlotModel plot)
    {
        // Outlines part few bins; many of them would fill the picture with lines.
        var bars = new RectangleBarSeries
        {
            XAxisKey = Share, YAxisKey = Error, FillColor = ChartStyle.BlueWash, StrokeColor = ChartStyle.Blue, StrokeThickness = Values.Bins.Count > MostOutlined ? 0 : 0.4,
        };
        foreach (var bin in Values.Bins.Where(b => b.Share > 0)) bars.Items.Add(new RectangleBarItem(0, bin.From, bin.Share, bin.To));
        plot.Series.Add(bars);
        plot.Series.Add(Curve(Share, Values.Normal.Select(s => s.Data), ChartStyle.Typical));
    }

    private void AddRun(PlotModel plot)
    {
        if (IsCondensed)
        {
            var area = new AreaSeries { XAxisKey = Order, YAxisKey = Error, Fill = ChartStyle.BlueWash, Color = OxyColors.Transparent, StrokeThickness = 0 };
            area.Points.AddRange(Values.Run.Select(r => new DataPoint((r.First + r.Last) / 2, r.Largest)));
            area.Points2.AddRange(Values.Run.Select(r => new DataPoint((r.First + r.Last) / 2, r.Smallest)));
            plot.Series.Add(area);
        }
        plot.Series.Add(Curve(Order, Values.Run.Select(r => new DataPoint((r.First + r.Last) / 2, r.Mean)), Line));
        plot.Series.Add(Marks(
            IsCondensed || Values.Run.Count > MostMarked ? [] : Values.Run.Select(r => new DataPoint(r.First, r.Mean)), MarkerType.Circle, 1.1, ChartStyle.Blue));
        plot.Series.Add(Marks(
            Values.Run.Where(r => r.Largest > Reach).Select(r => new DataPoint((r.First + r.Last) / 2, 0.95 * Reach))
                .Concat(Values.Run.Where(r => r.Smallest < -Reach).Select(r => new DataPoint((r.First + r.Last) / 2, -0.95 * Reach))),
            MarkerType.Diamond, 3, ChartStyle.Ink));
    }

    private void AddLevel(PlotModel plot, string axis, double level, Stroke stroke)
    {
        var (from, to) = EndsOf(axis);
        plot.Series.Add(Curve(axis, [new(from, level), new(to, level)], stroke));
    }

    private static LineSeries Curve(string axis, IEnumerable<DataPoint> points, Stroke stroke)
    {
        var line = new LineSeries
        {
            XAxisKey = axis, YAxisKey = Error, Color = stroke.Ink, StrokeThickness = stroke.Width, Dashes = ChartStyle.Dashes(stroke), MinimumSegmentLength = 0.2,
        };
        line.Points.AddRange(points);
        return line;
    }

    private static ScatterSeries Marks(IEnumerable<DataPoint> points, MarkerType marker, double size, OxyColor ink)
    {
        var marks = new ScatterSeries { XAxisKey = Order, YAxisKey = Error, MarkerType = marker, MarkerSize = size, MarkerFill = ink };
        marks.Points.AddRange(points.Select(p => new ScatterPoint(p.X, p.Y)));
        return marks;
    }
}
