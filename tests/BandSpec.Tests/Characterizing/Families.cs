using BandSpec.Core.Characterizing;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;

namespace BandSpec.Tests.Characterizing;

/// <summary>Invented sensor families to be characterized.</summary>
internal static class Families
{
    /// <summary>Straight lines in temperature, a bow, both hystereses: the smallest family that shows every kind of term.</summary>
    public static Platform Plain { get; } = Given.Platform with
    {
        RawError =
        [
            Coefficient(PressureShape.Zero, 0, 0.1, 2.5, 0.6), Coefficient(PressureShape.Zero, 1, 0.9, 1.4, 0.3),
            Coefficient(PressureShape.Span, 0, -0.4, 4.0, 1.0), Coefficient(PressureShape.Span, 1, -6.5, 0.9, 0.3),
            Coefficient(PressureShape.Bow, 0, 0.18, 0.06, 0.02),
        ],
    };

    /// <summary>The same with curves in temperature.</summary>
    public static Platform Curved { get; } = Given.Platform with
    {
        RawError =
        [
            .. Plain.RawError,
            Coefficient(PressureShape.Zero, 2, 0.55, 0.22, 0.06), Coefficient(PressureShape.Span, 2, 1.6, 0.25, 0.08),
            Coefficient(PressureShape.Zero, 3, -0.12, 0.07, 0.02),
        ],
    };

    /// <summary>The terms of <see cref="Plain"/>, fixed beforehand.</summary>
    public static CharacterizationScope PlainScope { get; } = new()
    {
        Reference = Temperature.FromCelsius(25),
        PinnedDegrees = new Dictionary<PressureShape, int>
        {
            [PressureShape.Zero] = 1, [PressureShape.Span] = 1, [PressureShape.Bow] = 0, [PressureShape.SShape] = -1,
        },
        PinnedCorrelations = [Pair],
    };

    /// <summary>The pair that the families correlate by 0.35.</summary>
    public static CoefficientPair Pair => new(new CoefficientName(PressureShape.Zero, 1), new CoefficientName(PressureShape.Span, 1));

    public static CharacterizationScope OpenScope { get; } = new() { Reference = Temperature.FromCelsius(25) };

    private static RawErrorCoefficient Coefficient(PressureShape shape, int degree, double mean, double sigma, double lotSigma) =>
        new(new CoefficientName(shape, degree), mean, sigma, lotSigma);
}
