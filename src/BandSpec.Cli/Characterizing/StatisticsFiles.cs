using System.Text;
using BandSpec.Cli.Opening;
using BandSpec.Cli.Printing;
using BandSpec.Cli.Storing;
using BandSpec.Core.Findings;
using BandSpec.Core.Requirements;
using BandSpec.Documents;
using BandSpec.Files.Inputs;
using BandSpec.Files.Readings;
using BandSpec.Files.Yaml;

namespace BandSpec.Cli.Characterizing;

/// <summary>Reads readings and platforms for the commands that make statistics, and writes what they make.</summary>
internal sealed class StatisticsFiles(Terminal terminal)
{
    /// <summary>The readings of all files; null, and the findings on the screen, when one has findings.</summary>
    public IReadOnlyList<T>? Read<T>(IReadOnlyList<string> files, Func<InputContent, ReadingsSet<T>> read)
    {
        List<ReadingsSet<T>> sets = [.. files.Select(file => read(OpenedContent.Open(PathOf(file), file, ReadingTable.LargestFile + 1)))];
        Sources.AddRange(sets.Select(set => set.Source).OfType<InputSource>());
        return Show([.. sets.SelectMany(set => set.Findings)]) ? null : [.. sets.SelectMany(set => set.Readings)];
    }

    /// <summary>The files of readings that were read.</summary>
    public List<InputSource> Sources { get; } = [];

    /// <summary>Their names without folders.</summary>
    public IReadOnlyList<string> Names => [.. Sources.Select(source => Path.GetFileName(source.Name))];

    /// <summary>The platform of a file; null when there is no such file. False, and the findings on the screen, when it has findings.</summary>
    public bool TryPlatform(string? file, out Platform? platform)
    {
        platform = null;
        if (file is null || !File.Exists(PathOf(file)))
            return true;
        (platform, IReadOnlyList<PlacedFinding> findings) = PlatformReading.Read(OpenedContent.Open(PathOf(file), file, (1 << 20) + 1));
        return !Show(findings);
    }

    /// <summary>The text of a file that was read before.</summary>
    public string Text(string file) => File.ReadAllText(PathOf(file));

    /// <summary>Shows findings about the readings as a whole, and says whether there were any.</summary>
    public bool Show(IReadOnlyList<Finding> findings) => Show(
        [.. findings.Select(finding => new PlacedFinding(finding, new Place(string.Join(", ", Names), 1, 1, 1, "")))]);

    /// <summary>Writes a text file, whole or not at all.</summary>
    public void Write(string file, string text) => Write(PathOf(file), file, Encoding.UTF8.GetBytes(text));

    /// <summary>Writes the files of a report into a folder, which is made when it is not there.</summary>
    public void Write(string folder, IEnumerable<DocumentFile> files)
    {
        foreach (DocumentFile file in files)
            Write(Path.Combine(PathOf(folder), file.Name), Path.Combine(folder, file.Name), file.Bytes);
    }

    /// <summary>The readings' files as a report carries them.</summary>
    public IReadOnlyList<SourceFile> Attachments() =>
        [.. Sources.Select(source => new SourceFile(Path.GetFileName(source.Name), "text/csv", "Readings", true, source.Bytes))];

    private bool Show(IReadOnlyList<PlacedFinding> findings)
    {
        if (findings.Count > 0)
            terminal.Out.Write(FindingScreen.Of(findings, terminal.Ink));
        return findings.Count > 0;
    }

    private static void Write(string path, string shown, ReadOnlyMemory<byte> bytes)
    {
        try
        {
            Directory.CreateDirectory(Path.GetDirectoryName(path)!);
        }
        catch (Exception refused) when (WritingFault.Is(refused))
        {
            throw WritingFault.Refuse(shown, refused);
        }

        WholeFile.Write(path, bytes);
    }

    private string PathOf(string file) => Path.GetFullPath(file, terminal.Folder);
}
