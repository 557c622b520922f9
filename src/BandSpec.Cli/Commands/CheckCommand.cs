using System.CommandLine;
using BandSpec.Cli.Opening;
using BandSpec.Cli.Printing;
using BandSpec.Files.Inputs;

namespace BandSpec.Cli.Commands;

/// <summary><c>bandspec check FILE…</c>: everything that is wrong with requirements, their platforms and their stations.</summary>
internal static class CheckCommand
{
    /// <summary>The command.</summary>
    public static Command Create(Terminal terminal)
    {
        Argument<string[]> files = CommonOptions.Files();
        (Option<bool> json, Option<bool> quiet, Option<string?> root) = (CommonOptions.Json(), CommonOptions.Quiet(), CommonOptions.Root());
        (Option<string?> sarif, Option<string?> junit) = (FindingReports.SarifOption(), FindingReports.JunitOption());
        TaughtCommand command = new(
            "check", "Reads requirements with their platforms and stations, and shows every finding at once.",
            ("bandspec check pump.yaml", "findings with file, line, column and what is accepted"),
            ("bandspec check requirements --json", "of every requirement below a folder, for programs"),
            ("bandspec check requirements --sarif findings.sarif", "for a merge request: findings at their lines"),
            ("bandspec check pump.yaml && bandspec draft pump.yaml", "draft only what is in order"))
        {
            files, json, quiet, root, sarif, junit,
        };
        command.SetAction(parsed => (int)Run(
            [.. RequirementFiles.Among(parsed.GetRequiredValue(files), terminal.Folder).Where(file => file.Note is null)
                .Select(file => (file.Name, InputFolder.Read(file.Name, parsed.GetValue(root), terminal.Folder)))],
            new FindingReports(parsed.GetValue(sarif), parsed.GetValue(junit)), parsed.GetValue(json), parsed.GetValue(quiet), terminal));
        return command;
    }

    private static ExitCode Run(
        IReadOnlyList<(string File, InputSet Set)> read, FindingReports reports, bool json, bool quiet, Terminal terminal)
    {
        reports.Write([.. read.Select(file => (file.File, file.Set.Findings, (string?)null))], terminal.Folder);
        if (json)
            terminal.Out.Write(FindingJson.Of(read));
        else
            WriteScreen(read, quiet, terminal);
        return read.All(file => file.Set.Application is not null) ? ExitCode.Done : ExitCode.Findings;
    }

    private static void WriteScreen(IReadOnlyList<(string File, InputSet Set)> read, bool quiet, Terminal terminal)
    {
        // A platform that several requirements share is checked with each of them; what is wrong with it is said once.
        PlacedFinding[] findings = [.. read.SelectMany(file => file.Set.Findings).Distinct()];
        if (findings.Length > 0)
            terminal.Out.Write(FindingScreen.Of(findings, terminal.Ink));
        if (quiet)
            return;
        foreach ((string file, InputSet set) in read.Where(file => file.Set.Application is not null))
            terminal.Out.WriteLine($"{file}: {terminal.Ink.Green("in order")}, with {string.Join(" and ", set.Sources.Skip(1).Select(source => source.Name))}");
    }
}
