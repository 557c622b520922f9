using System.CommandLine;
using BandSpec.Cli.Drafting;
using BandSpec.Cli.Opening;
using BandSpec.Cli.Printing;
using BandSpec.Cli.Versioning;
using BandSpec.Files.Inputs;

namespace BandSpec.Cli.Commands;

/// <summary><c>bandspec draft FILE…</c>: from requirements to specification packages.</summary>
internal static class DraftCommand
{
    /// <summary>The command.</summary>
    public static Command Create(Terminal terminal)
    {
        Argument<string[]> files = CommonOptions.Files();
        PackageOptions package = new();
        Option<int> workers = NumberOption.Create(
            "--workers", "How many requirements are drafted at once; as many as there are processors when left out.", "N", "a whole number from 1 to 1024",
            number => number is >= 1 and <= 1024, Environment.ProcessorCount);
        Option<string?> since = new("--changed-since")
        {
            Description = "Draft only what depends on a file that differs from this revision in git.", HelpName = "REV",
        };
        (Option<string?> sarif, Option<string?> junit) = (FindingReports.SarifOption(), FindingReports.JunitOption());
        (Option<bool> json, Option<bool> quiet) = (CommonOptions.Json(), CommonOptions.Quiet());
        TaughtCommand command = new(
            "draft", "Turns requirements into specification packages, each in a folder of its number and revision. A package that is there already from the same inputs is left as it is.",
            ("bandspec draft pump.yaml", "the package in out/NUMBER-REVISION/"),
            ("bandspec draft requirements --out packages", "every requirement below a folder, one summary at the end"),
            ("bandspec draft requirements --changed-since main --sarif findings.sarif", "for a merge request: what it changes, findings at their lines"),
            ("bandspec draft pump.yaml --json", "verdict, margin and file names for programs"))
        {
            files, workers, since, sarif, junit, json, quiet,
        };
        package.AddTo(command);
        command.SetAction((parsed, cancellation) => Task.FromResult((int)Run(
            RequirementFiles.Among(parsed.GetRequiredValue(files), terminal.Folder),
            new DraftBatch(
                terminal, package.RunOf(parsed, terminal), parsed.GetValue(workers),
                parsed.GetValue(since) is { } revision ? ChangedFiles.Since(revision, terminal.Folder) : null),
            new FindingReports(parsed.GetValue(sarif), parsed.GetValue(junit)),
            parsed.GetValue(json), parsed.GetValue(quiet), terminal, cancellation)));
        return command;
    }

    /// <summary>One file that cannot be drafted never keeps the others from being drafted; the worst of all is the exit code.</summary>
    private static ExitCode Run(
        IReadOnlyList<NamedFile> files, DraftBatch batch, FindingReports reports, bool json, bool quiet, Terminal terminal, CancellationToken cancellation)
    {
        IReadOnlyList<Draft> drafts = batch.Run(files, cancellation);
        if (json)
            terminal.Out.Write(DraftJson.Of(drafts));
        else
            WriteScreen(drafts, quiet, terminal);
        foreach (Draft stopped in drafts.Where(draft => draft is { State: DraftState.Drafted, Verdict.Proven: false }))
            terminal.Error.WriteLine($"bandspec: {ProofWords.Stopped(stopped.Specification!)}");
        foreach (Draft failed in drafts.Where(draft => draft.State == DraftState.Failed))
            terminal.Error.WriteLine($"bandspec: {failed.Note}");
        reports.Write(
            [.. drafts.Select(draft => (draft.File, draft.Findings, draft.State == DraftState.Failed ? draft.Note : null))], terminal.Folder);
        return drafts.Max(draft => draft.ExitCode);
    }

    private static void WriteScreen(IReadOnlyList<Draft> drafts, bool quiet, Terminal terminal)
    {
        PlacedFinding[] findings = [.. drafts.SelectMany(draft => draft.Findings).Distinct()];
        if (findings.Length > 0)
            terminal.Out.Write(FindingScreen.Of(findings, terminal.Ink));
        if (quiet)
            return;
        if (drafts.Count > 1)
            terminal.Out.Write(DraftSummary.Of(drafts, terminal.Ink));
        else if (drafts[0] is { Specification: { } specification, Package: { } package })
            terminal.Out.Write(DraftScreen.Of(specification, package, terminal.Ink));
        else if (drafts[0] is { State: DraftState.UpToDate, Package: { } kept })
            terminal.Out.WriteLine($"{terminal.Ink.Blue(kept.Folder)} is up to date");
        else if (drafts[0] is { State: DraftState.LeftOut or DraftState.Stopped, Note: { } note })
            terminal.Out.WriteLine($"{drafts[0].File}: {note}");
    }
}
