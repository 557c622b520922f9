using System.Globalization;
using System.Text.RegularExpressions;
using BandSpec.Core.Requirements;
using BandSpec.Files.Forms;

namespace BandSpec.Files.Inputs;

/// <summary>The form of <c>raw-error</c> in a platform: coefficients by pressure shape, and their correlations.</summary>
internal static class RawErrorForm
{
    private static readonly (string Word, PressureShape Shape)[] Shapes =
        [("zero", PressureShape.Zero), ("span", PressureShape.Span), ("bow", PressureShape.Bow), ("s-shape", PressureShape.SShape)];

    private static readonly Key<int> Degree = new(
        "degree", new CountForm(AcceptedRanges.CoefficientDegree), "Power of reduced temperature.");
    private static readonly Key<double> Mean = new("mean", new NumberForm(AcceptedRanges.Mean), "Mean over production, %FS.");
    private static readonly Key<double> Sigma = new(
        "sigma", new NumberForm(AcceptedRanges.Spread), "Standard deviation between units of a lot, %FS.");
    private static readonly Key<double> LotSigma = Key.Optional(
        "lot-sigma", new NumberForm(AcceptedRanges.Spread), 0.0, "Standard deviation of the lots about the mean, %FS; 0 when left out.");

    private static readonly MapForm<WrittenCoefficient> Coefficient = new(
        "a coefficient", [Degree, Mean, Sigma, LotSigma], v => new WrittenCoefficient(v.Of(Degree), v.Of(Mean), v.Of(Sigma), v.Of(LotSigma)));

    private static readonly Key<IReadOnlyList<WrittenCoefficient>>[] ByShape =
        [.. Shapes.Select(shape => Key.Optional<IReadOnlyList<WrittenCoefficient>>(
            shape.Word, new ListForm<WrittenCoefficient>("coefficients", Coefficient, 0, 9), [],
            $"Coefficients of the shape {shape.Word} by degree in temperature."))];

    /// <summary>A coefficient's name.</summary>
    internal static PatternForm<CoefficientName> Name { get; } = new(
        "a coefficient's name: shape and degree, such as `zero.1`", @"(zero|span|bow|s-shape)\.([0-9])", NameOf);

    private static readonly Key<IReadOnlyList<CoefficientName>> Between = new(
        "between", new ListForm<CoefficientName>("two coefficients", Name, 2, 2), "The two coefficients, such as [zero.1, span.1].");

    private static readonly Key<double> Value = new("value", new NumberForm(AcceptedRanges.Correlation), "Correlation coefficient.");

    private static readonly MapForm<CoefficientCorrelation> Correlation = new(
        "a correlation", [Between, Value], v => new CoefficientCorrelation(v.Of(Between)[0], v.Of(Between)[1], v.Of(Value)));

    private static readonly Key<IReadOnlyList<CoefficientCorrelation>> Correlations = Key.Optional<IReadOnlyList<CoefficientCorrelation>>(
        "correlations", new ListForm<CoefficientCorrelation>("correlations", Correlation, 0, 630), [],
        "Correlations between coefficients; a pair not listed is uncorrelated.");

    /// <summary>The form.</summary>
    internal static MapForm<RawError> Form { get; } = new(
        "the raw error", [.. ByShape, Correlations], v => new RawError(
            [.. Shapes.Zip(ByShape).SelectMany(pair => v.Of(pair.Second).Select(c =>
                new RawErrorCoefficient(new CoefficientName(pair.First.Shape, c.Degree), c.Mean, c.Sigma, c.LotSigma)))],
            v.Of(Correlations)));

    private static CoefficientName NameOf(GroupCollection groups) => new(
        Shapes.First(shape => shape.Word == groups[1].Value).Shape, int.Parse(groups[2].Value, CultureInfo.InvariantCulture));
}

/// <summary>A coefficient as it was written below its shape.</summary>
internal sealed record WrittenCoefficient(int Degree, double Mean, double Sigma, double LotSigma);

/// <summary>What a platform says about the raw error.</summary>
internal sealed record RawError(IReadOnlyList<RawErrorCoefficient> Coefficients, IReadOnlyList<CoefficientCorrelation> Correlations);
