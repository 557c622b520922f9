using BandSpec.Core.Requirements;
using BandSpec.Core.TestLimits;

namespace BandSpec.Documents.Printing;

/// <summary>
/// The verification points as they are printed. Readings get as many decimals as the limit step has in the output's unit, and limits are
/// rounded inward to them: what prints as accepted is accepted.
/// </summary>
internal sealed class PointViews(Requirement requirement)
{
    private const int MostPressureDecimals = 4, PercentDecimals = 3;

    private int ReadingDecimals =>
        Math.Max(0, (int)-Math.Floor(Math.Log10(requirement.Rounding.Limit.Percent / 100 * Math.Abs(requirement.Output.Span)) + 1e-9));

    public IEnumerable<PointView> Of(IReadOnlyList<VerificationPoint> points)
    {
        var decimals = ReadingDecimals;
        var step = Math.Pow(10, -decimals);
        // A column shows as many decimals as its figures need, so that points line up.
        var pressure = points.Select(p => Rounded.Decimals(Math.Round(p.Pressure.Value, MostPressureDecimals))).DefaultIfEmpty(0).Max();
        var temperature = points.Select(p => Rounded.Decimals(Math.Round(p.Temperature.Celsius, 1))).DefaultIfEmpty(0).Max();
        return points.Select(p => new PointView(
            p.Id, Rounded.Nearest(p.Temperature.Celsius, temperature), Rounded.Nearest(p.Pressure.Value, pressure),
            Rounded.Given(Math.Round(p.PressureFraction, 6)),
            p.Direction == PressureDirection.Rising ? "rising" : "falling",
            Rounded.Nearest(p.Nominal, decimals), Rounded.Above(p.Lower, step), Rounded.Below(p.Upper, step),
            Rounded.Nearest(p.Tolerance.Percent, PercentDecimals), Rounded.Nearest(p.GuardBand.Percent, PercentDecimals),
            Rounded.Nearest(p.Uncertainty.Percent, PercentDecimals),
            Rounded.PerMillion(p.ConsumerRisk), Rounded.PerMillion(p.ProducerRisk)));
    }
}
