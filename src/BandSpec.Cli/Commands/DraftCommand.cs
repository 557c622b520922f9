using System.CommandLine;
using BandSpec.Cli.Drafting;
using BandSpec.Cli.Printing;
using BandSpec.Documents;
using BandSpec.Files.Inputs;

namespace BandSpec.Cli.Commands;

/// <summary><c>bandspec draft FILE…</c>: from requirements to specification packages.</summary>
internal static class DraftCommand
{
    /// <summary>The command.</summary>
    public static Command Create(Terminal terminal)
    {
        Argument<string[]> files = CommonOptions.Files();
        Option<string> output = new("--out")
        {
            Description = "Folder for the packages; `out` when left out.", DefaultValueFactory = _ => "out", HelpName = "DIR",
        };
        Option<string?> templates = new("--templates")
        {
            Description = "Folder of your own templates; otherwise `templates` in the project, if there is one.", HelpName = "DIR",
        };
        Option<string> language = new("--language") { Description = "Language of the documents.", DefaultValueFactory = _ => "en", HelpName = "en|de" };
        Option<Paper> paper = new("--paper") { Description = "Paper of the PDF.", HelpName = "A4|Letter" };
        (Option<bool> json, Option<bool> quiet, Option<string?> root) = (CommonOptions.Json(), CommonOptions.Quiet(), CommonOptions.Root());
        TaughtCommand command = new(
            "draft", "Turns requirements into specification packages, each in a folder of its number and revision.",
            ("bandspec draft pump.yaml", "the package in out/NUMBER-REVISION/"),
            ("bandspec draft requirements/*.yaml --out packages", "many, one summary at the end"),
            ("bandspec draft pump.yaml --json", "verdict, margin and file names for programs"))
        {
            files, output, templates, language, paper, json, quiet, root,
        };
        command.SetAction((parsed, cancellation) => Task.FromResult((int)Run(
            parsed.GetRequiredValue(files),
            new DraftRun(
                terminal, new DraftFolders(parsed.GetValue(output)!, parsed.GetValue(root), parsed.GetValue(templates)),
                new DocumentOptions { Program = CommandLine.Program, Language = parsed.GetValue(language)!, Paper = parsed.GetValue(paper) }),
            parsed.GetValue(json), parsed.GetValue(quiet), terminal, cancellation)));
        return command;
    }

    /// <summary>One file that cannot be drafted never keeps the others from being drafted; the worst of all is the exit code.</summary>
    private static ExitCode Run(
        IReadOnlyList<string> files, DraftRun run, bool json, bool quiet, Terminal terminal, CancellationToken cancellation)
    {
        List<Draft> drafts = [];
        foreach (string file in files)
        {
            Draft draft = run.Run(file, cancellation);
            drafts.Add(draft);
            if (!json)
                Show(draft, isOnly: files.Count == 1, quiet, terminal);
        }
        if (json)
            terminal.Out.Write(DraftJson.Of(drafts));
        else if (files.Count > 1 && !quiet)
            terminal.Out.Write(DraftScreen.SummaryOf(drafts, terminal.Ink));
        return drafts.Max(draft => draft.ExitCode);
    }

    private static void Show(Draft draft, bool isOnly, bool quiet, Terminal terminal)
    {
        IReadOnlyList<PlacedFinding> findings = draft.Inputs.Findings;
        if (findings.Count > 0)
            terminal.Out.Write(FindingScreen.Of(findings, terminal.Ink));
        if (isOnly && !quiet && draft is { Specification: { } specification, Package: { } package })
            terminal.Out.Write(DraftScreen.Of(specification, package, terminal.Ink));
    }
}
