using BandSpec.Core.Requirements;
using BandSpec.Core.Specifying;
using BandSpec.Core.VirtualLots;
using Xunit;

namespace BandSpec.Tests.VirtualLots;

public sealed class LeavingProbabilityTests
{
    /// <summary>The demo's plan held against a part of the allowed error, so that leaving becomes as frequent as wanted.</summary>
    private static Specification Narrowed(double part)
    {
        Requirement narrow = Given.Requirement with
        {
            AllowedError = [.. Given.Requirement.AllowedError.Select(r => r with { Limit = Given.P(r.Limit.Percent * part), LimitAtEnd = null })],
            HeldTerms = [],
            Output = Given.Requirement.Output with { Step = null, Resolution = null },
            Compensation = Given.Requirement.Compensation with { FewestTemperatures = 3, MostTemperatures = 3, CandidateStep = Given.K(20) },
        };
        return SpecificationDraft.Draft(Given.Application(narrow));
    }

    [Fact]
    public void Where_units_leave_often_virtual_lots_count_as_many()
    {
        Specification specification = Narrowed(0.3);
        LeavingProbability found = LeavingProbability.Of(specification, 1, 0.01, 2_000_000);
        LotReport report = LotReport.Of(specification, LotRun.Make(LotSubject.Of(specification), LotOrder.For(200_000, 16, 1), 2));
        Same(1 - report.Good.Value, Error(report.Good), found.AnyUnit);
        Same(report.AcceptedLeaving.Value, Error(report.AcceptedLeaving), found.AcceptedUnit);
        Same(report.Steps[^3].Through.Value, Error(report.Steps[^3].Through), found.Accepted);
    }

    [Fact]
    public void The_union_lies_between_the_largest_pointwise_probability_and_their_sum()
    {
        LeavingProbability found = LeavingProbability.Of(Narrowed(0.7), 1, 0.01, 2_000_000);
        Assert.InRange(found.AnyUnit.Value, found.LargestPointwise, found.SumPointwise);
        Assert.InRange(found.AnyUnit.RelativeError, 0, 0.01);
        Assert.InRange(found.AnyUnit.Value, 1e-14, 1e-9);
        Assert.InRange(found.AcceptedUnit.RelativeError, 0, 0.012);
    }

    private static double Error(Rate rate) => Math.Sqrt(rate.DesignEffect * rate.Value * (1 - rate.Value) / rate.Of);

    /// <summary>
    /// Within 4.5 standard errors and 4 %: virtual lots have hystereses that are never negative and unsettled temperature that acts through
    /// each unit's own slope, both of which the half-spaces take for normal. The output is continuous here: with 12 bit and limits of a few
    /// steps the share of accepted units itself is off by a factor (0.7 % counted, 1.7 % estimated).
    /// </summary>
    private static void Same(double counted, double error, SampledProbability found) =>
        Assert.True(
            Math.Abs(counted - found.Value) <= (4.5 * Math.Sqrt((error * error) + (found.StandardError * found.StandardError))) + (0.04 * counted),
            $"{counted:G4} ± {error:G2} counted, {found.Value:G4} ± {found.StandardError:G2} estimated");
}
