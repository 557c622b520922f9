using BandSpec.Documents.Charts;
using BandSpec.Documents.Model;

namespace BandSpec.Tests.Documents;

/// <summary>Every chart with made-up figures.</summary>
internal static class SampleCharts
{
    private static readonly Spot[] Allowed = [new(-20, 1.6), new(40, 1.6), new(40, 1.0), new(130, 1.0), new(150, 1.4)];
    private static readonly DwellBin[] Dwell = [
        new(-20, 10, 4.5, "1 500 h"), new(10, 60, 18.2, "6 000 h"), new(60, 115, 66.7, "22 000 h"), new(115, 150, 10.6, "3 500 h")];

    public static readonly BandChart Band = new(
        new("Temperature, °C", "Error, %FS", "Dwell, % of service life", "Allowed", "Divided by the safety factor", "Maximum", "Typical", "Compensation temperature", "Least margin"),
        Allowed, [.. Allowed.Select(s => s with { Y = s.Y / 1.15 })], Curve(0.62), Curve(0.4), [-10, 25, 80, 140], new(130, 0.93), Dwell);

    public static Figure BandFigure() =>
        new(
            "Figure 1", "Error band over temperature, with the dwell profile",
            "Band chart: the maximum error lies inside the allowed error everywhere.", Band, "band.svg");

    public static IEnumerable<Figure> Figures() =>
    [
        new("Figure 2", "Error over pressure at 130 °C", "Error over pressure.", Pressure, "pressure.svg"),
        new("Figure 3", "Shares of the design band", "Stacked bars of each term's share by region.", Share, "share.svg"),
        new("Figure 4", "Chamber temperature over time", "Chamber temperature with four stays.", Chamber, "chamber.svg"),
        new("Figure 5", "Dwell profile", "Bars of the dwell profile.", new DwellChart("Temperature, °C", "Dwell, %", Dwell), "dwell.svg"),
        new("Figure 6", "Cost against margin and rms error", "Stairs of margin and rms error over cost.", Front, "front.svg"),
        new("Figure 7", "Cost against margin", "Stairs of margin over cost.", Front with { Errors = [] }, "front-margin.svg"),
        new("Figure 8", "A sweep", "Margin, yield and chance over a figure.", Sweep, "sweep.svg"),
    ];

    private static SweepChart Sweep => new(
        new("station.soak-gradient", "Margin", "Accepted, %", "Chance of leaving", "Closed form", "Counted", "Sampled", "Needed"),
        [new(0, 1.2), new(0.5, 1.0), new(1, 0.8)], [new(0, 99.9), new(0.5, 99.2), new(1, 92)], [new(0, 0), new(0.5, 3e-9), new(1, 2e-4)]);

    private static FrontChart Front => new(
        new("Cost, EUR a unit", "Margin", "Rms error, %FS", "Best for the money", "Fits", "Falls short", "Taken by the draft", "Needed"),
        [new(7.7, 0.92, false, "1"), new(7.8, 0.93, false, "2"), new(9.5, 1.003, true, "3"), new(9.7, 1.01, true, "4")],
        [new(9.5, 0.14, true, "5"), new(11, 0.138, true, "6")], new(9.5, 1.003));

    private static PressureChart Pressure => new(
        new("Pressure, bar", "Error, %FS", "Allowed", "", "Maximum", "Typical"),
        [new(0, 1), new(25, 1)], [],
        [.. Enumerable.Range(0, 11).Select(i => new Spot(2.5 * i, 0.7 + 0.02 * i + 0.1 * Math.Sin(0.314 * i)))],
        [.. Enumerable.Range(0, 11).Select(i => new Spot(2.5 * i, 0.5 + 0.01 * i))]);

    private static ShareChart Share => new("Share of the allowed error, %",
        ["Zero residue", "Span residue", "Linearity residue", "Carried noise", "Pressure hysteresis", "Thermal hysteresis", "Repeatability", "Ageing", "Safety", "Unused"],
        [new("−20 °C to 40 °C", [8, 6, 4, 3, 5, 5, 3, 30, 13, 23]), new("40 °C to 130 °C", [10, 9, 6, 4, 7, 6, 4, 34, 13, 7]), new("130 °C to 150 °C", [14, 11, 6, 5, 6, 5, 4, 28, 13, 8])]);

    private static ChamberChart Chamber => new(
        new("Time, min", "Chamber temperature, °C", "Heating or cooling", "Soak", "Measuring"), 23,
        [new(-10, 16.5, 51.5, 54.5, "−10 °C, 2 points"), new(25, 66.2, 101.2, 105.7, "25 °C, 3 points"), new(80, 124, 159, 162, "80 °C, 2 points"), new(140, 182, 217, 220, "140 °C, 2 points")], 278.5);

    private static Spot[] Curve(double level) =>
        [.. Enumerable.Range(0, 35).Select(i => new Spot(-20 + 5 * i, level + 0.35 * Math.Pow((i - 15) / 19.0, 2) + 0.12 * Math.Cos(i / 3.0)))];
}
