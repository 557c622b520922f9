using OxyPlot;
using OxyPlot.Series;

namespace BandSpec.Documents.Charts;

/// <summary>The bands about zero, drawn the same over temperature and over pressure. Where a chart has only one upright axis, it needs no key.</summary>
internal static class Bands
{
    public static void Add(
        PlotModel plot, string upright, IReadOnlyList<Spot> allowed, IReadOnlyList<Spot> design, IReadOnlyList<Spot> maximum,
        IReadOnlyList<Spot> typical,
        MarkerType marker = MarkerType.None)
    {
        plot.Series.Add(Area(upright, maximum));
        foreach (var mirrored in new[] { false, true })
        {
            plot.Series.Add(Line(upright, typical, ChartStyle.Typical, mirrored, marker == MarkerType.None ? marker : MarkerType.Triangle));
            plot.Series.Add(Line(upright, maximum, ChartStyle.Maximum, mirrored, marker));
            plot.Series.Add(Line(upright, design, ChartStyle.Design, mirrored, MarkerType.None));
            plot.Series.Add(Line(upright, allowed, ChartStyle.Allowed, mirrored, MarkerType.None));
        }
    }

    public static AreaSeries Area(string? upright, IReadOnlyList<Spot> spots)
    {
        var area = new AreaSeries { YAxisKey = upright, Fill = ChartStyle.BlueWash, Color = OxyColors.Transparent, StrokeThickness = 0 };
        area.Points.AddRange(spots.Select(s => s.Data));
        area.Points2.AddRange(spots.Select(s => s.Mirrored));
        return area;
    }

    public static LineSeries Line(string? upright, IReadOnlyList<Spot> spots, Stroke stroke, bool mirrored, MarkerType marker = MarkerType.None)
    {
        var line = new LineSeries
        {
            YAxisKey = upright,
            Color = stroke.Ink,
            StrokeThickness = stroke.Width,
            Dashes = ChartStyle.Dashes(stroke),
            MarkerType = marker,
            MarkerSize = 2,
            MarkerFill = stroke.Ink,
            MinimumSegmentLength = 0.2,
        };
        line.Points.AddRange(spots.Select(s => mirrored ? s.Mirrored : s.Data));
        return line;
    }
}
