using System.Text;
using BandSpec.Cli.Storing;
using BandSpec.Core.LotJudging;
using BandSpec.Files.Csv;
using BandSpec.Files.Json;
using BandSpec.Files.LotReadings;

namespace BandSpec.Cli.Judging;

/// <summary>The files of a judgement on the disk. Each is written beside its place and then moved there, so that none is ever half written.</summary>
internal static class JudgementFolder
{
    /// <summary>Writes all files and gives their names.</summary>
    /// <exception cref="RefusalException">The folder cannot be written.</exception>
    public static IReadOnlyList<string> Write(string folder, LotJudgement judged, IReadOnlyList<ReadingReport> reports)
    {
        try
        {
            Directory.CreateDirectory(folder);
            Replace(folder, "judgement.json", stream => stream.Write(JudgementJson.Write(judged, reports).Span));
            Replace(folder, "units.csv", stream =>
            {
                using StreamWriter writer = new(stream, new UTF8Encoding(false), 1 << 16, leaveOpen: true);
                UnitsCsv.Write(judged.Units, writer);
            });
            return ["judgement.json", "units.csv"];
        }
        catch (Exception refused) when (WritingFault.Is(refused))
        {
            throw WritingFault.Refuse(folder, refused);
        }
    }

    private static void Replace(string folder, string name, Action<Stream> write)
    {
        string path = Path.Combine(folder, name), unfinished = $"{path}.unfinished";
        try
        {
            using (FileStream stream = File.Create(unfinished))
                write(stream);
            File.Move(unfinished, path, overwrite: true);
        }
        catch (IOException)
        {
            WholeFile.TryDelete(unfinished);
            throw;
        }
    }
}
