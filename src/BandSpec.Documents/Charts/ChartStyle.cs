using System.Globalization;
using OxyPlot;
using OxyPlot.Axes;

namespace BandSpec.Documents.Charts;

/// <summary>
/// How every chart looks, in one place. Lines differ by weight and dash, areas by lightness and hatching, points by shape; hue only
/// helps, so a grey print and a colour-blind reader lose nothing. Horizontal titles stand over the axes: no turned text.
/// </summary>
internal static class ChartStyle
{
    public const double FontSize = 7.8;
    public const double LabelSize = 7.2;

    public static readonly OxyColor Ink = OxyColor.FromRgb(0x1c, 0x22, 0x29);
    public static readonly OxyColor Soft = OxyColor.FromRgb(0x5b, 0x66, 0x70);
    public static readonly OxyColor Grid = OxyColor.FromRgb(0xe2, 0xe6, 0xea);
    public static readonly OxyColor Frame = OxyColor.FromRgb(0x9a, 0xa5, 0xaf);
    public static readonly OxyColor Blue = OxyColor.FromRgb(0x1b, 0x4f, 0x8a);
    public static readonly OxyColor BlueWash = OxyColor.FromRgb(0xd6, 0xe3, 0xf0);
    public static readonly OxyColor Ochre = OxyColor.FromRgb(0xb3, 0x5c, 0x00);
    public static readonly OxyColor OchreWash = OxyColor.FromRgb(0xf3, 0xdf, 0xc4);
    public static readonly OxyColor White = OxyColors.White;

    /// <summary>Dashes in points.</summary>
    public static readonly double[] Dashed = [5, 2.5];
    public static readonly double[] Dotted = [1.2, 2];
    public static readonly double[] DashDotted = [6, 2, 1, 2];

    public static readonly Stroke Allowed = new(Ink, 1.8);
    public static readonly Stroke Design = new(Ink, 0.7, DashDotted);
    public static readonly Stroke Maximum = new(Blue, 1.1);
    public static readonly Stroke Typical = new(Ochre, 1.1, Dashed);
    public static readonly Stroke PlanLine = new(Soft, 0.7, Dotted);

    /// <summary>Room around the plot for the figures at the axes and the titles above and below them.</summary>
    public static readonly OxyThickness Margins = new(34, 16, 8, 24);

    public static PlotModel NewPlot(OxyThickness? margins = null) => new()
    {
        Culture = CultureInfo.InvariantCulture,
        DefaultFontSize = FontSize,
        TextColor = Ink,
        Padding = new OxyThickness(0),
        PlotMargins = margins ?? Margins,
        PlotAreaBorderThickness = new OxyThickness(0),
    };

    public static LinearAxis Axis(AxisPosition position, double minimum, double maximum) => new()
    {
        Position = position,
        Minimum = minimum,
        Maximum = maximum,
        MajorGridlineStyle = LineStyle.Solid,
        MajorGridlineColor = Grid,
        MajorGridlineThickness = 0.5,
        CropGridlines = true,
        TickStyle = TickStyle.Outside,
        TicklineColor = Frame,
        MajorTickSize = 3,
        MinorTickSize = 0,
        AxislineStyle = LineStyle.Solid,
        AxislineColor = Frame,
        AxislineThickness = 0.7,
        AxisTickToLabelDistance = 2,
        IntervalLength = position is AxisPosition.Left ? 17 : 48,
        LabelFormatter = Number,
    };

    /// <summary>A figure at an axis, with the minus sign of the typesetter.</summary>
    public static string Number(double value) =>
        Math.Round(value, 6).ToString("0.######", CultureInfo.InvariantCulture).Replace('-', '\u2212');

    /// <summary>OxyPlot wants dashes in multiples of the thickness.</summary>
    public static double[]? Dashes(Stroke stroke) => stroke.Dashes?.Select(d => d / stroke.Width).ToArray();
}
