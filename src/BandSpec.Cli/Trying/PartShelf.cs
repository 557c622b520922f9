using BandSpec.Cli.Opening;
using BandSpec.Core.VirtualLots;
using BandSpec.Files.Json;

namespace BandSpec.Cli.Trying;

/// <summary>Parts of virtual lots as they are read from files.</summary>
/// <param name="terminal">Where folders are counted from, and faults go to.</param>
internal sealed class PartShelf(Terminal terminal)
{
    private readonly List<LotPartFile> parts = [];

    /// <summary>The parts in the order of their files.</summary>
    public IReadOnlyList<LotPartFile> Parts => parts;

    /// <summary>Reads the files; each that is no part is named, and the answer is then no.</summary>
    public bool Read(IReadOnlyList<string> files)
    {
        bool all = true;
        foreach (string file in files)
            try
            {
                parts.Add(LotPartJson.Read(BoundedFile.Read(Path.GetFullPath(file, terminal.Folder))));
            }
            catch (Exception refused) when (refused is FormatException or IOException or UnauthorizedAccessException)
            {
                terminal.Error.WriteLine($"bandspec: {file}: {(refused is FormatException ? refused.Message : "it cannot be read")}");
                all = false;
            }
        return all;
    }

    /// <summary>Puts the parts together.</summary>
    /// <param name="subject">The subject that the first part's inputs lead to.</param>
    public GatheredLots Gather(LotSubject subject)
    {
        List<PartFinding> foreign = [];
        List<LotResult> results = [];
        for (int i = 0; i < parts.Count; i++)
            if (ResultOf(parts[i], subject) is { } result)
                results.Add(result);
            else
                foreign.Add(new PartFinding(PartFault.Foreign, i, parts[i].Ranges.FirstOrDefault()));
        return foreign.Count > 0 ? new GatheredLots(null, foreign) : LotGathering.Gather(results);
    }

    /// <summary>A part as a result of the subject; null when it was made for another.</summary>
    private static LotResult? ResultOf(LotPartFile part, LotSubject subject)
    {
        try
        {
            LotResult result = LotResult.From(subject, part.Order, part.Ranges, part.Figures);
            return result.Fingerprint == part.Fingerprint ? result : null;
        }
        catch (ArgumentException)
        {
            return null;
        }
    }
}
