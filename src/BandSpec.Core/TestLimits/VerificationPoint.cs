using BandSpec.Core.Allocating;
using BandSpec.Core.Bands;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.TestLimits;

/// <summary>From which side a test pressure is approached.</summary>
public enum PressureDirection
{
    /// <summary>From below.</summary>
    Rising,

    /// <summary>From above.</summary>
    Falling,
}

/// <summary>One point of the verification test with its limits.</summary>
public sealed record VerificationPoint
{
    /// <summary>Its name, unique in the specification: <c>V01</c>, <c>V02</c> … in the order of the test.</summary>
    public required string Id { get; init; }

    /// <summary>Chamber temperature.</summary>
    public required Temperature Temperature { get; init; }

    /// <summary>Applied pressure as a fraction of the span.</summary>
    public required double PressureFraction { get; init; }

    /// <summary>Applied pressure.</summary>
    public required Pressure Pressure { get; init; }

    /// <summary>From which side.</summary>
    public required PressureDirection Direction { get; init; }

    /// <summary>Nominal output, in the output's unit.</summary>
    public required double Nominal { get; init; }

    /// <summary>Lowest reading that is accepted, in the output's unit, rounded inward.</summary>
    public required double Lower { get; init; }

    /// <summary>Highest reading that is accepted, in the output's unit, rounded inward; below <see cref="Lower"/> when nothing can be accepted.</summary>
    public required double Upper { get; init; }

    /// <summary>Half width of the tolerance, <c>L_v</c>: what a good unit may show here.</summary>
    public required PercentOfSpan Tolerance { get; init; }

    /// <summary>Guard band by which decision rule and promise keep acceptance inside the tolerance.</summary>
    public required PercentOfSpan GuardBand { get; init; }

    /// <summary>Expanded uncertainty of the test reading, <c>U = 2u_v</c>.</summary>
    public required PercentOfSpan Uncertainty { get; init; }

    /// <summary>Mean of the process, <c>μ_v</c>, signed with the direction's hysteresis.</summary>
    public required PercentOfSpan ProcessMean { get; init; }

    /// <summary>Standard deviation of the process over lots, <c>σ_v</c>, without what counts as measurement.</summary>
    public required PercentOfSpan ProcessSigma { get; init; }

    /// <summary>Probability that a unit is accepted here although beyond the tolerance (JCGM 106:2012).</summary>
    public required double ConsumerRisk { get; init; }

    /// <summary>Probability that a unit is rejected here although within the tolerance (JCGM 106:2012).</summary>
    public required double ProducerRisk { get; init; }

    /// <summary>All points of a plan's verification test, in the order of the test.</summary>
    /// <param name="application">The application.</param>
    /// <param name="plan">The compensation plan.</param>
    /// <param name="bands">The plan's band.</param>
    /// <param name="allocation">How the allowed error was shared out.</param>
    public static IReadOnlyList<VerificationPoint> AllOf(
        Application application, CompensationPlan plan, BandMap bands, Allocation allocation) =>
        AllOf(application, plan, bands, allocation, RulesOf(application));

    /// <summary>The same points as another decision rule would have them.</summary>
    internal static IReadOnlyList<VerificationPoint> AllOf(
        Application application, CompensationPlan plan, BandMap bands, Allocation allocation, VerificationRules rules) =>
        new VerificationTest(application, plan, bands, Multipliers.Of(allocation), rules).Points();

    private static VerificationRules RulesOf(Application application)
    {
        ArgumentNullException.ThrowIfNull(application);
        return application.Requirement.Test;
    }
}
