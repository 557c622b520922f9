using System.Globalization;
using System.Text.RegularExpressions;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using BandSpec.Files.Forms;

namespace BandSpec.Files.Inputs;

/// <summary>The form of <c>chamber</c> in a station, and those of sums of money.</summary>
internal static class ChamberForm
{
    private const string SumPattern = @"([0-9]{1,10}(\.[0-9]{1,4})?) +([A-Z]{3})";

    private static readonly Key<Temperature> Ambient = new(
        "ambient", QuantityForms.Temperature, "Temperature at which a run begins and ends.");
    private static readonly Key<TemperatureDifference> Heating = new("heating", QuantityForms.Rate, "Heating rate.");
    private static readonly Key<TemperatureDifference> Cooling = new("cooling", QuantityForms.Rate, "Cooling rate.");
    private static readonly Key<Duration> Soak = new("soak", QuantityForms.Time, "Time to settle at each temperature.");
    private static readonly Key<Duration> PressurePoint = new("pressure-point", QuantityForms.Time, "Time for each pressure point.");
    private static readonly Key<int> Batch = new("batch", new CountForm(AcceptedRanges.Batch), "Units in one run.");

    private static readonly Key<Money> Rate = new(
        "rate", new PatternForm<Money>("a sum of money an hour, such as `95 EUR/h`", SumPattern + "/h", SumOf), "Cost of an hour of chamber time.");

    /// <summary>A sum of money.</summary>
    internal static PatternForm<Money> Sum { get; } = new("a sum of money, such as `22 EUR`", SumPattern, SumOf);

    /// <summary>The form.</summary>
    internal static MapForm<Chamber> Form { get; } = new(
        "the chamber", [Ambient, Heating, Cooling, Soak, PressurePoint, Batch, Rate],
        v => new Chamber(v.Of(Ambient), v.Of(Heating), v.Of(Cooling), v.Of(Soak), v.Of(PressurePoint), v.Of(Batch), v.Of(Rate)));

    private static Money SumOf(GroupCollection groups) =>
        new(double.Parse(groups[1].Value, NumberStyles.AllowDecimalPoint, CultureInfo.InvariantCulture), groups[3].Value);
}
