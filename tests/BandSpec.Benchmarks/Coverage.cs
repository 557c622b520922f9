using System.Collections.Concurrent;
using BandSpec.Core.Characterizing;
using BandSpec.Core.Requirements;
using BandSpec.Tests.Characterizing;

namespace BandSpec.Benchmarks;

/// <summary>How often the 95 % intervals of a characterization hold the truth, figure by figure.</summary>
internal static class Coverage
{
    public static void Run(int repetitions)
    {
        ConcurrentDictionary<string, (int Hits, int All)> counts = [];
        int strangers = 0, slips = 0;
        Parallel.For(0, repetitions, repetition =>
        {
            Characterization found = Characterization.Of(
                new SimulatedFamily(Families.Plain, 90_000 + repetition) { Gaps = 0.1 }.Readings(3, 16), Families.PlainScope).Value!;
            Interlocked.Add(ref strangers, found.SuspectUnits.Count);
            Interlocked.Add(ref slips, found.SuspectReadings.Count);
            foreach ((string figure, bool hit) in Figures(found, Families.Plain))
                counts.AddOrUpdate(figure, (hit ? 1 : 0, 1), (_, count) => (count.Hits + (hit ? 1 : 0), count.All + 1));
        });
        foreach ((string figure, (int hits, int all)) in counts.OrderBy(count => count.Key))
            Console.WriteLine($"{figure,-28}{100.0 * hits / all,6:F1} %");
        Console.WriteLine($"{repetitions} families of 48 units without a fault: {strangers} units and {slips} readings were suspected");
    }

    private static IEnumerable<(string Figure, bool Hit)> Figures(Characterization found, Platform truth)
    {
        foreach (CoefficientEstimate estimate in found.Coefficients)
        {
            RawErrorCoefficient real = truth.RawError.Single(c => c.Name == estimate.Name);
            yield return ($"{estimate.Name} mean", estimate.Units.Mean.Covers(real.Mean));
            yield return ($"{estimate.Name} sigma", estimate.Units.Sigma.Covers(real.Sigma));
            yield return ($"{estimate.Name} lot-sigma", estimate.LotSigma.Covers(real.LotSigma));
        }

        yield return ("pressure-hysteresis mean", found.PressureHysteresis!.Mean.Covers(truth.PressureHysteresis.Mean.Percent));
        yield return ("pressure-hysteresis sigma", found.PressureHysteresis.Sigma.Covers(truth.PressureHysteresis.Sigma.Percent));
        yield return ("thermal-hysteresis mean", found.ThermalHysteresis!.Mean.Covers(truth.ThermalHysteresis.Mean.Percent));
        yield return ("thermal-hysteresis sigma", found.ThermalHysteresis.Sigma.Covers(truth.ThermalHysteresis.Sigma.Percent));
        yield return ("repeatability", found.Repeatability.Covers(truth.Repeatability.Percent));
        yield return ("correlation", found.Correlations.Single().Value.Covers(truth.Correlations[0].Value));
    }
}
