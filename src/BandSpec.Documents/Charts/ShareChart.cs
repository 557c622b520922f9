using BandSpec.Documents.Fonts;
using OxyPlot;
using OxyPlot.Annotations;
using OxyPlot.Axes;

namespace BandSpec.Documents.Charts;

/// <summary>One region's bar: its name, and the share in percent of each of the chart's parts, in their order.</summary>
internal sealed record ShareBar(string Region, IReadOnlyList<double> Shares);

/// <summary>
/// What the allowed error is spent on, region by region, as stacked bars. The parts are the terms, and last the safety factor and what is
/// not used.
/// </summary>
internal sealed record ShareChart(string Across, IReadOnlyList<string> Parts, IReadOnlyList<ShareBar> Bars) : Chart
{
    private const string Upright = "regions";

    private double Pitch => Math.Clamp(560.0 / Bars.Count, 9, 20);

    private double LeftMargin => Math.Min(150, 8 + Bars.Max(b => Typeface.Of(Face.Regular).Width(b.Region, ChartStyle.FontSize)));

    public override double Height => Pitch * Bars.Count + 34 + Key.Height(KeyEntries, Width);

    protected override IReadOnlyList<KeyEntry> KeyEntries =>
        [.. Parts.Select((name, i) => new KeyEntry(name, (pen, at) => TileOf(i).Fill(pen, Swatch(at))))];

    private static OxyRect Swatch(ScreenPoint at) => new(at.X, at.Y - 3.6, KeyEntry.SwatchWidth, 7.2);

    protected override PlotModel Plot()
    {
        var plot = ChartStyle.NewPlot(new OxyThickness(LeftMargin, 4, 12, 24));
        var across = ChartStyle.Axis(AxisPosition.Bottom, 0, Math.Max(100, Bars.Max(b => b.Shares.Sum())) * 1.02);
        plot.Axes.Add(across);
        // The first region is the top bar; a plain axis without figures carries the bars, their names are written beside it.
        var upright = ChartStyle.Axis(AxisPosition.Left, -0.5, Bars.Count - 0.5);
        (upright.Key, upright.StartPosition, upright.EndPosition) = (Upright, 1, 0);
        (upright.MajorGridlineStyle, upright.TickStyle, upright.LabelFormatter) = (LineStyle.None, TickStyle.None, _ => "");
        plot.Axes.Add(upright);
        for (int row = 0; row < Bars.Count; row++) AddBar(plot, row);
        plot.Annotations.Add(Whole());
        return plot;
    }

    protected override void Annotate(ChartPen pen, PlotModel plot)
    {
        var upright = plot.GetAxis(Upright);
        for (int row = 0; row < Bars.Count; row++)
            Note(
                pen, new(plot.PlotArea.Left - 5, upright.Transform(row)), Bars[row].Region, HorizontalAlignment.Right,
                VerticalAlignment.Middle, ChartStyle.Ink);
        TitleBelow(pen, plot, Across);
    }

    // The line at the whole of the allowed error, which no bar should cross.
    private static LineAnnotation Whole() => new()
    {
        Type = LineAnnotationType.Vertical,
        X = 100,
        YAxisKey = Upright,
        Color = ChartStyle.Ink,
        StrokeThickness = 1.2,
        LineStyle = LineStyle.Solid,
    };

    private Tile TileOf(int part) => part == Parts.Count - 1 ? Tile.Unused : part == Parts.Count - 2 ? Tile.Safety : Tile.Of(part);

    private void AddBar(PlotModel plot, int row)
    {
        double from = 0;
        for (int part = 0; part < Parts.Count; part++)
        {
            var share = Bars[row].Shares[part];
            if (share > 0) plot.Annotations.Add(new TileAnnotation(TileOf(part), from, from + share, row) { YAxisKey = Upright });
            from += share;
        }
    }

    private sealed class TileAnnotation(Tile tile, double from, double to, int row) : Annotation
    {
        public override void Render(IRenderContext rc)
        {
            ScreenPoint a = Transform(new DataPoint(from, row - 0.32)), b = Transform(new DataPoint(to, row + 0.32));
            tile.Fill((ChartPen)rc, new OxyRect(a, b));
        }
    }
}
