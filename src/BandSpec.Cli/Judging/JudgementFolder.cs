using System.Text;
using BandSpec.Cli.Storing;
using BandSpec.Core.LotJudging;
using BandSpec.Documents;
using BandSpec.Files.Csv;
using BandSpec.Files.Json;
using BandSpec.Files.LotReadings;

namespace BandSpec.Cli.Judging;

/// <summary>
/// The files of a judgement on the disk. Each is written beside its place and then moved there, so that none is ever half written. Charts of an earlier
/// judgement in the same folder that this one does not have are removed, see <see cref="EarlierCharts"/>; whatever else lies there stays.
/// </summary>
internal static class JudgementFolder
{
    private const string Text = "judgement.md";

    /// <summary>Draws and writes all files and gives their names, charts only counted.</summary>
    /// <exception cref="RefusalException">The folder cannot be written.</exception>
    public static IReadOnlyList<string> Write(
        string folder, LotJudgement judged, IReadOnlyList<ReadingReport> reports, DateOnly date, DocumentOptions look)
    {
        ReadOnlyMemory<byte> json = JudgementJson.Write(judged, reports);
        IReadOnlyList<DocumentFile> documents = JudgementPackage.Draw(
            judged, [.. reports.Select(r => new JudgedFile(Path.GetFileName(r.File), r.Lines, r.Layout?.Description ?? ""))],
            [new SourceFile("judgement.json", "application/json", "Judgement", false, json)], date, look);
        try
        {
            Directory.CreateDirectory(folder);
            Replace(folder, "judgement.json", stream => stream.Write(json.Span));
            Replace(folder, "units.csv", stream =>
            {
                using StreamWriter writer = new(stream, new UTF8Encoding(false), 1 << 16, leaveOpen: true);
                UnitsCsv.Write(judged.Units, writer);
            });
            // The text names the charts of its judgement: it is replaced last, so that a run that was cut short leaves none without a name.
            foreach (DocumentFile document in documents.OrderBy(document => document.Name == Text))
            {
                if (document.Name == Text)
                    EarlierCharts.Remove(folder, Text, documents);
                Replace(folder, document.Name, stream => stream.Write(document.Bytes.Span));
            }
        }
        catch (Exception refused) when (WritingFault.Is(refused))
        {
            throw WritingFault.Refuse(folder, refused);
        }

        string[] charts = [.. documents.Select(d => d.Name).Where(name => name.EndsWith(".svg", StringComparison.Ordinal))];
        return [.. documents.Select(d => d.Name).Except(charts), "judgement.json", "units.csv", $"{charts.Length} charts as .svg"];
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
        catch (Exception refused) when (WritingFault.Is(refused))
        {
            WholeFile.TryDelete(unfinished);
            throw;
        }
    }
}
