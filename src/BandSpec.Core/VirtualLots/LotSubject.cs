using BandSpec.Core.Requirements;
using BandSpec.Core.Specifying;
using BandSpec.Core.TestLimits;

namespace BandSpec.Core.VirtualLots;

/// <summary>
/// What a virtual lot is made of, read on and judged by. The three inputs stand by themselves, not as an <see cref="Application"/>, so that
/// single sources of scatter can be switched off although no customer would ask for that.
/// </summary>
/// <param name="Requirement">The customer's application: map, profile and allowed error.</param>
/// <param name="Platform">The sensor family that units are drawn from.</param>
/// <param name="Station">The station that reads them.</param>
/// <param name="Plan">Where they are read for compensation, and what is fitted.</param>
/// <param name="VerificationPoints">The verification test and its limits, in the order of the test.</param>
public sealed record LotSubject(
    Requirement Requirement, Platform Platform, Station Station, CompensationPlan Plan, IReadOnlyList<VerificationPoint> VerificationPoints)
{
    /// <summary>The lot that a finished specification is about.</summary>
    public static LotSubject Of(Specification specification)
    {
        ArgumentNullException.ThrowIfNull(specification);
        Application application = specification.Application;
        return new LotSubject(
            application.Requirement, application.Platform, application.Station, specification.Choice.Plan, specification.VerificationPoints);
    }
}
