using BandSpec.Core.Bands;
using BandSpec.Core.Planning;
using BandSpec.Core.Requirements;
using BandSpec.Core.Specifying;
using Xunit;

namespace BandSpec.Tests.Planning;

/// <summary>The diagnosis of a requirement that no plan meets: each change holds, and one step less does not.</summary>
public sealed class DiagnosisTests
{
    private static readonly Requirement Tight = Given.Requirement with
    {
        SafetyFactor = 2.2,
        Compensation = Given.Requirement.Compensation with { CandidateStep = Given.K(10), MostTemperatures = 4 },
    };

    private static readonly Lazy<Specification> Drafted = new(() => SpecificationDraft.Draft(Given.Application(Tight), extras: DraftExtras.DiagnosisOfNo));

    [Fact]
    public void It_is_there_when_no_plan_fits_and_names_what_binds()
    {
        Assert.False(Drafted.Value.Feasible);
        Diagnosis diagnosis = Drafted.Value.Diagnosis!;
        Assert.Equal(Drafted.Value.Bands.Margin, diagnosis.Binding.Margin);
        Assert.Equal("ageing", diagnosis.FloorTerms[0].Term.Key);
        Assert.All(diagnosis.BindingTerms.Zip(diagnosis.BindingTerms.Skip(1)), p => Assert.True(p.First.Part >= p.Second.Part));
    }

    [Fact]
    public void A_change_that_suffices_is_feasible_and_one_step_less_is_not()
    {
        PossibleChange[] possible = [.. new PossibleChanges(Given.Application(Tight)).All(Drafted.Value.Bands.Worst.Temperature)];
        Assert.Equal(possible.Length, Drafted.Value.Diagnosis!.Changes.Count);
        Assert.Contains(Drafted.Value.Diagnosis.Changes, c => c.Suffices);
        Assert.Contains(Drafted.Value.Diagnosis.Changes, c => !c.Suffices);
        foreach ((PossibleChange change, SingleChange found) in possible.Zip(Drafted.Value.Diagnosis.Changes))
        {
            double last = found.After ?? found.Furthest;
            int steps = (int)Math.Round(Math.Abs(last - found.Before) / found.Step);
            Assert.Equal(found.Suffices, MarginAfter(change, steps) >= 1 - PlanChoosing.Shortfall);
            if (found.Suffices)
                Assert.True(MarginAfter(change, steps - 1) < 1);
        }
    }

    [Fact]
    public void Parts_and_floor_of_a_band_add_up_without_correlations()
    {
        Application application = Given.Application(platform: Given.Platform with { Correlations = [], RawError = [Given.Platform.RawError[0]], });
        BandNode worst = BandFloor.Of(application).Worst;
        double drift = worst.Terms.First(t => t.Term.Key == "ageing").Added.Percent;
        double parts = TermPart.AllOf(worst, application.Requirement.Capability).Sum(p => p.Part);
        Assert.Equal(worst.Maximum.Percent, parts, 1e-9);
        Assert.True(drift > 0);
    }

    private static double MarginAfter(PossibleChange change, int steps) =>
        PlanChoosing.Choose(new PlanSearch(change.After(steps)!), PlanObjective.MostMargin).ContinuousMargin;
}
