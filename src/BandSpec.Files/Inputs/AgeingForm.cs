using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using BandSpec.Files.Forms;

namespace BandSpec.Files.Inputs;

/// <summary>The form of <c>ageing</c> in a platform, and that of a mean with its standard deviation.</summary>
internal static class AgeingForm
{
    private static readonly Key<PercentOfSpan> Mean = new("mean", QuantityForms.Error, "Mean over production.");
    private static readonly Key<PercentOfSpan> Sigma = new("sigma", QuantityForms.Error, "Standard deviation over production.");

    /// <summary>A mean and a standard deviation.</summary>
    internal static MapForm<Spread> Spread { get; } = new("a mean and its spread", [Mean, Sigma], v => new Spread(v.Of(Mean), v.Of(Sigma)));

    private static readonly Key<Spread> Zero = new("zero", Spread, "Drift of zero at the end of the test.");
    private static readonly Key<Spread> Span = new("span", Spread, "Drift of span at the end of the test.");

    private static readonly Key<Temperature> TestTemperature = new(
        "temperature", QuantityForms.Temperature, "Temperature of the ageing test.");
    private static readonly Key<Duration> TestDuration = new("duration", QuantityForms.Time, "Length of the ageing test.");
    private static readonly MapForm<AgeingTest> TestForm = new(
        "the ageing test", [TestTemperature, TestDuration], v => new AgeingTest(v.Of(TestTemperature), v.Of(TestDuration)));
    private static readonly Key<AgeingTest> Test = new("test", TestForm, "The ageing test.");

    private static readonly Key<double> ActivationEnergy = new(
        "activation-energy", QuantityForms.Energy, "Activation energy of the Arrhenius law.");
    private static readonly Key<double> TimeExponent = new(
        "time-exponent", new NumberForm(AcceptedRanges.TimeExponent), "Exponent of the time law: drift grows with time to this power.");

    /// <summary>The form.</summary>
    internal static MapForm<Ageing> Form { get; } = new(
        "the ageing", [Zero, Span, Test, ActivationEnergy, TimeExponent],
        v => new Ageing(v.Of(Zero), v.Of(Span), v.Of(Test).Temperature, v.Of(Test).Duration, v.Of(ActivationEnergy), v.Of(TimeExponent)));
}

/// <summary>Conditions of an ageing test.</summary>
internal sealed record AgeingTest(Temperature Temperature, Duration Duration);
