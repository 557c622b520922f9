using System.Globalization;
using BandSpec.Core.Requirements;

namespace BandSpec.Documents.Printing;

/// <summary>What the customer wrote, as it is shown.</summary>
internal sealed class InputViews(Requirement requirement, string sign)
{
    private const double HoursPerYear = 8760;

    private double TotalHours => requirement.Profile.Sum(b => b.Dwell.Hours);

    public IdentityView Identity
    {
        get
        {
            var identity = requirement.Identity;
            return new IdentityView(
                identity.Number, identity.Revision, identity.Title, identity.Customer, identity.PreparedBy, Day(identity.Date),
                [.. identity.Changes.Select(c => new ChangeView(c.Revision, Day(c.Date), c.Text))]);
        }
    }

    public SignalView Output
    {
        get
        {
            var output = requirement.Output;
            var kind = output.Kind switch
            {
                SignalKind.RatiometricVoltage => "ratiometric-voltage", SignalKind.Voltage => "voltage", SignalKind.Current => "current",
                _ => "code"
            };
            return new SignalView(
                kind, Given(output.AtLower), Given(output.AtUpper), output.Unit, output.Supply is { } supply ? Given(supply) : "",
                output.Resolution ?? "");
        }
    }

    public TemperatureView Temperature =>
        new(
            Given(requirement.Temperature.Lower.Celsius), Given(requirement.Temperature.Upper.Celsius),
            Given(requirement.Temperature.Reference.Celsius));

    public IReadOnlyList<BinView> Bins => [.. requirement.Profile.Select(b =>
        new BinView(
            Given(b.From.Celsius), Given(b.To.Celsius), Given(b.Dwell.Hours),
            Rounded.Nearest(100 * b.Dwell.Hours / Math.Max(TotalHours, double.Epsilon), 1).Shown(sign)))];

    public string Hours => Given(Math.Round(TotalHours, 3));

    public string Years => Given(Math.Round(TotalHours / HoursPerYear, 1));

    public RangeView Range(Platform platform)
    {
        var range = requirement.Pressure;
        var reference = range.Reference switch
        {
            PressureReference.Gauge => "gauge", PressureReference.Absolute => "absolute", PressureReference.SealedGauge => "sealed-gauge",
            _ => "differential"
        };
        return new RangeView(
            Given(range.Lower.In(range.Upper.Unit).Value), Given(range.Upper.Value), range.Upper.Unit.Symbol, reference,
            Given(platform.Pressure.ProofFactor * range.Upper.Value), Given(platform.Pressure.BurstFactor * range.Upper.Value));
    }

    private string Given(double value) => Rounded.Given(value).Shown(sign);

    private static string Day(DateOnly date) => date.ToString("yyyy-MM-dd", CultureInfo.InvariantCulture);
}
