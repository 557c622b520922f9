using System.Diagnostics;
using BandSpec.Core.Specifying;
using BandSpec.Core.VirtualLots;

namespace BandSpec.Benchmarks;

/// <summary>Time to estimate a probability of leaving to 1 %, of any unit and of an accepted one.</summary>
internal static class RareBenchmark
{
    public static void Run(Specification specification)
    {
        LeavingProbability.Of(specification, 1, 0.01, 20_000_000);
        for (ulong seed = 2; seed < 5; seed++)
        {
            Process process = Process.GetCurrentProcess();
            TimeSpan before = process.TotalProcessorTime;
            Stopwatch watch = Stopwatch.StartNew();
            LeavingProbability found = LeavingProbability.Of(specification, seed, 0.01, 20_000_000);
            double wall = watch.Elapsed.TotalSeconds;
            process.Refresh();
            Console.WriteLine(
                $"{found.AnyUnit.Value:E3} ±{100 * found.AnyUnit.RelativeError:F2} % from {found.AnyUnit.Draws} draws, accepted {found.AcceptedUnit.Value:E3} "
                + $"±{100 * found.AcceptedUnit.RelativeError:F2} %: {wall:F2} s by the clock, {(process.TotalProcessorTime - before).TotalSeconds:F2} s of processor time");
        }
    }
}
