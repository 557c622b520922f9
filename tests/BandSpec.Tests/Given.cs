using BandSpec.Core.Findings;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;

namespace BandSpec.Tests;

/// <summary>Inputs made in code, close to the first demo; tests change what they are about with <c>with</c>.</summary>
internal static class Given
{
    public static Temperature C(double celsius) => Temperature.FromCelsius(celsius);

    public static TemperatureDifference K(double kelvin) => TemperatureDifference.FromKelvin(kelvin);

    public static PercentOfSpan P(double percent) => PercentOfSpan.FromPercent(percent);

    public static Spread Spread(double mean, double sigma) => new(P(mean), P(sigma));

    public static Platform Platform { get; } = new()
    {
        Name = "SK-40 welded steel cell",
        Revision = "4",
        Temperature = new OperatingTemperature(C(-45), C(165), C(25)),
        Pressure = new PressureRating(Pressure.From(4, PressureUnit.Bar), Pressure.From(40, PressureUnit.Bar), 2, 5),
        RawError =
        [
            Coefficient(PressureShape.Zero, 0, 0.0, 2.5, 0.6),
            Coefficient(PressureShape.Zero, 1, 0.9, 1.4, 0.3),
            Coefficient(PressureShape.Zero, 2, 0.55, 0.22, 0.06),
            Coefficient(PressureShape.Zero, 3, -0.12, 0.07, 0.02),
            Coefficient(PressureShape.Zero, 4, 0.03, 0.03, 0),
            Coefficient(PressureShape.Span, 0, 0.0, 4.0, 1.0),
            Coefficient(PressureShape.Span, 1, -6.5, 0.9, 0.3),
            Coefficient(PressureShape.Span, 2, 1.6, 0.25, 0.08),
            Coefficient(PressureShape.Span, 3, -0.3, 0.08, 0.02),
            Coefficient(PressureShape.Span, 4, 0.05, 0.03, 0),
            Coefficient(PressureShape.Bow, 0, 0.18, 0.06, 0.02),
            Coefficient(PressureShape.Bow, 1, 0.02, 0.02, 0),
            Coefficient(PressureShape.SShape, 0, 0.01, 0.012, 0),
        ],
        Correlations = [new CoefficientCorrelation(new(PressureShape.Zero, 1), new(PressureShape.Span, 1), 0.35)],
        ZeroDegree = 4,
        SpanDegree = 3,
        PressureHysteresis = Spread(0.05, 0.012),
        ThermalHysteresis = Spread(0.04, 0.015),
        Repeatability = P(0.012),
        Ageing = new Ageing(Spread(0.02, 0.018), Spread(-0.015, 0.012), C(125), Duration.FromHours(1000), 0.6, 0.5),
    };

    public static Station Station { get; } = new()
    {
        Name = "Chamber line 2",
        StandardZero = P(0.004),
        StandardProportional = P(0.010),
        ReadingNoise = P(0.015),
        ReadingsAveraged = 4,
        SoakGradient = K(0.25),
        PressurePoints = new PressureLists([0, 0.5, 1], [0, 1]),
        TestPoints = new PressureLists([0, 0.25, 0.5, 0.75, 1], [0, 1]),
        Chamber = new Chamber(
            C(23), K(3), K(2), Duration.FromMinutes(35), Duration.FromMinutes(1.5), 48, new Money(95, "EUR")),
        RejectCost = new Money(22, "EUR"),
    };

    public static Requirement Requirement { get; } = new()
    {
        Identity = new SpecificationIdentity(
            "HV-3107", "A", "Brine reinjection line, wellhead skid", "Holmvik Geothermal", "Application engineering",
            new DateOnly(2026, 11, 24), [new RevisionNote("A", new DateOnly(2026, 11, 24), "First issue")]),
        PlatformFile = "platforms/steel-cell-40.yaml",
        StationFile = "stations/chamber-line-2.yaml",
        Pressure = new PressureRange(
            Pressure.From(0, PressureUnit.Bar), Pressure.From(25, PressureUnit.Bar), PressureReference.Gauge),
        Output = new OutputSignal(SignalKind.RatiometricVoltage, "V", 0.5, 4.5, 5, 5.0 / 4096, "12 bit"),
        Temperature = new OperatingTemperature(C(-20), C(150), C(25)),
        Profile =
        [
            new DwellBin(C(-20), C(10), Duration.FromHours(1500)),
            new DwellBin(C(10), C(60), Duration.FromHours(6000)),
            new DwellBin(C(60), C(115), Duration.FromHours(22000)),
            new DwellBin(C(115), C(150), Duration.FromHours(3500)),
        ],
        AllowedError =
        [
            new AllowedErrorRegion(C(-20), C(40), P(1.6), null, 0),
            new AllowedErrorRegion(C(40), C(130), P(1.0), null, 0),
            new AllowedErrorRegion(C(130), C(150), P(1.0), P(1.4), 0),
        ],
        SafetyFactor = 1.15,
        Capability = new CapabilityTarget(1.67, 1.33),
        HeldTerms = [new HeldTerm("pressure-hysteresis", P(0.15))],
        FurtherTerms = [new FurtherTerm("Supply ripple", P(0.02), P(0.01), FurtherTermShape.Constant)],
        Compensation = new CompensationScope
        {
            CandidateStep = K(5),
            FewestTemperatures = 3,
            MostTemperatures = 6,
            Separation = K(15),
            Reach = K(15),
            Objective = PlanObjective.LeastCost,
        },
        Test = new VerificationRules(1.0, null),
        Rounding = new RoundingSteps(P(0.05), P(0.01)),
    };

    public static Application Application(Requirement? requirement = null, Platform? platform = null, Station? station = null)
    {
        Checked<Application> found = Core.Requirements.Application.Check(
            requirement ?? Requirement, platform ?? Platform, station ?? Station);
        return found.Value ?? throw new InvalidOperationException(string.Join(Environment.NewLine, found.Findings));
    }

    private static RawErrorCoefficient Coefficient(PressureShape shape, int degree, double mean, double sigma, double lotSigma) =>
        new(new CoefficientName(shape, degree), mean, sigma, lotSigma);
}
