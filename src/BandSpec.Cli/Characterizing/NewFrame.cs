using BandSpec.Core.Characterizing;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;

namespace BandSpec.Cli.Characterizing;

/// <summary>
/// The rest of a platform file that is written for the first time: what readings of uncompensated units cannot tell is put in where it does no
/// harm, and the file says so at each place.
/// </summary>
internal static class NewFrame
{
    /// <summary>The drift of a family that no ageing test was made of.</summary>
    public static Spread None { get; } = new(PercentOfSpan.FromPercent(0), PercentOfSpan.FromPercent(0));

    /// <summary>Says in the file beside the figures that were not measured where they come from.</summary>
    public static void Remark(Dictionary<string, IReadOnlyList<string>> remarks)
    {
        remarks["temperature"] = ["the temperatures that were read; the rating may be narrower"];
        remarks["pressure"] = ["not from readings: put in what the family is rated for"];
        remarks["correction"] = ["the degrees that the readings show; the electronics may have fewer"];
        remarks["ageing"] = ["No ageing test yet: drift is taken as none until `bandspec age` has put it in."];
    }

    /// <summary>The frame for new statistics.</summary>
    /// <param name="found">The statistics.</param>
    /// <param name="range">The calibrated range, if it was given.</param>
    public static PlatformFrame For(Characterization found, PressureRange? range)
    {
        List<double> celsius = [.. found.Curves.SelectMany(curve => curve.Residuals).Select(r => r.Reading.Temperature.Celsius)];
        Pressure upper = range?.Upper ?? Pressure.From(1, PressureUnit.Bar);
        Pressure span = range is null ? upper : Pressure.From(range.Upper.Value - range.Lower.In(range.Upper.Unit).Value, range.Upper.Unit);
        return new PlatformFrame(
            "", "1",
            new OperatingTemperature(
                Temperature.FromCelsius(Math.Ceiling(celsius.Min() - 0.5)), Temperature.FromCelsius(Math.Floor(celsius.Max() + 0.5)), found.Scope.Reference),
            new PressureRating(span, upper, 1, 1), Degree(found, PressureShape.Zero), Degree(found, PressureShape.Span),
            new Ageing(None, None, found.Scope.Reference, Duration.FromHours(1000), 0.7, 0.5), null);
    }

    private static int Degree(Characterization found, PressureShape shape) =>
        Math.Clamp(found.Coefficients.Where(c => c.Name.Shape == shape).Select(c => c.Name.Degree).DefaultIfEmpty(1).Max(), 1, 8);
}
