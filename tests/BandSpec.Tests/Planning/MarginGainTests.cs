using BandSpec.Core.Planning;
using BandSpec.Core.Requirements;
using Xunit;

namespace BandSpec.Tests.Planning;

/// <summary>Gains of a plan against finite differences of the whole solver.</summary>
public sealed class MarginGainTests
{
    [Fact]
    public void A_gain_is_the_finite_difference_of_the_whole_solver()
    {
        Application application = Given.Application(Given.Requirement with
        {
            SafetyFactor = 2,
            Compensation = Given.Requirement.Compensation with { CandidateStep = Given.K(10), MostTemperatures = 4, Objective = PlanObjective.MostMargin },
        });
        PlanChoice choice = PlanChoosing.Choose(application, null, default);
        Dictionary<string, MovableInput> inputs = new MovableInputs(application).All().ToDictionary(i => i.Key);
        IReadOnlyList<MarginGain> gains = MarginGain.AllOf(application, choice.Plan);
        foreach (string key in new[] { "allowed-error[1]", "safety-factor", "thermal-hysteresis.mean", "reading-noise", "soak-gradient", "raw-error.zero.4.sigma", "ageing.zero.mean" })
        {
            double move = 0.01 * inputs[key].Step;
            double difference = (BestMargin(inputs[key].Moved(move)!) - BestMargin(inputs[key].Moved(-move)!)) / (2 * move) * inputs[key].Step;
            MarginGain gain = gains.Single(g => g.Key == key);
            Assert.Equal(difference, gain.Gain, 2e-6 + (2e-3 * Math.Abs(difference)));
        }
    }

    [Fact]
    public void More_dwell_where_it_is_hot_costs_more_margin_than_where_it_is_cold()
    {
        Application application = Given.Application();
        IReadOnlyList<MarginGain> gains = MarginGain.AllOf(application, PlanChoosing.Choose(application, null, default).Plan);
        double Gain(int bin) => gains.Single(g => g.Key == $"temperature.profile[{bin}].dwell").Gain;
        Assert.True(Gain(3) < Gain(0) && Gain(0) < 0);
        Assert.Equal("%", gains.Single(g => g.Key == "temperature.profile[3].dwell").Unit);
    }

    private static double BestMargin(Application application) => PlanChoosing.Choose(application, null, default).ContinuousMargin;
}
