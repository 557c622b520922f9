using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using BandSpec.Files.Forms;

namespace BandSpec.Files.Inputs;

/// <summary>The form of <c>sample</c> in a platform: what its statistics rest on and how uncertain they are for that.</summary>
internal static class SampleForm
{
    private static readonly Key<int> Units = new("units", new CountForm(AcceptedRanges.SampleSize), "How many units were measured.");
    private static readonly Key<int> Lots = new("lots", new CountForm(AcceptedRanges.SampleSize), "Of how many lots they were.");
    private static readonly Key<int> Readings = new("readings", new CountForm(AcceptedRanges.SampleSize), "How many readings were used.");

    private static readonly Key<PercentOfSpan> MeanError = new("mean-error", QuantityForms.Error, "Standard error of the mean.");
    private static readonly Key<double> VarianceError = new(
        "variance-error", new NumberForm(AcceptedRanges.VarianceError), "Standard error of the square of sigma, (%FS)².");
    private static readonly MapForm<SpreadAccuracy> Accuracy = new(
        "the accuracy of a mean and its spread", [MeanError, VarianceError], v => new SpreadAccuracy(v.Of(MeanError), v.Of(VarianceError)));

    private static readonly Key<CoefficientName> Of = new("of", RawErrorForm.Name, "Which coefficient, such as zero.1.");
    private static readonly Key<double> LotVarianceError = Key.Optional(
        "lot-variance-error", new NumberForm(AcceptedRanges.VarianceError), 0.0, "Standard error of the square of lot-sigma, (%FS)².");
    private static readonly Key<IReadOnlyList<double>> MeanCovariance = new(
        "mean-covariance", new ListForm<double>("covariances", new NumberForm(AcceptedRanges.MeanCovariance), 1, 36),
        "Covariances of its mean with the means of the coefficients listed before it, and last the variance of its own, (%FS)².");
    private static readonly MapForm<CoefficientAccuracy> Coefficient = new(
        "the accuracy of a coefficient", [Of, VarianceError, LotVarianceError, MeanCovariance],
        v => new CoefficientAccuracy(v.Of(Of), v.Of(VarianceError), v.Of(LotVarianceError), v.Of(MeanCovariance)));

    private static readonly Key<IReadOnlyList<CoefficientAccuracy>> Coefficients = new(
        "coefficients", new ListForm<CoefficientAccuracy>("the accuracy of the coefficients", Coefficient, 1, 36), "Each coefficient once.");
    private static readonly Key<SpreadAccuracy> PressureHysteresis = Key.Optional<SpreadAccuracy>(
        "pressure-hysteresis", Accuracy, "Accuracy of the pressure hysteresis.");
    private static readonly Key<SpreadAccuracy> ThermalHysteresis = Key.Optional<SpreadAccuracy>(
        "thermal-hysteresis", Accuracy, "Accuracy of the thermal hysteresis.");
    private static readonly Key<double> Repeatability = Key.Optional(
        "repeatability-variance-error", new NumberForm(AcceptedRanges.VarianceError), 0.0,
        "Standard error of the square of the repeatability, (%FS)².");

    private static readonly Key<SpreadAccuracy> Zero = new("zero", Accuracy, "Accuracy of the drift of zero.");
    private static readonly Key<SpreadAccuracy> Span = new("span", Accuracy, "Accuracy of the drift of span.");
    private static readonly Key<double> EnergyError = new(
        "activation-energy-error", QuantityForms.Energy, "Standard error of the activation energy; 0 eV when it was assumed.");
    private static readonly Key<double> ExponentError = new(
        "time-exponent-error", new NumberForm(AcceptedRanges.TimeExponent), "Standard error of the time exponent; 0 when it was assumed.");
    private static readonly MapForm<AgeingAccuracy> AgeingAccuracyForm = new(
        "the accuracy of the drift", [Units, Zero, Span, EnergyError, ExponentError],
        v => new AgeingAccuracy(v.Of(Units), v.Of(Zero), v.Of(Span), v.Of(EnergyError), v.Of(ExponentError)));
    private static readonly Key<AgeingAccuracy> Ageing = Key.Optional<AgeingAccuracy>("ageing", AgeingAccuracyForm, "Accuracy of the drift.");

    /// <summary>The form.</summary>
    internal static MapForm<PlatformSample> Form { get; } = new(
        "the sample", [Units, Lots, Readings, Coefficients, PressureHysteresis, ThermalHysteresis, Repeatability, Ageing],
        v => new PlatformSample
        {
            Units = v.Of(Units), Lots = v.Of(Lots), Readings = v.Of(Readings), Coefficients = v.Of(Coefficients),
            PressureHysteresis = v.Find(PressureHysteresis), ThermalHysteresis = v.Find(ThermalHysteresis),
            RepeatabilityVarianceError = v.Of(Repeatability), Ageing = v.Find(Ageing),
        });
}
