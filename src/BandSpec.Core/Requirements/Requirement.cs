using BandSpec.Core.Quantities;

namespace BandSpec.Core.Requirements;

/// <summary>
/// A customer's application and what is to be promised for it: the whole requirement file. It may still contradict itself or ask more than
/// the platform is rated for; only an <see cref="Application"/> is known to be free of that.
/// </summary>
public sealed record Requirement
{
    /// <summary>Number, revision, title and the people involved.</summary>
    public required SpecificationIdentity Identity { get; init; }

    /// <summary>The platform file as written in the requirement, relative to it.</summary>
    public required string PlatformFile { get; init; }

    /// <summary>The station file as written in the requirement, relative to it.</summary>
    public required string StationFile { get; init; }

    /// <summary>The calibrated pressure range.</summary>
    public required PressureRange Pressure { get; init; }

    /// <summary>The output signal over that range.</summary>
    public required OutputSignal Output { get; init; }

    /// <summary>The operating temperatures.</summary>
    public required OperatingTemperature Temperature { get; init; }

    /// <summary>How long the unit stays at which temperature over its service life; at least one bin.</summary>
    public required IReadOnlyList<DwellBin> Profile { get; init; }

    /// <summary>The errors that may not be exceeded, by temperature region, cold to hot.</summary>
    public required IReadOnlyList<AllowedErrorRegion> AllowedError { get; init; }

    /// <summary>The factor <c>S ≥ 1</c> by which the allowed error is divided before anything is designed into it.</summary>
    public required double SafetyFactor { get; init; }

    /// <summary>The capability that the design has to reach.</summary>
    public required CapabilityTarget Capability { get; init; }

    /// <summary>Terms whose limit the customer has fixed; may be empty.</summary>
    public required IReadOnlyList<HeldTerm> HeldTerms { get; init; }

    /// <summary>Error sources outside the platform, such as supply ripple; may be empty.</summary>
    public required IReadOnlyList<FurtherTerm> FurtherTerms { get; init; }

    /// <summary>Which compensation plans may be considered, and which of them is best.</summary>
    public required CompensationScope Compensation { get; init; }

    /// <summary>How the verification test is to decide.</summary>
    public required VerificationRules Test { get; init; }

    /// <summary>The steps to which printed and tested values are rounded.</summary>
    public required RoundingSteps Rounding { get; init; }

    /// <summary>Indices of the regions that a temperature belongs to: one, or both neighbours at an edge; none outside the range.</summary>
    public IEnumerable<int> RegionsAt(Temperature temperature) =>
        Enumerable.Range(0, AllowedError.Count).Where(r => AllowedError[r].From <= temperature && temperature <= AllowedError[r].To);
}

/// <summary>The operating temperature range and the temperature at which the unit is referenced.</summary>
/// <param name="Lower">Coldest operating temperature.</param>
/// <param name="Upper">Hottest operating temperature.</param>
/// <param name="Reference">The requirement's reference temperature <c>T_r</c>, inside the range.</param>
public sealed record OperatingTemperature(Temperature Lower, Temperature Upper, Temperature Reference);

/// <summary>Time spent between two temperatures, spread evenly over them.</summary>
/// <param name="From">The colder end.</param>
/// <param name="To">The hotter end.</param>
/// <param name="Dwell">The time over the service life.</param>
public sealed record DwellBin(Temperature From, Temperature To, Duration Dwell);

/// <summary>The capability indices that the design band has to reach.</summary>
/// <param name="Sample"><c>C_s</c>, judged on the spread within a lot; usually 1.67, five sigma (common practice).</param>
/// <param name="LongRun"><c>C_l</c>, judged on the spread over lots; usually 1.33, four sigma (common practice).</param>
public sealed record CapabilityTarget(double Sample, double LongRun)
{
    /// <summary>
    /// One-sided confidence with which both have to be reached, given the sample that the platform's statistics rest on;
    /// <see langword="null"/> to take the statistics as exact.
    /// </summary>
    public double? Confidence { get; init; }

    /// <summary>Both indices raised by a factor.</summary>
    internal CapabilityTarget Raised(double factor) => this with { Sample = factor * Sample, LongRun = factor * LongRun };
}

/// <summary>A term whose limit is fixed by the customer.</summary>
/// <param name="Term">The key of the term, such as <c>pressure-hysteresis</c>, or the name of a further term.</param>
/// <param name="Limit">Its limit; pressure hysteresis as full width.</param>
public sealed record HeldTerm(string Term, PercentOfSpan Limit);

/// <summary>How a further term depends on pressure.</summary>
public enum FurtherTermShape
{
    /// <summary>The same at every pressure.</summary>
    Constant,

    /// <summary>In proportion to the pressure fraction, nothing at the lower range value.</summary>
    Proportional,
}

/// <summary>An error source that is not the platform's.</summary>
/// <param name="Name">Its name, unique in the requirement.</param>
/// <param name="Bound">A magnitude that adds to the band, not negative.</param>
/// <param name="Sigma">A standard deviation, not negative.</param>
/// <param name="Shape">How both depend on pressure.</param>
public sealed record FurtherTerm(string Name, PercentOfSpan Bound, PercentOfSpan Sigma, FurtherTermShape Shape);

/// <summary>How printed bands and tested limits are rounded.</summary>
/// <param name="Band">Step of band values, rounded up.</param>
/// <param name="Limit">Step of acceptance limits, rounded inward.</param>
public sealed record RoundingSteps(PercentOfSpan Band, PercentOfSpan Limit);

/// <summary>What the requirement says about the verification test.</summary>
/// <param name="GuardBand">
/// The guard band in multiples of the expanded uncertainty <c>U</c> (k = 2) for <see cref="DecisionRule.Guarded"/>, where 0 is simple acceptance;
/// 0 for the other rules.
/// </param>
/// <param name="Temperatures">The verification temperatures, rising; <see langword="null"/> to have them chosen.</param>
public sealed record VerificationRules(double GuardBand, IReadOnlyList<Temperature>? Temperatures)
{
    /// <summary>How acceptance limits are drawn.</summary>
    public DecisionRule Rule { get; init; } = DecisionRule.Guarded;

    /// <summary>
    /// The risk that <see cref="DecisionRule.SpecificRisk"/> or <see cref="DecisionRule.GlobalRisk"/> keeps; <see langword="null"/> for the others.
    /// </summary>
    public double? Risk { get; init; }

    /// <summary>Of whom the band is promised.</summary>
    public Promise Promise { get; init; }
}
