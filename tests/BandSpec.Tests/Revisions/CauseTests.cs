using BandSpec.Core.Requirements;
using BandSpec.Core.Revisions;
using Xunit;

namespace BandSpec.Tests.Revisions;

public sealed class CauseTests
{
    [Fact]
    public void The_cause_that_moved_most_comes_first_and_alone_does_what_it_is_said_to_do()
    {
        Requirement requirement = Drafted.Requirement with
        {
            SafetyFactor = 1.16, Rounding = Drafted.Requirement.Rounding with { Band = Given.P(0.02) },
            AllowedError = [.. Drafted.Requirement.AllowedError.Select(r => r with { Limit = Given.P(r.Limit.Percent * 1.5) })],
        };
        Comparison comparison = Comparison.Of(Drafted.First, Drafted.Of(requirement));
        IReadOnlyList<Cause> causes = Cause.Of(comparison);
        Assert.Equal(["allowed-error", "rounding", "safety-factor"], causes.Select(c => Assert.Single(c.Names).Key).Order(StringComparer.Ordinal));
        Assert.Equal("allowed-error", causes[0].Names[0].Key);
        Comparison alone = Comparison.Of(Drafted.First, Drafted.Of(Drafted.Requirement with { AllowedError = requirement.AllowedError }));
        Assert.Equal(alone.Outcome, causes[0].Outcome);
        Assert.Equal(alone.Inputs, causes[0].Inputs);
    }

    [Fact]
    public void A_change_that_moves_no_limit_is_listed_with_no_movement()
    {
        Station station = Given.Station with { RejectCost = new Money(100, "EUR") };
        Cause cause = Assert.Single(Cause.Of(Comparison.Of(Drafted.First, Drafted.Of(Drafted.Requirement, station: station))));
        Assert.Equal((FigureSubject.Station, "reject-cost"), cause.Names[0]);
        Assert.Null(cause.Largest);
        Assert.Equal(0, cause.Movement);
    }
}
