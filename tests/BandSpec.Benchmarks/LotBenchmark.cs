using System.Diagnostics;
using BandSpec.Core.Specifying;
using BandSpec.Core.VirtualLots;

namespace BandSpec.Benchmarks;

/// <summary>Units per second of virtual lots, by wall clock and by processor time.</summary>
internal static class LotBenchmark
{
    public static void Run(Specification specification)
    {
        LotSubject subject = LotSubject.Of(specification);
        LotRun.Make(subject, LotOrder.For(20_000, 400, 1), 2);
        foreach (int threads in new[] { 1, 2 })
        {
            TimeSpan before = Process.GetCurrentProcess().TotalProcessorTime;
            Stopwatch watch = Stopwatch.StartNew();
            LotResult result = LotRun.Make(subject, LotOrder.For(1_000_000, 400, 1), threads);
            double wall = watch.Elapsed.TotalSeconds;
            double cpu = (Process.GetCurrentProcess().TotalProcessorTime - before).TotalSeconds;
            Console.WriteLine($"{threads} threads: {result.UnitsMade / wall:F0} units/s by the clock, {result.UnitsMade / cpu:F0} units/s of one processor's time");
        }
    }
}
