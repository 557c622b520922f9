using System.Collections.Concurrent;
using BandSpec.Core.Characterizing;
using BandSpec.Core.Requirements;
using Xunit;

namespace BandSpec.Tests.Characterizing;

/// <summary>
/// The truth lies inside the intervals as often as they say: 400 families of 3 lots of 16 units, a tenth of the readings missing at random.
/// </summary>
public sealed class RoundTripTests(ITestOutputHelper output)
{
    private const int Repetitions = 400;

    [Fact]
    public void Intervals_of_95_percent_hold_the_truth()
    {
        ConcurrentDictionary<string, int> hits = [], all = [];
        void Count(string kind, bool hit)
        {
            all.AddOrUpdate(kind, 1, (_, n) => n + 1);
            if (hit)
                hits.AddOrUpdate(kind, 1, (_, n) => n + 1);
        }

        Parallel.For(0, Repetitions, repetition => Repeat(5000 + repetition, Count));
        Dictionary<string, double> coverage = all.Keys.Order().ToDictionary(kind => kind, kind => 100.0 * hits[kind] / all[kind]);
        foreach ((string kind, double percent) in coverage)
            output.WriteLine($"{kind}: {percent:F1} % of {all[kind]}");

        // Spreads within lots, hysteresis, repeatability: 95 % nominal; 400 repetitions scatter by 1.1 %, pooled figures by less.
        foreach (string kind in new[] { "sigma", "hysteresis mean", "hysteresis sigma", "repeatability", "correlation" })
            Assert.InRange(coverage[kind], 92.5, 98);

        // Means and spreads of lots rest on three lots: the intervals are wide and cautious where a lot spread is found to be zero.
        Assert.InRange(coverage["mean"], 95, 100);
        Assert.InRange(coverage["lot-sigma"], 95, 100);
    }

    private static void Repeat(int seed, Action<string, bool> count)
    {
        Platform truth = Families.Plain;
        Characterization found = Characterization.Of(
            new SimulatedFamily(truth, seed) { Gaps = 0.1 }.Readings(3, 16), Families.PlainScope).Value!;
        foreach (CoefficientEstimate estimate in found.Coefficients)
        {
            RawErrorCoefficient real = truth.RawError.Single(c => c.Name == estimate.Name);
            count("mean", estimate.Units.Mean.Covers(real.Mean));
            count("sigma", estimate.Units.Sigma.Covers(real.Sigma));
            count("lot-sigma", estimate.LotSigma.Covers(real.LotSigma));
        }

        foreach ((SpreadEstimate? estimate, Spread real) in new[]
        {
            (found.PressureHysteresis, truth.PressureHysteresis), (found.ThermalHysteresis, truth.ThermalHysteresis),
        })
        {
            count("hysteresis mean", estimate!.Mean.Covers(real.Mean.Percent));
            count("hysteresis sigma", estimate.Sigma.Covers(real.Sigma.Percent));
        }

        count("repeatability", found.Repeatability.Covers(truth.Repeatability.Percent));
        count("correlation", found.Correlations.Single().Value.Covers(truth.Correlations[0].Value));
    }
}
