using System.Diagnostics;
using System.Globalization;
using System.Text;
using BandSpec.Core.LotJudging;
using BandSpec.Core.Specifying;
using BandSpec.Files.Json;
using BandSpec.Files.LotReadings;

namespace BandSpec.Benchmarks;

/// <summary>A lot of ten million readings read and judged: megabytes a second by the clock and by processor time, and the memory it took.</summary>
internal static class JudgingBenchmark
{
    private const int Readings = 10_000_000;

    public static void Run(Specification specification)
    {
        LotLimits limits = LimitsFile.Read("limits.json", LimitsJson.Write(specification)).Limits!;
        string path = Path.Combine(Path.GetTempPath(), "bandspec-ten-million.csv");
        WriteLot(path, limits);
        double megabytes = new FileInfo(path).Length / 1e6;
        Console.WriteLine(string.Create(CultureInfo.InvariantCulture, $"{Readings:N0} readings, {megabytes:F0} MB"));
        for (int run = 0; run < 4; run++)
        {
            LotCollector collector = new(limits);
            (double clock, double processor) = Timed(() =>
            {
                using FileStream stream = new(path, FileMode.Open, FileAccess.Read, FileShare.Read, 1 << 16, FileOptions.SequentialScan);
                CsvReadings.Read(stream, path, collector);
            });
            (double judged, _) = Timed(() => LotJudgement.Of(collector));
            Console.WriteLine(string.Create(CultureInfo.InvariantCulture,
                $"read {clock:F2} s by the clock, {processor:F2} s of processor time: {megabytes / clock:F0} MB/s, {megabytes / processor:F0} MB per processor second; judged in {judged:F2} s; peak {Process.GetCurrentProcess().PeakWorkingSet64 / 1_000_000} MB"));
        }

        File.Delete(path);
    }

    private static (double Clock, double Processor) Timed(Action action)
    {
        TimeSpan before = Process.GetCurrentProcess().TotalProcessorTime;
        Stopwatch watch = Stopwatch.StartNew();
        action();
        return (watch.Elapsed.TotalSeconds, (Process.GetCurrentProcess().TotalProcessorTime - before).TotalSeconds);
    }

    private static void WriteLot(string path, LotLimits limits)
    {
        Random random = new(1);
        using StreamWriter file = new(path, false, new UTF8Encoding(false), 1 << 16);
        file.Write("serial;lot;point;reading\n");
        int units = Readings / limits.Points.Count;
        for (int unit = 0; unit <= units; unit++)
            foreach (LotPoint point in limits.Points)
            {
                double error = 0.3 * point.Tolerance.Percent * (random.NextDouble() + random.NextDouble() + random.NextDouble() - 1.5);
                file.Write(string.Create(CultureInfo.InvariantCulture, $"S{unit:000000};L{unit / 5000};{point.Id};{point.Nominal + (error * limits.OutputSpan / 100):0.00000}\n"));
            }
    }
}
