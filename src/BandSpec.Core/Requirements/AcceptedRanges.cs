namespace BandSpec.Core.Requirements;

/// <summary>The accepted range of every figure of the inputs, in one place: the rules judge by it and the published schemas show it.</summary>
public static class AcceptedRanges
{
    /// <summary>Operating, rated, test and ambient temperatures.</summary>
    public static AcceptedRange Temperature { get; } = new(-200, 500, "°C");

    /// <summary>An allowed error or a held limit.</summary>
    public static AcceptedRange Limit { get; } = new(0.001, 50, "%FS");

    /// <summary>A part of the reading that is allowed as error.</summary>
    public static AcceptedRange OfReading { get; } = new(0, 50, "%");

    /// <summary>Safety factor.</summary>
    public static AcceptedRange SafetyFactor { get; } = new(1, 10, "");

    /// <summary>Capability targets: 0.33 is one standard deviation to the limit, 3 is nine.</summary>
    public static AcceptedRange Capability { get; } = new(0.33, 3, "");

    /// <summary>Guard band in multiples of the expanded uncertainty.</summary>
    public static AcceptedRange GuardBand { get; } = new(0, 3, "");

    /// <summary>The risk that a decision rule keeps: half is that of simple acceptance at the limit itself.</summary>
    public static AcceptedRange Risk { get; } = new(0, 0.5, "") { IsAbove = true };

    /// <summary>Steps of rounding.</summary>
    public static AcceptedRange RoundingStep { get; } = new(0.0001, 1, "%FS");

    /// <summary>Step of the candidate temperatures.</summary>
    public static AcceptedRange CandidateStep { get; } = new(0.5, 50, "K");

    /// <summary>Reach and separation of plan temperatures.</summary>
    public static AcceptedRange PlanDistance { get; } = new(0, 200, "K");

    /// <summary>Number of plan temperatures.</summary>
    public static AcceptedRange PlanTemperatures { get; } = new(2, 10, "");

    /// <summary>Dwell over the service life.</summary>
    public static AcceptedRange Dwell { get; } = new(0, 876_000, "h") { IsAbove = true };

    /// <summary>Resolution of an output.</summary>
    public static AcceptedRange Bits { get; } = new(4, 32, "bit");

    /// <summary>Output values, in the output's own unit.</summary>
    public static AcceptedRange Output { get; } = new(-4_294_967_296, 4_294_967_296, "");

    /// <summary>Pressures in pascals: the magnitude that is taken for a slip of the unit.</summary>
    public static AcceptedRange Pressure { get; } = new(-1e10, 1e10, "Pa");

    /// <summary>Means of errors: hysteresis, ageing, coefficients; a magnitude.</summary>
    public static AcceptedRange Mean { get; } = new(-100, 100, "%FS");

    /// <summary>Standard deviations and magnitudes of errors.</summary>
    public static AcceptedRange Spread { get; } = new(0, 50, "%FS");

    /// <summary>Degrees in temperature of a raw-error coefficient.</summary>
    public static AcceptedRange CoefficientDegree { get; } = new(0, 8, "");

    /// <summary>Degrees in temperature of the stored correction.</summary>
    public static AcceptedRange CorrectionDegree { get; } = new(1, 8, "");

    /// <summary>A coefficient of correlation.</summary>
    public static AcceptedRange Correlation { get; } = new(-1, 1, "");

    /// <summary>Proof and burst pressure as multiples of the upper range value.</summary>
    public static AcceptedRange PressureFactor { get; } = new(1, 100, "");

    /// <summary>Activation energy.</summary>
    public static AcceptedRange ActivationEnergy { get; } = new(0, 3, "eV");

    /// <summary>Exponent of the time law of ageing.</summary>
    public static AcceptedRange TimeExponent { get; } = new(0, 2, "");

    /// <summary>Temperature of an ageing test; colder, nothing would age in it.</summary>
    public static AcceptedRange AgeingTemperature { get; } = new(-50, 500, "°C");

    /// <summary>Length of an ageing test.</summary>
    public static AcceptedRange AgeingTest { get; } = new(1, 100_000, "h");

    /// <summary>Units, lots or readings that statistics rest on.</summary>
    public static AcceptedRange SampleSize { get; } = new(1, 1e9, "");

    /// <summary>Standard error of a variance.</summary>
    public static AcceptedRange VarianceError { get; } = new(0, 1e5, "(%FS)²");

    /// <summary>Covariance of estimated means.</summary>
    public static AcceptedRange MeanCovariance { get; } = new(-1e4, 1e4, "(%FS)²");

    /// <summary>Confidence of a claim.</summary>
    public static AcceptedRange Confidence { get; } = new(0.5, 0.999, "");

    /// <summary>Readings averaged at a point.</summary>
    public static AcceptedRange ReadingsAveraged { get; } = new(1, 10_000, "");

    /// <summary>Standard uncertainty of a unit's temperature at the end of the soak.</summary>
    public static AcceptedRange SoakGradient { get; } = new(0, 20, "K");

    /// <summary>A pressure as a fraction of the span.</summary>
    public static AcceptedRange PressureFraction { get; } = new(0, 1, "");

    /// <summary>Heating and cooling rates of a chamber.</summary>
    public static AcceptedRange ChamberRate { get; } = new(0, 100, "K/min") { IsAbove = true };

    /// <summary>Times of a chamber run.</summary>
    public static AcceptedRange ChamberTime { get; } = new(0, 2880, "min");

    /// <summary>Units in one chamber run.</summary>
    public static AcceptedRange Batch { get; } = new(1, 100_000, "");

    /// <summary>Sums of money.</summary>
    public static AcceptedRange Money { get; } = new(0, 1e9, "");
}
