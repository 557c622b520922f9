using System.Diagnostics;
using System.Text.Json;
using BandSpec.Core.Specifying;
using BandSpec.Core.VirtualLots;

namespace BandSpec.Benchmarks;

/// <summary>
/// Virtual lots against the NumPy twin beside this file, turn about in one run on the same processors, by the clock and by processor time:
/// on a machine that others use too only the latter means much. NumPy is given both ways it can use two processors, BLAS threads in one
/// process and two processes, and the better one counts.
/// </summary>
internal static class LotBenchmark
{
    private const int Rounds = 3;
    private const int Units = 400_000;

    public static void Run(Specification specification, string root)
    {
        LotSubject subject = LotSubject.Of(specification);
        string export = LotExport.Of(specification);
        string script = Path.Combine(root, "tests", "BandSpec.Benchmarks", "lots_numpy.py");
        LotRun.Make(subject, LotOrder.For(40_000, 400, 1), 2);
        double best = 0;
        double bestNumpy = 0;
        for (int round = 0; round < Rounds; round++)
        {
            Speed own = Own(subject);
            Speed threads = Numpy(script, export, 1, 2);
            Speed processes = Numpy(script, export, 2, 1);
            Console.WriteLine($"round {round + 1}: BandSpec {own}; NumPy, one process {threads}; NumPy, two processes {processes}");
            best = Math.Max(best, own.ByProcessor);
            bestNumpy = Math.Max(bestNumpy, Math.Max(threads.ByProcessor, processes.ByProcessor));
        }
        Console.WriteLine($"best of {Rounds}, per second of processor time: {best:F0} against {bestNumpy:F0} units, {best / bestNumpy:F1} times");
        double peak = Peak(script, export);
        double products = 2.0 * specification.Application.Platform.RawError.Count * specification.Bands.Nodes.Count;
        Console.WriteLine(
            $"matrix product peak of one processor (NumPy with OpenBLAS) {peak / 1e9:F1} Gflop/s; the map as a plain matrix product has {products:F0} flop a unit,"
            + $" {100 * best * products / peak:F1} % of the peak while drawing, quantising and judging too");
        Console.WriteLine($"memory of this process at its peak {Process.GetCurrentProcess().PeakWorkingSet64 >> 20} MB");
    }

    private static Speed Own(LotSubject subject)
    {
        Process process = Process.GetCurrentProcess();
        TimeSpan before = process.TotalProcessorTime;
        Stopwatch watch = Stopwatch.StartNew();
        LotResult result = LotRun.Make(subject, LotOrder.For(4 * Units, 400, 1), 2);
        double wall = watch.Elapsed.TotalSeconds;
        process.Refresh();
        return new Speed(result.UnitsMade / wall, result.UnitsMade / (process.TotalProcessorTime - before).TotalSeconds);
    }

    private static Speed Numpy(string script, string export, int processes, int threads)
    {
        Process[] started = [.. Enumerable.Range(1, processes).Select(seed => Start(script, export, threads, $"{Units / processes} {seed}"))];
        JsonElement[] found = [.. started.Select(p => JsonDocument.Parse(p.StandardOutput.ReadLine()!).RootElement)];
        foreach (Process process in started)
            process.WaitForExit();
        double units = found.Sum(f => f.GetProperty("units").GetDouble());
        return new Speed(units / found.Max(f => f.GetProperty("wall").GetDouble()), units / found.Sum(f => f.GetProperty("cpu").GetDouble()));
    }

    private static double Peak(string script, string export)
    {
        using Process process = Start(script, export, 1, "4000 1 peak");
        process.StandardOutput.ReadLine();
        return JsonDocument.Parse(process.StandardOutput.ReadLine()!).RootElement.GetProperty("peak").GetDouble();
    }

    private static Process Start(string script, string export, int threads, string arguments)
    {
        ProcessStartInfo start = new("/usr/bin/python3", $"{script} {arguments}") { RedirectStandardInput = true, RedirectStandardOutput = true };
        start.Environment.Remove("OPENBLAS_CORETYPE");
        start.Environment.Remove("OPENBLAS_L2_SIZE");
        start.Environment["OPENBLAS_NUM_THREADS"] = threads.ToString(System.Globalization.CultureInfo.InvariantCulture);
        Process process = Process.Start(start)!;
        process.StandardInput.Write(export);
        process.StandardInput.Close();
        return process;
    }

    private readonly record struct Speed(double ByClock, double ByProcessor)
    {
        public override string ToString() => $"{ByClock:F0} units/s by the clock, {ByProcessor:F0} per second of processor time";
    }
}
