using BandSpec.Cli.Opening;
using BandSpec.Cli.Printing;
using BandSpec.Cli.Storing;
using BandSpec.Core.Specifying;
using BandSpec.Documents;
using BandSpec.Files.Inputs;
using BandSpec.Files.Json;

namespace BandSpec.Cli.Trading;

/// <summary>What is asked for.</summary>
/// <param name="File">The requirement as the user named it.</param>
/// <param name="Root">The folder that inputs have to be in; null to find it.</param>
/// <param name="Out">Folder or file for the chart; null for none.</param>
/// <param name="Choose">The number of the plan to pin; null for none.</param>
/// <param name="Language">The language of the chart.</param>
internal sealed record TradeoffOrder(string File, string? Root, string? Out, int? Choose, string Language);

/// <summary>Works out the alternatives of a requirement, shows them, draws them, and pins the one that was chosen.</summary>
/// <param name="terminal">Where they are shown.</param>
/// <param name="order">What is asked for.</param>
internal sealed class TradeoffRun(Terminal terminal, TradeoffOrder order)
{
    /// <summary>Runs the order.</summary>
    public ExitCode Run(bool json, bool quiet, CancellationToken cancellation)
    {
        InputSet inputs = InputFolder.Read(order.File, order.Root, terminal.Folder);
        if (inputs.Application is not { } application)
        {
            terminal.Out.Write(FindingScreen.Of(inputs.Findings, terminal.Ink));
            return ExitCode.Findings;
        }

        PlanAlternatives found = SearchBar.Over(
            terminal, application.Requirement.Identity.FolderName, bar => PlanAlternatives.Of(application, bar, cancellation));
        string? chart = order.Out is null || found.ByMargin.Count == 0 ? null : WriteChart(found);
        if (json)
            terminal.Out.Write(System.Text.Encoding.UTF8.GetString(TradeoffJson.Write(found).Span));
        else if (!quiet)
            terminal.Out.Write(TradeoffScreen.Of(found, chart, terminal.Ink));
        if (!found.Proven)
            terminal.Error.WriteLine($"bandspec: {TradeoffScreen.Stopped(found)}");
        if (order.Choose is { } number)
            Pin(found, number, inputs.Sources[0], quiet || json);
        return found.Proven && found.ByRmsError.Count > 0 ? ExitCode.Done : ExitCode.AnswerIsNo;
    }

    private string WriteChart(PlanAlternatives found)
    {
        string name = order.Out!;
        if (!name.EndsWith(".svg", StringComparison.OrdinalIgnoreCase))
            name = Path.Combine(name, $"{found.Application.Requirement.Identity.FolderName}-tradeoff.svg");
        string path = Path.GetFullPath(name, terminal.Folder);
        WholeFile.WriteInFolder(path, TradeoffDrawing.Draw(found, new DocumentOptions { Program = CommandLine.Program, Language = order.Language }));
        return name;
    }

    private void Pin(PlanAlternatives found, int number, InputSource requirement, bool quiet)
    {
        PlanAlternative chosen = found.All.FirstOrDefault(one => one.Number == number)
            ?? throw new RefusalException($"there is no plan {number}; there are 1 to {found.All.Count()}", ExitCode.Findings);
        PinnedRequirement pinned = new(order.File, terminal.Folder, requirement);
        IReadOnlyList<string> changes = pinned.Write(found.Application, chosen.Point.Plan);
        if (!quiet)
            terminal.Out.Write(TradeoffScreen.Pinned(order.File, chosen, changes, terminal.Ink));
    }
}
