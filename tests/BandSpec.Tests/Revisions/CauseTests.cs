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
    public void The_causes_together_name_every_changed_field_that_enters_the_result()
    {
        Comparison comparison = Comparison.Of(Drafted.First, Drafted.Variants[^1]);
        string[] named = [.. Cause.Of(comparison).SelectMany(c => c.Inputs).Select(c => $"{c.Subject} {c.Name}").Distinct().Order()];
        string[] changed = [.. comparison.Inputs.Select(c => $"{c.Subject} {c.Name}").Where(n => !n.StartsWith("Requirement specification.", StringComparison.Ordinal)).Order()];
        Assert.Equal(changed.Where(n => n != "Platform platform.name"), named);
    }

    [Fact]
    public void Parts_that_do_not_fit_the_older_inputs_one_by_one_are_swapped_together()
    {
        Cause[] joined = [.. Cause.Of(Comparison.Of(Drafted.First, Drafted.Variants[^1])).Where(c => c.Names.Count > 1)];
        Assert.Equal(
            ["temperature + temperature.profile + allowed-error", "chamber + reject-cost"],
            joined.Select(c => string.Join(" + ", c.Names.Select(n => n.Key))));
        Assert.All(joined, c => Assert.NotNull(c.Outcome));
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
