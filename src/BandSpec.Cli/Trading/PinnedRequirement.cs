using BandSpec.Cli.Opening;
using BandSpec.Cli.Printing;
using BandSpec.Cli.Releasing;
using BandSpec.Cli.Storing;
using BandSpec.Core.Requirements;
using BandSpec.Files.Inputs;

namespace BandSpec.Cli.Trading;

/// <summary>A requirement file that a plan is written into.</summary>
/// <param name="file">The file as the user named it.</param>
/// <param name="workingFolder">The folder that relative paths are counted from.</param>
/// <param name="read">What was read of it.</param>
internal sealed class PinnedRequirement(string file, string workingFolder, InputSource read)
{
    /// <summary>Writes the plan beside the file and renames; every other line stays as it is.</summary>
    /// <returns>The lines that changed, those that go with <c>-</c> and those that come with <c>+</c> before them.</returns>
    /// <exception cref="RefusalException">The revision is released, the file has changed meanwhile, or cannot be written to.</exception>
    public IReadOnlyList<string> Write(Application application, CompensationPlan plan)
    {
        SpecificationIdentity identity = application.Requirement.Identity;
        if (ReleaseFile.Read(file, workingFolder, out PlacedFinding? broken) is not { } record)
            throw new RefusalException(broken!.Finding.Found, ExitCode.Findings);
        if (record.Find(identity) is not null)
            throw new RefusalException($"{identity.FolderName} is released and stays as it is; give {file} a new revision first", ExitCode.Findings);
        if (PlanPinning.Pin(read.Bytes, plan) is not { } changed)
            throw new RefusalException($"the plan cannot be written into `compensation` as {file} has it; write {PlanWords.AsKeys(plan)} there", ExitCode.Findings);
        string path = RealPath.Of(Path.GetFullPath(file, workingFolder));
        if (!Current(path).Span.SequenceEqual(read.Bytes.Span))
            throw new RefusalException($"{file} was changed while plans were searched; nothing was written", ExitCode.Findings);
        WholeFile.Write(path, changed);
        return Changes(Lines(read.Bytes), Lines(changed));
    }

    private static ReadOnlyMemory<byte> Current(string path)
    {
        try
        {
            return File.ReadAllBytes(path);
        }
        catch (Exception gone) when (gone is IOException or UnauthorizedAccessException)
        {
            return default;
        }
    }

    private static string[] Lines(ReadOnlyMemory<byte> bytes) => System.Text.Encoding.UTF8.GetString(bytes.Span).ReplaceLineEndings("\n").Split('\n');

    private static IReadOnlyList<string> Changes(string[] before, string[] after)
    {
        int same = before.Zip(after).TakeWhile(pair => pair.First == pair.Second).Count();
        int alike = before.Skip(same).Reverse().Zip(after.Skip(same).Reverse()).TakeWhile(pair => pair.First == pair.Second).Count();
        return [.. before[same..^alike].Select(line => $"- {line}"), .. after[same..^alike].Select(line => $"+ {line}")];
    }
}
