using System.Diagnostics;
using BandSpec.Core.Characterizing;
using BandSpec.Core.Numerics.NestedModels;
using BandSpec.Core.Requirements;
using BandSpec.Tests;
using BandSpec.Tests.Characterizing;

namespace BandSpec.Benchmarks;

/// <summary>
/// 200 units of 5 lots, 22,000 readings: the restricted likelihood here and in lme4 (Debian r-cran-lme4) on the same readings in one run. Both
/// have independent coefficients, a spread within lots and one between lots for each: once 14 of them, once 6, with which lme4 comes to an end.
/// </summary>
internal static class CharacterizingSpeed
{
    public static int Run(int seconds)
    {
        Compare(Families.Plain, seconds);
        IReadOnlyList<UnitReading> readings = Compare(Given.Platform, seconds);
        Timed("whole characterization, degrees and suspects chosen", () => Characterization.Of(readings, Families.OpenScope).Value!);
        return 0;
    }

    private static IReadOnlyList<UnitReading> Compare(Platform truth, int seconds)
    {
        IReadOnlyList<UnitReading> readings = new SimulatedFamily(truth, 20260101)
        {
            Visits = [25, -40, -20, 0, 45, 65, 85, 105, 125, 150], Pressures = [0, 0.2, 0.4, 0.6, 0.8, 1],
        }.Readings(5, 40);
        MeasuredFamily family = MeasuredFamily.Of(readings, Given.C(25));
        ReadingColumn[] columns =
            [.. truth.RawError.Select(c => ReadingColumn.Of(c.Name.Shape, c.Name.Degree)), ReadingColumn.PressureHysteresis];
        Console.WriteLine($"{family.Units.Count()} units, {family.Lots.Count} lots, {readings.Count} readings, {columns.Length} coefficients");

        (_, double first) = Timed("first run, what was not compiled yet included", () => Fit(family, columns));
        (NestedFit fit, double second) = Timed("second run", () => Fit(family, columns));
        Console.WriteLine($"deviance {fit.Deviance:F8} after {fit.Evaluations} evaluations, {fit.End}");
        if (NestedModelInR.Search(family, columns, fit, seconds) is not { } theirs)
        {
            Console.WriteLine("lme4 not compared: Rscript is not installed (Debian: r-cran-lme4)");
            return readings;
        }

        Console.WriteLine($"lme4 {theirs.Version}: deviance {theirs.AtOurs:F8} at our estimates, {theirs.AtOurs - fit.Deviance:E1} above ours");
        string ratio = $"{theirs.Seconds / first:F0} times our first run, {theirs.Seconds / second:F0} times our second";
        Console.WriteLine(theirs.Deviance is { } deviance
            ? $"its own search: {theirs.Seconds:F1} s of processor time, {ratio}; {theirs.Evaluations} evaluations, deviance {deviance:F8}, {deviance - fit.Deviance:E1} above ours"
            : $"its own search was stopped after {theirs.Seconds:F0} s of processor time without an answer, {ratio}");
        return readings;
    }

    private static NestedFit Fit(MeasuredFamily family, ReadingColumn[] columns)
    {
        NestedLikelihood likelihood = new(family.Sample(columns), restricted: true);
        bool[] all = [.. columns.Select(_ => true)];
        (double[] within, double[] between) = NestedEstimation.RoughSpreads(likelihood, all, all);
        return NestedEstimation.Fit(likelihood, new SharedCorrelationLaw(within, between, [], []));
    }

    private static (T Result, double Seconds) Timed<T>(string what, Func<T> work)
    {
        TimeSpan before = Process.GetCurrentProcess().TotalProcessorTime;
        Stopwatch watch = Stopwatch.StartNew();
        T result = work();
        double busy = (Process.GetCurrentProcess().TotalProcessorTime - before).TotalSeconds;
        Console.WriteLine($"{what}: {watch.Elapsed.TotalSeconds:F2} s by the clock, {busy:F2} s of processor time");
        return (result, busy);
    }
}
