using BandSpec.Cli.Opening;
using BandSpec.Core.Findings;
using BandSpec.Core.LotJudging;
using BandSpec.Files.Inputs;
using BandSpec.Files.LotReadings;
using BandSpec.Files.Yaml;
using BandSpec.Parquet;

namespace BandSpec.Cli.Judging;

/// <summary>What came of judging readings.</summary>
/// <param name="Findings">Why limits or readings could not be read; empty otherwise.</param>
/// <param name="Reports">What was read from each file.</param>
/// <param name="Judged">The judgement; null when there are findings.</param>
internal sealed record Judgement(IReadOnlyList<PlacedFinding> Findings, IReadOnlyList<ReadingReport> Reports, LotJudgement? Judged);

/// <summary>From a limits file and files of readings to a judgement.</summary>
internal static class JudgeRun
{
    /// <summary>Reads and judges; a file that cannot be had is a finding like any other.</summary>
    public static Judgement Run(string limitsFile, IReadOnlyList<string> readingFiles, Terminal terminal)
    {
        (LotLimits? limits, IReadOnlyList<PlacedFinding> findings) = ReadLimits(limitsFile, terminal);
        if (limits is null)
            return new(findings, [], null);
        var collector = new LotCollector(limits);
        ReadingReport[] reports = [.. readingFiles.Select(file => Read(file, collector, terminal))];
        PlacedFinding[] all = [.. reports.SelectMany(report => report.Findings)];
        return new(all, reports, all.Length == 0 ? LotJudgement.Of(collector) : null);
    }

    /// <summary>Reads a limits file.</summary>
    public static (LotLimits? Limits, IReadOnlyList<PlacedFinding> Findings) ReadLimits(string file, Terminal terminal)
    {
        try
        {
            return LimitsFile.Read(file, BoundedFile.Read(Path.GetFullPath(file, terminal.Folder)));
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            return (null, [Refused(file, fault)]);
        }
    }

    private static ReadingReport Read(string file, LotCollector collector, Terminal terminal)
    {
        string path = Path.GetFullPath(file, terminal.Folder);
        if (Directory.Exists(path))
            return new(file, null, 0, 0, [Refused(file, new IOException("it is a folder"))]);
        try
        {
            using FileStream stream = new(path, FileMode.Open, FileAccess.Read, FileShare.Read, 1 << 16, FileOptions.SequentialScan);
            return IsParquet(stream) ? ParquetReadings.Read(path, file, collector) : CsvReadings.Read(stream, file, collector);
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            return new(file, null, 0, 0, [Refused(file, fault)]);
        }
    }

    /// <summary>Told by its first bytes, not by its name.</summary>
    private static bool IsParquet(FileStream stream)
    {
        Span<byte> beginning = stackalloc byte[ParquetReadings.Magic.Length];
        int read = stream.ReadAtLeast(beginning, beginning.Length, throwOnEndOfStream: false);
        stream.Position = 0;
        return beginning[..read].SequenceEqual(ParquetReadings.Magic);
    }

    private static PlacedFinding Refused(string file, Exception fault) => new(
        new Finding(FieldPath.InReadings(""), "file", fault is FileNotFoundException or DirectoryNotFoundException ? "there is no such file" : fault.Message, "a file that can be read"),
        new Place(file, 1, 1, 1, ""));
}
