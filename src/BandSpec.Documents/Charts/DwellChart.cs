using BandSpec.Documents.Fonts;
using OxyPlot;
using OxyPlot.Axes;
using OxyPlot.Series;

namespace BandSpec.Documents.Charts;

/// <summary>
/// Time spent between two temperatures in °C: its share of the service life in percent, and how that is written over its bar.
/// </summary>
internal sealed record DwellBin(double From, double To, double Share, string Label);

/// <summary>The temperature profile alone, as bars.</summary>
internal sealed record DwellChart(string Across, string Up, IReadOnlyList<DwellBin> Bins) : Chart
{
    private const string Upright = "share";

    public override double Height => 102;

    protected override IReadOnlyList<KeyEntry> KeyEntries => [];

    /// <summary>From nothing to a round figure above the tallest bar, with room for what is written over it.</summary>
    public static LinearAxis UprightAxis(IReadOnlyList<DwellBin> bins)
    {
        var axis = ChartStyle.Axis(AxisPosition.Left, 0, bins.Max(b => b.Share) * 1.3);
        axis.IntervalLength = 20;
        return axis;
    }

    public static void AddBars(PlotModel plot, IReadOnlyList<DwellBin> bins, LinearAxis upright, string key)
    {
        upright.Key = key;
        plot.Axes.Add(upright);
        // A gap parts the bars: an edge would hide one that is only a line high.
        double Gap(DwellBin bin) => Math.Min(0.002 * (bins[^1].To - bins[0].From), 0.1 * (bin.To - bin.From));
        var bars = new RectangleBarSeries { YAxisKey = key, FillColor = ChartStyle.Frame, StrokeThickness = 0 };
        foreach (var bin in bins) bars.Items.Add(new RectangleBarItem(bin.From + Gap(bin), 0, bin.To - Gap(bin), bin.Share));
        plot.Series.Add(bars);
    }

    /// <summary>Writes over each bar what fits its width; a narrow bar keeps its figure for the table.</summary>
    public static void LabelBars(ChartPen pen, PlotModel plot, IReadOnlyList<DwellBin> bins, string key)
    {
        Axis across = plot.DefaultXAxis, up = plot.GetAxis(key);
        foreach (var bin in bins)
        {
            double left = across.Transform(bin.From), right = across.Transform(bin.To);
            var width = Typeface.Of(Face.Regular).Width(bin.Label, ChartStyle.LabelSize);
            if (width > right - left - 2) continue;
            var top = up.Transform(bin.Share);
            // White behind the figure, so that no grid line strikes it through.
            pen.Fill(KeyEntry.Box(new((left + right - width) / 2 - 1, top - 5.5), 4, width + 2), ChartStyle.White, null);
            Note(pen, new((left + right) / 2, top - 2), bin.Label, HorizontalAlignment.Center, VerticalAlignment.Bottom, ChartStyle.Ink);
        }
    }

    protected override PlotModel Plot()
    {
        var plot = ChartStyle.NewPlot();
        double lower = Bins[0].From, upper = Bins[^1].To, pad = 0.015 * (upper - lower);
        plot.Axes.Add(ChartStyle.Axis(AxisPosition.Bottom, lower - pad, upper + pad));
        AddBars(plot, Bins, UprightAxis(Bins), Upright);
        return plot;
    }

    protected override void Annotate(ChartPen pen, PlotModel plot)
    {
        TitleAbove(pen, plot, plot.GetAxis(Upright), Up);
        TitleBelow(pen, plot, Across);
        LabelBars(pen, plot, Bins, Upright);
    }
}
