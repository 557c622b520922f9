using OxyPlot;

namespace BandSpec.Documents.Charts;

/// <summary>
/// A filling that is told apart without its hue: neighbours in the list differ in lightness by a good step, and every second one is
/// hatched. The list is walked through in order; with more terms than fillings it starts again with the other hatching.
/// </summary>
internal sealed record Tile(OxyColor Ground, OxyColor Hatch, int Slope)
{
    private const double Spacing = 3.2;

    /// <summary>What the safety factor keeps free, and what nothing needs: lighter than any term.</summary>
    public static readonly Tile Safety = new(
        OxyColor.FromRgb(0xee, 0xf0, 0xf2), ChartStyle.Frame, 1), Unused = new(ChartStyle.White, ChartStyle.White, 0);

    private static readonly OxyColor[] Grounds =
    [
        OxyColor.FromRgb(0x1b, 0x3d, 0x66), OxyColor.FromRgb(0xbf, 0xd3, 0xe8), OxyColor.FromRgb(0x4f, 0x81, 0xb4),
        OxyColor.FromRgb(0xf3, 0xdf, 0xc4),
        OxyColor.FromRgb(0x8a, 0x4a, 0x0c), OxyColor.FromRgb(0xd9, 0xdd, 0xe1), OxyColor.FromRgb(0x6c, 0x77, 0x82),
        OxyColor.FromRgb(0xe4, 0xb9, 0x72),
    ];

    // 1 and -1 lean to either side, 0 is plain.
    private static readonly int[] Slopes = [0, 1, 0, -1, 0, 0, 1, 0];

    public static Tile Of(int index)
    {
        var ground = Grounds[index % Grounds.Length];
        var again = index >= Grounds.Length;
        var slope = Slopes[index % Grounds.Length];
        return new Tile(ground, Luma(ground) > 150 ? ChartStyle.Soft : ChartStyle.White, again ? (slope == 0 ? -1 : 0) : slope);
    }

    public void Fill(ChartPen pen, OxyRect area)
    {
        pen.Fill(
            [new(area.Left, area.Top), new(area.Right, area.Top), new(area.Right, area.Bottom), new(area.Left, area.Bottom)], Ground,
            this == Unused ? new Stroke(ChartStyle.Frame, 0.5) : new Stroke(ChartStyle.White, 0.6));
        if (Slope == 0 || area.Width < 1) return;
        for (var x = area.Left - area.Height + Spacing / 2; x < area.Right; x += Spacing) Lean(pen, area, x);
    }

    // A line at 45 degrees from the lower edge at x to the upper edge at x + height, cut to the area (and mirrored for the other slope).
    private void Lean(ChartPen pen, OxyRect area, double x)
    {
        double from = Math.Max(x, area.Left), to = Math.Min(x + area.Height, area.Right);
        if (to <= from) return;
        double low = area.Bottom - (from - x), high = area.Bottom - (to - x);
        double Mirror(double y) => Slope > 0 ? y : area.Top + area.Bottom - y;
        pen.Stroke([new(from, Mirror(low)), new(to, Mirror(high))], new Stroke(Hatch, 0.5));
    }

    private static double Luma(OxyColor c) => 0.299 * c.R + 0.587 * c.G + 0.114 * c.B;
}
