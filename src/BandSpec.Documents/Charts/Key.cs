using BandSpec.Documents.Fonts;
using OxyPlot;

namespace BandSpec.Documents.Charts;

/// <summary>An entry of the key over a chart: a swatch 20 points wide, drawn about the middle of its left edge, and its name.</summary>
internal sealed record KeyEntry(string Name, Action<ChartPen, ScreenPoint> Swatch)
{
    public const double SwatchWidth = 20;

    public static KeyEntry Line(string name, Stroke stroke, MarkerType marker = MarkerType.None) => new(name, (pen, at) =>
    {
        pen.Stroke([at, new(at.X + SwatchWidth, at.Y)], stroke);
        if (marker != MarkerType.None) Point(pen, new(at.X + SwatchWidth / 2, at.Y), marker, stroke.Ink);
    });

    public static KeyEntry Area(string name, OxyColor fill, Stroke edge) => new(name, (pen, at) =>
    {
        pen.Fill(Box(at, 3.4), fill, null);
        pen.Stroke([new(at.X, at.Y - 3.4), new(at.X + SwatchWidth, at.Y - 3.4)], edge);
    });

    public static KeyEntry Mark(string name, MarkerType marker, OxyColor ink, Stroke? line = null) => new(name, (pen, at) =>
    {
        var x = at.X + SwatchWidth / 2;
        if (line is not null) pen.Stroke([new(x, at.Y - 5), new(x, at.Y + 5)], line);
        Point(pen, new(x, at.Y), marker, ink);
    });

    public static ScreenPoint[] Box(ScreenPoint at, double half, double width = SwatchWidth) =>
        [new(at.X, at.Y - half), new(at.X + width, at.Y - half), new(at.X + width, at.Y + half), new(at.X, at.Y + half)];

    private static void Point(ChartPen pen, ScreenPoint at, MarkerType marker, OxyColor ink) =>
        pen.DrawMarkers([at], marker, null, [3], ink, ChartStyle.White, 0.5, EdgeRenderingMode.Automatic);
}

/// <summary>The key over a chart, in as many lines as it needs.</summary>
internal static class Key
{
    private const double LineHeight = 12, Gap = 11, TextGap = 4;

    public static double Height(IReadOnlyList<KeyEntry> entries, double width) =>
        entries.Count == 0 ? 0 : LineHeight * Lines(entries, width).Count + 2;

    public static void Draw(ChartPen pen, IReadOnlyList<KeyEntry> entries, OxyRect area)
    {
        var y = area.Top + LineHeight / 2;
        foreach (var line in Lines(entries, area.Width))
        {
            var x = area.Left;
            foreach (var entry in line)
            {
                entry.Swatch(pen, new(x, y));
                pen.DrawText(
                    new(x + KeyEntry.SwatchWidth + TextGap, y), entry.Name, ChartStyle.Ink, null, ChartStyle.FontSize, 400, 0,
                    HorizontalAlignment.Left, VerticalAlignment.Middle, null);
                x += Width(entry) + Gap;
            }
            y += LineHeight;
        }
    }

    private static double Width(KeyEntry entry) =>
        KeyEntry.SwatchWidth + TextGap + Typeface.Of(Face.Regular).Width(entry.Name, ChartStyle.FontSize);

    private static List<List<KeyEntry>> Lines(IReadOnlyList<KeyEntry> entries, double width)
    {
        List<List<KeyEntry>> lines = [[]];
        double used = 0;
        foreach (var entry in entries)
        {
            if (lines[^1].Count > 0 && used + Width(entry) > width)
            {
                lines.Add([]);
                used = 0;
            }
            lines[^1].Add(entry);
            used += Width(entry) + Gap;
        }
        return lines;
    }
}
