using System.CommandLine;
using BandSpec.Cli.Comparing;
using BandSpec.Cli.Printing;
using BandSpec.Documents;
using BandSpec.Files.Inputs;

namespace BandSpec.Cli.Commands;

/// <summary><c>bandspec compare OLD NEW</c>: what changed from one specification to another, and what it did.</summary>
internal static class CompareCommand
{
    /// <summary>The command.</summary>
    public static Command Create(Terminal terminal)
    {
        Argument<string> old = new("OLD") { Description = "A requirement file, a package folder, a specification's PDF, or revision:path in git." };
        Argument<string> now = new("NEW") { Description = "The same, newer." };
        Option<string?> report = new("--report") { Description = "Folder for the report: PDF and Markdown, both bands in one chart, JSON.", HelpName = "DIR" };
        Option<bool> markdown = new("--markdown") { Description = "Write Markdown to standard output, for a merge request." };
        Option<Paper> paper = PaperOption.Create();
        (Option<bool> json, Option<bool> quiet, Option<string?> root) = (CommonOptions.Json(), CommonOptions.Quiet(), CommonOptions.Root());
        TaughtCommand command = new(
            "compare", "Shows what differs between two specifications: inputs, band, plan, every limit, for whom it is tighter, and which input moved most. Exit code 1 when limits differ.",
            ("bandspec compare rev-a:pump.yaml pump.yaml", "since the git tag rev-a"),
            ("bandspec compare out/HV-3107-A out/HV-3107-B", "two packages, from the inputs in their PDFs"),
            ("bandspec compare a.pdf b.pdf --report changes", "as PDF, Markdown, SVG and JSON in changes/"),
            ("bandspec compare main:pump.yaml pump.yaml --markdown", "text for a merge request"))
        {
            old, now, report, markdown, json, quiet, paper, root,
        };
        command.Validators.Add(result =>
        {
            if (result.GetValue(json) && result.GetValue(markdown))
                result.AddError("--json and --markdown cannot both be written to standard output");
        });
        command.SetAction((parsed, cancellation) => Task.FromResult((int)new CompareRun(terminal)
        {
            Json = parsed.GetValue(json), Markdown = parsed.GetValue(markdown), Quiet = parsed.GetValue(quiet),
            Report = parsed.GetValue(report), Paper = parsed.GetValue(paper),
        }.Run(Side(old, parsed), Side(now, parsed), cancellation)));
        return command;

        InputSet Side(Argument<string> side, ParseResult parsed) =>
            ComparedSide.Read(parsed.GetRequiredValue(side), parsed.GetValue(root), terminal.Folder);
    }
}
