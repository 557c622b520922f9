using OxyPlot;
using OxyPlot.Axes;
using OxyPlot.Series;

namespace BandSpec.Documents.Charts;

/// <summary>The words on a chamber chart.</summary>
internal sealed record ChamberWords(string Across, string Up, string Ramp, string Soak, string Measure);

/// <summary>
/// A stay of the chamber at one temperature in °C: soaking from the first to the second time, measuring until the third; minutes from the
/// start.
/// </summary>
internal sealed record ChamberStay(double Temperature, double Arrival, double Settled, double Left, string Label);

/// <summary>Chamber temperature over time, with soaking and measuring told apart. Times in minutes, temperatures in °C.</summary>
internal sealed record ChamberChart(ChamberWords Words, double Ambient, IReadOnlyList<ChamberStay> Stays, double End) : Chart
{
    private const string Upright = "temperature";
    private static readonly Stroke Ramp = new(ChartStyle.Soft, 0.9);
    private static readonly Stroke Soak = new(ChartStyle.Blue, 2.2);
    private static readonly Stroke Measure = new(ChartStyle.Ink, 3.6);

    public override double Height => 190;

    protected override IReadOnlyList<KeyEntry> KeyEntries =>
    [
        KeyEntry.Line(Words.Ramp, Ramp),
        KeyEntry.Line(Words.Soak, Soak),
        KeyEntry.Line(Words.Measure, Measure, MarkerType.Diamond),
    ];

    protected override PlotModel Plot()
    {
        var plot = ChartStyle.NewPlot();
        double coldest = Math.Min(Ambient, Stays.Min(s => s.Temperature)), hottest = Math.Max(Ambient, Stays.Max(s => s.Temperature));
        var pad = Math.Max(5, 0.14 * (hottest - coldest));
        var across = ChartStyle.Axis(AxisPosition.Bottom, 0, End * 1.02);
        (across.MajorStep, across.LabelFormatter) = (Step(End), ChartStyle.Number);
        plot.Axes.Add(across);
        var upright = ChartStyle.Axis(AxisPosition.Left, coldest - pad, hottest + pad);
        upright.Key = Upright;
        plot.Axes.Add(upright);
        plot.Series.Add(Line(Ramp, [new(0, Ambient), .. Stays.SelectMany(Ends), new(End, Ambient)]));
        foreach (var stay in Stays)
        {
            plot.Series.Add(Line(Soak, [new(stay.Arrival, stay.Temperature), new(stay.Settled, stay.Temperature)]));
            plot.Series.Add(Line(Measure, [new(stay.Settled, stay.Temperature), new(stay.Left, stay.Temperature)]));
        }
        plot.Series.Add(Marks());
        return plot;
    }

    protected override void Annotate(ChartPen pen, PlotModel plot)
    {
        TitleAbove(pen, plot, plot.GetAxis(Upright), Words.Up);
        TitleBelow(pen, plot, Words.Across);
        Axis across = plot.DefaultXAxis, up = plot.GetAxis(Upright);
        foreach (var stay in Stays)
            Note(
                pen, new(across.Transform((stay.Arrival + stay.Left) / 2), up.Transform(stay.Temperature) - 6), stay.Label,
                HorizontalAlignment.Center, VerticalAlignment.Bottom, ChartStyle.Ink);
    }

    // Whole or half hours, so that the axis is read off like a clock.
    private static double Step(double minutes) =>
        new[] { 15.0, 30, 60, 120, 240, 480, 720, 1440 }.FirstOrDefault(step => minutes / step <= 9, 2880);

    private static DataPoint[] Ends(ChamberStay stay) => [new(stay.Arrival, stay.Temperature), new(stay.Left, stay.Temperature)];

    private ScatterSeries Marks()
    {
        var marks = new ScatterSeries
        {
            MarkerType = MarkerType.Diamond, MarkerSize = 3.4, MarkerFill = ChartStyle.Ink, MarkerStroke = ChartStyle.White,
            MarkerStrokeThickness = 0.6, YAxisKey = Upright
        };
        marks.Points.AddRange(Stays.Select(s => new ScatterPoint((s.Settled + s.Left) / 2, s.Temperature)));
        return marks;
    }

    private static LineSeries Line(Stroke stroke, IEnumerable<DataPoint> points)
    {
        var line = new LineSeries { Color = stroke.Ink, StrokeThickness = stroke.Width, YAxisKey = Upright };
        line.Points.AddRange(points);
        return line;
    }
}
