using BandSpec.Core.Findings;
using BandSpec.Core.Requirements;
using BandSpec.Core.Revisions;
using BandSpec.Core.Specifying;
using Xunit;

namespace BandSpec.Tests.Revisions;

public sealed class ReleaseRulesTests
{
    private static readonly Requirement Fitting = Drafted.Requirement with { AllowedError = [new(Given.C(-20), Given.C(150), Given.P(5), null, 0)] };

    private static readonly InputDigest[] Inputs =
        [new(InputFile.Requirement, "brine.yaml", "1"), new(InputFile.Platform, "p.yaml", "2"), new(InputFile.Station, "s.yaml", "3")];

    [Fact]
    public void A_new_revision_that_fits_may_be_released() => Assert.Empty(ReleaseRules.FindingsIn(Drafted.Of(Fitting), []));

    [Fact]
    public void One_that_does_not_fit_may_not()
    {
        Requirement narrow = Drafted.Requirement with { AllowedError = [new(Given.C(-20), Given.C(150), Given.P(0.3), null, 0)] };
        Specification specification = Drafted.Of(narrow);
        Assert.False(specification.Feasible);
        Assert.Equal("release-feasible", Assert.Single(ReleaseRules.FindingsIn(specification, [])).Rule);
    }

    [Fact]
    public void A_revision_is_released_once()
    {
        Finding finding = Assert.Single(ReleaseRules.FindingsIn(Drafted.Of(Fitting), [Released("A")]));
        Assert.Equal("HV-3107 revision A was released by Ylva Strøm on 2026-11-24", finding.Found);
        Assert.Empty(ReleaseRules.FindingsIn(Drafted.Of(Fitting), [Released("B")]));
    }

    [Fact]
    public void A_draft_of_a_released_revision_has_to_have_the_released_inputs()
    {
        Assert.Empty(ReleaseRules.ChangesSince(Fitting.Identity, Inputs, [Released("A")]));
        Assert.Empty(ReleaseRules.ChangesSince(Fitting.Identity, [Inputs[0], Inputs[1] with { Name = "moved/p.yaml" }, Inputs[2]], [Released("A")]));
        InputDigest[] other = [Inputs[0], Inputs[1] with { Digest = "9" }, Inputs[2] with { Digest = "9" }];
        Assert.Equal(
            [
                "HV-3107 revision A was released by Ylva Strøm on 2026-11-24; since then the platform has changed, p.yaml",
                "HV-3107 revision A was released by Ylva Strøm on 2026-11-24; since then the station has changed, s.yaml",
            ],
            ReleaseRules.ChangesSince(Fitting.Identity, other, [Released("A")]).Select(f => f.Found));
        Assert.Empty(ReleaseRules.ChangesSince(Fitting.Identity with { Revision = "B" }, other, [Released("A")]));
    }

    [Theory]
    [InlineData("Ylva Strøm", true)]
    [InlineData("", false)]
    [InlineData(" Ylva", false)]
    [InlineData("Ylva\nStrøm", false)]
    public void A_name_is_one_line_of_words(string name, bool isName) => Assert.Equal(isName, ReleaseRules.IsName(name));

    private static Release Released(string revision) => new()
    {
        Number = "HV-3107",
        Revision = revision,
        By = "Ylva Strøm",
        At = new DateTimeOffset(2026, 11, 24, 9, 30, 0, TimeSpan.Zero),
        Program = "bandspec 0.1.0",
        Inputs = Inputs,
        LimitsDigest = "4",
    };
}
