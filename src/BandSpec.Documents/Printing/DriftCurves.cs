using BandSpec.Core.Characterizing;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using BandSpec.Documents.Charts;

namespace BandSpec.Documents.Printing;

/// <summary>Drift over time at one pressure for every storage temperature: means of the units and what the estimated law says.</summary>
internal static class DriftCurves
{
    private const int Steps = 40;

    /// <summary>The curves, coldest storage first.</summary>
    /// <param name="found">The ageing statistics.</param>
    /// <param name="fraction">The applied pressure, one at which units were read.</param>
    public static IReadOnlyList<StorageDrift> Of(AgeingStatistics found, double fraction)
    {
        double longest = found.Drifts.Max(d => d.Stored.Hours);
        double drift = found.Zero.Mean.Value + (fraction * found.Span.Mean.Value);
        double At(Temperature storage, double hours) => drift * Math.Pow(
            AgeingLaw.Acceleration(found.ActivationEnergy.Value, found.Scope.TestTemperature, storage) * hours / found.Scope.TestDuration.Hours,
            found.TimeExponent.Value);
        return
        [
            .. from drifted in found.Drifts
               where drifted.PressureFraction == fraction
               group drifted by drifted.Storage into storage
               orderby storage.Key.Celsius
               select new StorageDrift(
                   storage.Key.ToString(),
                   [.. storage.GroupBy(d => d.Stored).OrderBy(g => g.Key.Hours).Select(g => new Spot(g.Key.Hours, g.Average(d => d.Drift)))],
                   [.. Enumerable.Range(0, Steps + 1).Select(i => i * i * longest / (Steps * Steps)).Select(hours => new Spot(hours, At(storage.Key, hours)))]),
        ];
    }
}
