using OxyPlot;
using OxyPlot.Axes;

namespace BandSpec.Documents.Charts;

/// <summary>The words on a chart over pressure.</summary>
internal sealed record PressureWords(string Across, string Error, string Allowed, string Design, string Maximum, string Typical);

/// <summary>Allowed, maximum and typical error over pressure at one temperature. Pressures in the customer's unit, errors in %FS.</summary>
internal sealed record PressureChart(
    PressureWords Words, IReadOnlyList<Spot> Allowed, IReadOnlyList<Spot> Design, IReadOnlyList<Spot> Maximum,
    IReadOnlyList<Spot> Typical) : Chart
{
    private const string Error = "error";

    public override double Height => 190;

    protected override IReadOnlyList<KeyEntry> KeyEntries =>
    [
        KeyEntry.Line(Words.Allowed, ChartStyle.Allowed),
        .. Design.Count == 0 ? Array.Empty<KeyEntry>() : [KeyEntry.Line(Words.Design, ChartStyle.Design)],
        KeyEntry.Line(Words.Maximum, ChartStyle.Maximum, MarkerType.Circle),
        KeyEntry.Line(Words.Typical, ChartStyle.Typical, MarkerType.Triangle),
    ];

    protected override PlotModel Plot()
    {
        var plot = ChartStyle.NewPlot();
        double lower = Maximum[0].X, upper = Maximum[^1].X, pad = 0.015 * (upper - lower);
        var reach = 1.12 * Allowed.Concat(Maximum).Max(s => s.Y);
        plot.Axes.Add(ChartStyle.Axis(AxisPosition.Bottom, lower - pad, upper + pad));
        var upright = ChartStyle.Axis(AxisPosition.Left, -reach, reach);
        upright.Key = Error;
        plot.Axes.Add(upright);
        Bands.Add(plot, Error, Allowed, Design, Maximum, Typical, MarkerType.Circle);
        return plot;
    }

    protected override void Annotate(ChartPen pen, PlotModel plot)
    {
        TitleAbove(pen, plot, plot.GetAxis(Error), Words.Error);
        TitleBelow(pen, plot, Words.Across);
    }
}
