using OxyPlot;
using OxyPlot.Axes;

namespace BandSpec.Documents.Charts;

/// <summary>A place on a chart, in the units of its axes.</summary>
internal readonly record struct Spot(double X, double Y)
{
    public DataPoint Data => new(X, Y);

    public DataPoint Mirrored => new(X, -Y);
}

/// <summary>A chart as plain numbers and words; drawn the same on paper and in SVG. Width and height are in points.</summary>
internal abstract record Chart
{
    public virtual double Width => 470;

    /// <summary>The sign between whole and fraction in the figures at the axes.</summary>
    public string DecimalSign { get; init; } = ".";

    public abstract double Height { get; }

    protected abstract IReadOnlyList<KeyEntry> KeyEntries { get; }

    protected abstract PlotModel Plot();

    /// <summary>What is written beyond the axes' own figures, once the plot stands.</summary>
    protected abstract void Annotate(ChartPen pen, PlotModel plot);

    public void Draw(ChartPen pen, OxyRect area)
    {
        var key = Key.Height(KeyEntries, area.Width);
        Key.Draw(pen, KeyEntries, area);
        var plot = Plot();
        foreach (var axis in plot.Axes.Where(a => a.LabelFormatter == ChartStyle.Number))
            axis.LabelFormatter = value => ChartStyle.Number(value).Replace(".", DecimalSign, StringComparison.Ordinal);
        ((IPlotModel)plot).Update(true);
        ((IPlotModel)plot).Render(pen, new OxyRect(area.Left, area.Top + key, area.Width, area.Height - key));
        // OxyPlot draws its own faults as text into the picture; a specification must not be issued with one.
        if (plot.GetLastPlotException() is { } fault) throw new InvalidOperationException("A chart could not be drawn.", fault);
        Annotate(pen, plot);
    }

    /// <summary>The title of an upright axis, level, over its upper end.</summary>
    protected static void TitleAbove(ChartPen pen, PlotModel plot, Axis axis, string title) =>
        Note(
            pen, new(plot.PlotBounds.Left, Math.Min(axis.ScreenMin.Y, axis.ScreenMax.Y) - 8), title, HorizontalAlignment.Left,
            VerticalAlignment.Bottom, ChartStyle.Soft);

    /// <summary>The title of a level axis, below its figures, at its right end.</summary>
    protected static void TitleBelow(ChartPen pen, PlotModel plot, string title) =>
        Note(
            pen, new(plot.PlotArea.Right, plot.PlotBounds.Bottom - 1), title, HorizontalAlignment.Right, VerticalAlignment.Bottom,
            ChartStyle.Soft);

    protected static void Note(
        ChartPen pen, ScreenPoint at, string text, HorizontalAlignment across, VerticalAlignment up, OxyColor ink, bool strong = false) =>
        pen.DrawText(at, text, ink, null, ChartStyle.LabelSize, strong ? 600 : 400, 0, across, up, null);
}
