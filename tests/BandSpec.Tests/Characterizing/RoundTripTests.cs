using System.Collections.Concurrent;
using BandSpec.Core.Characterizing;
using BandSpec.Core.Requirements;
using Xunit;

namespace BandSpec.Tests.Characterizing;

/// <summary>
/// The truth lies inside the intervals as often as they say: families of 3 lots of 16 units, a tenth of the readings missing at random. Sixty of
/// them here; the benchmark <c>coverage</c> counts 400, figure by figure.
/// </summary>
public sealed class RoundTripTests(ITestOutputHelper output)
{
    private const int Repetitions = 60;

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

        // How far below its probability a count may fall by chance, once in a thousand for each kind: three and a tenth standard errors; figures
        // of one family are taken as one draw, which is cautious. Above, a share that is truly 95 % reaches 100 % in one of twenty runs of sixty,
        // so only pooled figures have an upper bound.
        double least = 95 - (310 * Math.Sqrt(0.05 * 0.95 / Repetitions));
        Assert.All(coverage, kind => Assert.True(kind.Value >= least, $"{kind.Key}: {kind.Value:F1} %"));

        // Means and spreads of lots rest on three lots: the intervals are wide and cautious where a lot spread is found to be zero.
        Assert.InRange(coverage["sigma"], least, 98.5);
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
