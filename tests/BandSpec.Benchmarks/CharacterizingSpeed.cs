using System.Diagnostics;
using System.Globalization;
using System.Text;
using BandSpec.Core.Characterizing;
using BandSpec.Core.Numerics.Dense;
using BandSpec.Core.Numerics.NestedModels;
using BandSpec.Tests;
using BandSpec.Tests.Characterizing;

namespace BandSpec.Benchmarks;

/// <summary>
/// 200 units of 5 lots, 22,000 readings, 14 coefficients: the restricted likelihood here and in lme4 (Debian r-cran-lme4) on the same readings
/// in one run. Both have independent coefficients, a spread within lots and one between lots for each.
/// </summary>
internal static class CharacterizingSpeed
{
    public static int Run(int seconds)
    {
        IReadOnlyList<UnitReading> readings = new SimulatedFamily(Given.Platform, 20260101)
        {
            Visits = [25, -40, -20, 0, 45, 65, 85, 105, 125, 150], Pressures = [0, 0.2, 0.4, 0.6, 0.8, 1],
        }.Readings(5, 40);
        MeasuredFamily family = MeasuredFamily.Of(readings, Given.C(25));
        ReadingColumn[] columns =
            [.. Given.Platform.RawError.Select(c => ReadingColumn.Of(c.Name.Shape, c.Name.Degree)), ReadingColumn.PressureHysteresis];
        Console.WriteLine($"{family.Units.Count()} units, {family.Lots.Count} lots, {readings.Count} readings, {columns.Length} coefficients");

        NestedFit fit = Timed("first run, compiling included", () => Fit(family, columns));
        Timed("second run", () => Fit(family, columns));
        Timed("whole characterization, degrees and suspects chosen", () => Characterization.Of(readings, Families.OpenScope).Value!);
        Console.WriteLine($"deviance {fit.Deviance:F8} after {fit.Evaluations} evaluations, {fit.End}");
        return Compare(family, columns, fit, seconds);
    }

    private static NestedFit Fit(MeasuredFamily family, ReadingColumn[] columns)
    {
        NestedLikelihood likelihood = new(family.Sample(columns), restricted: true);
        bool[] all = [.. columns.Select(_ => true)];
        (double[] within, double[] between) = NestedEstimation.RoughSpreads(likelihood, all, all);
        return NestedEstimation.Fit(likelihood, new SharedCorrelationLaw(within, between, [], []));
    }

    private static T Timed<T>(string what, Func<T> work)
    {
        TimeSpan before = Process.GetCurrentProcess().TotalProcessorTime;
        Stopwatch watch = Stopwatch.StartNew();
        T result = work();
        double busy = (Process.GetCurrentProcess().TotalProcessorTime - before).TotalSeconds;
        Console.WriteLine($"{what}: {watch.Elapsed.TotalSeconds:F2} s by the clock, {busy:F2} s of processor time");
        return result;
    }

    private static int Compare(MeasuredFamily family, ReadingColumn[] columns, NestedFit fit, int seconds)
    {
        string folder = Directory.CreateTempSubdirectory("bandspec-").FullName;
        File.WriteAllText(Path.Combine(folder, "readings.csv"), Csv(family, columns));
        File.WriteAllText(Path.Combine(folder, "theta.csv"), Theta(fit));
        ProcessStartInfo start = new("Rscript") { RedirectStandardOutput = true, RedirectStandardError = true };
        foreach (string argument in new[] { Path.Combine(AppContext.BaseDirectory, "nested-model.R"), folder, seconds.ToString(CultureInfo.InvariantCulture) })
            start.ArgumentList.Add(argument);
        try
        {
            using Process process = Process.Start(start)!;
            Console.Write(process.StandardOutput.ReadToEnd());
            process.WaitForExit();
            return process.ExitCode;
        }
        catch (System.ComponentModel.Win32Exception)
        {
            Console.WriteLine("lme4 not compared: Rscript is not installed (Debian: r-cran-lme4)");
            return 0;
        }
        finally
        {
            Directory.Delete(folder, recursive: true);
        }
    }

    private static string Csv(MeasuredFamily family, ReadingColumn[] columns)
    {
        StringBuilder text = new("lot,unit");
        for (int j = 0; j < columns.Length; j++)
            text.Append(CultureInfo.InvariantCulture, $",z{j}");
        text.Append(",y\n");
        foreach (MeasuredUnit unit in family.Units)
        {
            Grid rows = unit.Rows(columns);
            for (int i = 0; i < rows.Rows; i++)
                text.Append(unit.Lot).Append(',').Append(unit.Name).Append(',')
                    .AppendJoin(',', rows.Row(i).ToArray().Select(value => value.ToString("R", CultureInfo.InvariantCulture))).Append('\n');
        }

        return text.ToString();
    }

    /// <summary>The spreads over the residual standard deviation, which lme4 calls theta.</summary>
    private static string Theta(NestedFit fit)
    {
        StringBuilder text = new("column,unit,lot\n");
        for (int j = 0; j < fit.Mean.Length; j++)
            text.Append(CultureInfo.InvariantCulture, $"z{j},{Math.Abs(fit.Factors.Within[j, j]):R},{Math.Abs(fit.Factors.Between[j, j]):R}\n");
        return text.ToString();
    }
}
