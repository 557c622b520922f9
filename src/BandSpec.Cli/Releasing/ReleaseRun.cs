using System.Security.Cryptography;
using BandSpec.Cli.Drafting;
using BandSpec.Cli.Printing;
using BandSpec.Cli.Storing;
using BandSpec.Core.Requirements;
using BandSpec.Core.Revisions;
using BandSpec.Core.Specifying;
using BandSpec.Documents.Templates;
using BandSpec.Files.Inputs;
using BandSpec.Files.Json;
using BandSpec.Files.Releases;

namespace BandSpec.Cli.Releasing;

/// <summary>Freezes a revision: draws its package as released and adds its line to the release record.</summary>
/// <param name="terminal">The folder that paths are counted from, and the clock.</param>
/// <param name="run">How the requirement is drafted.</param>
/// <param name="by">Who releases it.</param>
internal sealed class ReleaseRun(Terminal terminal, DraftRun run, string by)
{
    /// <summary>
    /// Releases a requirement's revision. The record is written when the whole package is on the disk and before that takes its place: a run
    /// that is killed has released nothing, or the next draft of the same inputs finishes its package.
    /// </summary>
    public Draft Release(string file, CancellationToken cancellation)
    {
        string recordName = ReleaseFile.NameFor(file), recordPath = Path.GetFullPath(recordName, terminal.Folder);
        if (!Directory.Exists(Path.GetDirectoryName(recordPath)))
            return new Draft(file, DraftState.Refused, run.Read(file).Inputs);
        using ReleaseHold hold = ReleaseHold.Take(Path.GetDirectoryName(recordPath)!, terminal.Clock);
        (InputSet inputs, _) = run.Read(file);
        if (inputs.Application is not { } application)
            return new Draft(file, DraftState.Refused, inputs);
        ReleaseRecord record = ReleaseFile.Read(file, terminal.Folder, out _)!;
        Specification specification = Solve(application, cancellation);
        if (ReleaseRules.FindingsIn(specification, record.Releases) is { Count: > 0 } findings)
            return new Draft(file, DraftState.Refused, inputs.Refused(findings));
        (ReleaseRecord released, ChainedRelease entry) = record.With(ReleaseOf(specification, inputs));
        try
        {
            IReadOnlyList<PackageFile> files = PackageContents.Of(specification, run.SourceOf(file, inputs, released));
            run.FolderOf(application).Replace(files, terminal.Clock, () => WholeFile.Write(recordPath, released.ToBytes()));
            return run.Written(new Draft(file, DraftState.Drafted, inputs) { Release = entry }, specification, files);
        }
        catch (TemplateException fault)
        {
            return new Draft(file, DraftState.Refused, inputs.Refused([DraftRun.Placed(fault)]));
        }
    }

    private Specification Solve(Application application, CancellationToken cancellation)
    {
        Specification specification = SearchBar.Over(
            terminal, application.Requirement.Identity.FolderName, bar => SpecificationDraft.Draft(application, bar, run.Extras, cancellation));
        // A search that was ended early has an answer too, but not one to be frozen.
        cancellation.ThrowIfCancellationRequested();
        return specification;
    }

    private Release ReleaseOf(Specification specification, InputSet inputs)
    {
        SpecificationIdentity identity = specification.Application.Requirement.Identity;
        DateTimeOffset now = terminal.Clock.GetUtcNow();
        return new Release
        {
            Number = identity.Number,
            Revision = identity.Revision,
            By = by,
            // Whole seconds: the record and the documents say no more.
            At = now.AddTicks(-(now.Ticks % TimeSpan.TicksPerSecond)),
            Program = CommandLine.Program,
            Inputs = ReleasedRevision.Digests(inputs),
            LimitsDigest = Convert.ToHexStringLower(SHA256.HashData(LimitsJson.Write(specification).Span)),
        };
    }
}
