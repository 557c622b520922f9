using BandSpec.Cli.Opening;
using BandSpec.Cli.Printing;
using BandSpec.Cli.Versioning;
using BandSpec.Core.Findings;
using BandSpec.Files.Inputs;
using BandSpec.Files.Releases;

namespace BandSpec.Cli.Drafting;

/// <summary>Drafts many requirements side by side. One that cannot be drafted keeps no other from it, and the packages do not depend on how many run at once.</summary>
/// <param name="terminal">Where progress is shown.</param>
/// <param name="run">How one requirement is drafted.</param>
/// <param name="workers">How many are drafted at once, at least 1.</param>
/// <param name="changes">What has changed in git, if only that is to be drafted; null for everything.</param>
internal sealed class DraftBatch(Terminal terminal, DraftRun run, int workers, ChangedFiles? changes)
{
    private readonly record struct Prepared(NamedFile File, InputSet? Inputs, ReleaseRecord? Released, Draft? Ended);

    /// <summary>
    /// What came of each file, in the order of the files. Stopped, those at work finish with their best plans so far and no other is begun.
    /// </summary>
    public IReadOnlyList<Draft> Run(IReadOnlyList<NamedFile> files, CancellationToken cancellation)
    {
        ParallelOptions options = new() { MaxDegreeOfParallelism = workers };
        var prepared = new Prepared[files.Count];
        Parallel.For(0, files.Count, options, i => prepared[i] = Prepare(files[i]));
        RefuseSharedFolders(prepared);
        var drafts = new Draft[files.Count];
        using CountBar bar = new(terminal, files.Count);
        Parallel.For(0, files.Count, options, i =>
        {
            drafts[i] = Finish(prepared[i], files.Count == 1, cancellation);
            bar.Advance();
        });
        return drafts;
    }

    private Prepared Prepare(NamedFile file)
    {
        if (file.Note is { } note)
            return new Prepared(file, null, null, new Draft(file.Name, DraftState.LeftOut, null) { Note = note });
        return Guarded(file, () =>
        {
            (InputSet inputs, ReleaseRecord? released) = run.Read(file.Name);
            Draft? ended = changes is null || changes.Touch(file.Name, inputs, run.TemplatesFor(file.Name))
                ? null : new Draft(file.Name, DraftState.LeftOut, inputs with { Findings = [] }) { Note = "not changed" };
            return new Prepared(file, inputs, released, ended);
        }, failed => new Prepared(file, null, null, failed));
    }

    /// <summary>Two requirements with one number and revision would write each other's package over; the first in the list keeps it.</summary>
    private static void RefuseSharedFolders(Prepared[] prepared)
    {
        Dictionary<string, string> owners = new(StringComparer.OrdinalIgnoreCase);
        for (int i = 0; i < prepared.Length; i++)
        {
            if (prepared[i] is not { Ended: null, Inputs: { Application: { } application } inputs } one)
                continue;
            string folder = application.Requirement.Identity.FolderName;
            if (owners.TryAdd(folder, one.File.Name))
                continue;
            Finding shared = new(
                FieldPath.InRequirement("specification.number"), "same-specification", $"{folder} is already the specification of {owners[folder]}",
                "a number and revision of its own");
            prepared[i] = one with { Inputs = inputs.Refused([shared]) };
        }
    }

    private Draft Finish(Prepared one, bool isOnly, CancellationToken cancellation)
    {
        if (one.Ended is { } ended)
            return ended;
        if (cancellation.IsCancellationRequested)
            return new Draft(one.File.Name, DraftState.Stopped, one.Inputs) { Note = "stopped before it was begun" };
        return Guarded(one.File, () => run.Run(one.File.Name, one.Inputs!, one.Released, isOnly, cancellation), failed => failed);
    }

    private T Guarded<T>(NamedFile file, Func<T> work, Func<Draft, T> orElse)
    {
        try
        {
            return work();
        }
        catch (RefusalException refusal)
        {
            return orElse(new Draft(file.Name, DraftState.Failed, null) { Note = refusal.Message });
        }
        catch (Exception fault) when (fault is not OperationCanceledException)
        {
            return orElse(new Draft(file.Name, DraftState.Failed, null) { Note = FaultReport.Describe(fault, [file.Name], terminal) });
        }
    }
}
