using BandSpec.Core.Bands;
using BandSpec.Core.Planning;
using BandSpec.Core.Requirements;
using Xunit;

namespace BandSpec.Tests.Planning;

/// <summary>The fronts against every candidate plan judged by itself.</summary>
public sealed class TradeoffTests
{
    private static readonly Application Application = Given.Application(Given.Requirement with
    {
        SafetyFactor = 1.8,
        Compensation = Given.Requirement.Compensation with { CandidateStep = Given.K(25), MostTemperatures = 4 },
    });

    [Fact]
    public void The_fronts_are_complete_and_hold_no_beaten_plan()
    {
        Tradeoff tradeoff = Tradeoff.Of(Application);
        List<(double Cost, double Margin, double Rms)> all = [.. NaiveEnumeration.AllOf(Application).Select(p => (
            ChamberRun.Of(p.Plan, Application.Station.Chamber).CostPerUnit, ContinuousMargin.AllOf(Application, p.Plan).Min(r => r.Margin), p.Rms))];
        Assert.True(tradeoff.Proven);
        Assert.Equal(all.Count, tradeoff.PlansConsidered);
        Assert.Equal(Front(all.Select(p => (p.Cost, -p.Margin))), tradeoff.ByMargin.Select(p => (p.CostPerUnit, -p.Margin)), Near);
        Assert.Equal(Front(all.Where(p => p.Margin >= 1).Select(p => (p.Cost, p.Rms))), tradeoff.ByRmsError.Select(p => (p.CostPerUnit, p.RmsError)), Near);
    }

    [Fact]
    public void A_search_ended_early_is_not_proven() =>
        Assert.False(Tradeoff.Of(Application, cancellation: new CancellationToken(canceled: true)).Proven);

    private static List<(double Cost, double Figure)> Front(IEnumerable<(double Cost, double Figure)> plans)
    {
        List<(double, double)> front = [];
        double best = double.PositiveInfinity;
        foreach (IGrouping<double, (double Cost, double Figure)> level in plans.GroupBy(p => Math.Round(p.Cost, 9)).OrderBy(g => g.Key))
        {
            double least = level.Min(p => p.Figure);
            if (least >= best - (1e-8 * Math.Abs(best)) && !double.IsInfinity(best))
                continue;
            front.Add((level.Key, least));
            best = least;
        }

        return front;
    }

    private static bool Near((double Cost, double Figure) a, (double Cost, double Figure) b) =>
        Math.Abs(a.Cost - b.Cost) < 1e-6 && Math.Abs(a.Figure - b.Figure) < 1e-7;
}
