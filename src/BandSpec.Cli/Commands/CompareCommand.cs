using System.CommandLine;
using System.Text;
using BandSpec.Cli.Comparing;
using BandSpec.Cli.Printing;
using BandSpec.Core.Requirements;
using BandSpec.Core.Revisions;
using BandSpec.Core.Specifying;
using BandSpec.Files.Inputs;
using BandSpec.Files.Json;

namespace BandSpec.Cli.Commands;

/// <summary><c>bandspec compare OLD NEW</c>: what changed from one specification to another, and what it did.</summary>
internal static class CompareCommand
{
    /// <summary>The command.</summary>
    public static Command Create(Terminal terminal)
    {
        Argument<string> old = new("OLD") { Description = "A requirement file, a package folder, a specification's PDF, or revision:path in git." };
        Argument<string> now = new("NEW") { Description = "The same, newer." };
        (Option<bool> json, Option<bool> quiet, Option<string?> root) = (CommonOptions.Json(), CommonOptions.Quiet(), CommonOptions.Root());
        TaughtCommand command = new(
            "compare", "Shows what differs between two specifications: inputs, band, plan, every limit, for whom it is tighter, and which input moved most. Exit code 1 when limits differ.",
            ("bandspec compare rev-a:pump.yaml pump.yaml", "since the git tag rev-a"),
            ("bandspec compare out/HV-3107-A out/HV-3107-B", "two packages, from the inputs in their PDFs"),
            ("bandspec compare a.pdf b.pdf --json", "every figure, for programs"))
        {
            old, now, json, quiet, root,
        };
        command.SetAction((parsed, cancellation) => Task.FromResult((int)Run(
            [.. new[] { old, now }.Select(side => ComparedSide.Read(parsed.GetRequiredValue(side), parsed.GetValue(root), terminal.Folder))],
            parsed.GetValue(json), parsed.GetValue(quiet), terminal, cancellation)));
        return command;
    }

    private static ExitCode Run(IReadOnlyList<InputSet> sides, bool json, bool quiet, Terminal terminal, CancellationToken cancellation)
    {
        PlacedFinding[] findings = [.. sides.SelectMany(side => side.Findings).Distinct()];
        if (sides[0].Application is not { } before || sides[1].Application is not { } after)
        {
            terminal.Out.Write(FindingScreen.Of(findings, terminal.Ink));
            return ExitCode.Findings;
        }

        Comparison comparison = Comparison.Of(Solve(before, terminal, cancellation), Solve(after, terminal, cancellation));
        IReadOnlyList<Cause> causes = Cause.Of(comparison, cancellation);
        if (json)
            terminal.Out.Write(Encoding.UTF8.GetString(ComparisonJson.Write(comparison, causes).Span));
        else if (!quiet)
            terminal.Out.Write(ComparisonScreen.Of(comparison, causes, terminal.Ink));
        return comparison.LimitsDiffer ? ExitCode.AnswerIsNo : ExitCode.Done;
    }

    private static Specification Solve(Application application, Terminal terminal, CancellationToken cancellation)
    {
        Specification specification = SearchBar.Over(
            terminal, application.Requirement.Identity.FolderName, bar => SpecificationDraft.Draft(application, bar, cancellation: cancellation));
        cancellation.ThrowIfCancellationRequested();
        return specification;
    }
}
