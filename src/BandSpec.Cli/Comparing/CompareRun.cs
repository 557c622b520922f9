using System.Text;
using BandSpec.Cli.Printing;
using BandSpec.Cli.Storing;
using BandSpec.Core.Requirements;
using BandSpec.Core.Revisions;
using BandSpec.Core.Specifying;
using BandSpec.Documents;
using BandSpec.Documents.Fonts;
using BandSpec.Files.Inputs;
using BandSpec.Files.Json;

namespace BandSpec.Cli.Comparing;

/// <summary>Solves both sides of a comparison and tells what differs.</summary>
/// <param name="terminal">Where the answer goes, and the folder that paths are counted from.</param>
internal sealed class CompareRun(Terminal terminal)
{
    /// <summary>Whether programs are told instead of a person.</summary>
    public required bool Json { get; init; }

    /// <summary>Whether the answer is to be Markdown.</summary>
    public required bool Markdown { get; init; }

    /// <summary>Whether nothing is told but by the exit code.</summary>
    public required bool Quiet { get; init; }

    /// <summary>The folder for the report; null for none.</summary>
    public required string? Report { get; init; }

    /// <summary>The paper of the report.</summary>
    public required Paper Paper { get; init; }

    /// <summary>Compares the older inputs with the newer.</summary>
    public ExitCode Run(InputSet old, InputSet now, CancellationToken cancellation)
    {
        PlacedFinding[] findings = [.. old.Findings.Concat(now.Findings).Distinct()];
        if (old.Application is not { } before || now.Application is not { } after)
        {
            terminal.Out.Write(FindingScreen.Of(findings, terminal.Ink));
            return ExitCode.Findings;
        }

        var comparison = Comparison.Of(Solve(before, cancellation), Solve(after, cancellation));
        IReadOnlyList<Cause> causes = Cause.Of(comparison, cancellation);
        IReadOnlyList<string> written = WriteReport(comparison, causes);
        if (Json)
            terminal.Out.Write(Encoding.UTF8.GetString(ComparisonJson.Write(comparison, causes).Span));
        else if (Markdown)
            terminal.Out.Write(ComparisonReport.Markdown(comparison, causes, CommandLine.Program));
        else if (!Quiet)
            terminal.Out.Write(ComparisonScreen.Of(comparison, causes, written, terminal.Ink));
        return comparison.LimitsDiffer ? ExitCode.AnswerIsNo : ExitCode.Done;
    }

    private Specification Solve(Application application, CancellationToken cancellation)
    {
        Specification specification = SearchBar.Over(
            terminal, application.Requirement.Identity.FolderName, bar => SpecificationDraft.Draft(application, bar, cancellation: cancellation));
        cancellation.ThrowIfCancellationRequested();
        return specification;
    }

    private IReadOnlyList<string> WriteReport(Comparison comparison, IReadOnlyList<Cause> causes)
    {
        if (Report is null)
            return [];
        DocumentFile[] files =
            [.. Draw(comparison, causes), new DocumentFile("comparison.json", ComparisonJson.Write(comparison, causes))];
        WholeFile.WriteInto(Path.GetFullPath(Report, terminal.Folder), files);
        return [.. files.Select(file => Path.Combine(Report, file.Name))];
    }

    private IReadOnlyList<DocumentFile> Draw(Comparison comparison, IReadOnlyList<Cause> causes)
    {
        try
        {
            return ComparisonReport.Draw(comparison, causes, new DocumentOptions { Program = CommandLine.Program, Paper = Paper });
        }
        catch (MissingLetterException missing)
        {
            throw new RefusalException($"the report cannot be drawn: {missing.Message.TrimEnd('.')}", ExitCode.Findings);
        }
    }
}
