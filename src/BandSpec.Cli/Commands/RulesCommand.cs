using System.CommandLine;
using System.Text;
using BandSpec.Cli.Opening;
using BandSpec.Cli.Printing;
using BandSpec.Core.Specifying;
using BandSpec.Files.Inputs;
using BandSpec.Files.Json;

namespace BandSpec.Cli.Commands;

/// <summary><c>bandspec rules FILE</c>: every decision rule beside the others for one requirement.</summary>
internal static class RulesCommand
{
    /// <summary>The command.</summary>
    public static Command Create(Terminal terminal)
    {
        Argument<string> file = new("FILE") { Description = "The requirement; platform and station are found from there." };
        Option<string?> root = CommonOptions.Root();
        Option<bool> json = CommonOptions.Json();
        TaughtCommand command = new(
            "rules", "Holds the decision rules for a requirement's verification test side by side: guard bands, consumer's and producer's risk at the worst point and of the whole unit, what rejects cost, and how rarely an accepted unit leaves the allowed error in the field.",
            ("bandspec rules pump.yaml", "the table; the rule under `test` in pump.yaml is marked"),
            ("bandspec rules pump.yaml --json", "the same with every point, for programs"))
        {
            file, root, json,
        };
        command.SetAction((parsed, cancellation) => Task.FromResult((int)Run(
            parsed.GetRequiredValue(file), parsed.GetValue(root), parsed.GetValue(json), terminal, cancellation)));
        return command;
    }

    private static ExitCode Run(string file, string? root, bool json, Terminal terminal, CancellationToken cancellation)
    {
        InputSet inputs = InputFolder.Read(file, root, terminal.Folder);
        if (inputs.Application is not { } application)
        {
            terminal.Out.Write(FindingScreen.Of(inputs.Findings, terminal.Ink));
            return ExitCode.Findings;
        }

        Specification specification = SearchBar.Over(
            terminal, application.Requirement.Identity.FolderName,
            bar => SpecificationDraft.Draft(application, bar, DraftExtras.Decisions, cancellation));
        if (specification.Decisions is not { } decisions)
            throw new OperationCanceledException(cancellation);
        terminal.Out.Write(json ? Encoding.UTF8.GetString(DecisionJson.Write(decisions).Span) : DecisionScreen.Of(specification, decisions, terminal.Ink));
        return decisions.Chosen.Impossible.Count == 0 ? ExitCode.Done : ExitCode.AnswerIsNo;
    }
}
