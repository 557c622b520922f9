using System.Globalization;
using BandSpec.Cli.Printing;
using BandSpec.Cli.Storing;
using BandSpec.Core.VirtualLots;
using BandSpec.Documents;
using BandSpec.Files.Inputs;

namespace BandSpec.Cli.Trying;

/// <summary>One value of a sweep and what it led to.</summary>
/// <param name="Value">The value as written.</param>
/// <param name="Findings">How many findings it led to.</param>
/// <param name="Margin">The plan's margin.</param>
/// <param name="CostPerUnit">The plan's cost of chamber time.</param>
/// <param name="Report">What the lots showed; null with findings.</param>
/// <param name="Leaving">The probability of leaving; null with findings.</param>
internal sealed record SweepStep(
    string Value, int Findings, double Margin, double CostPerUnit, LotReport? Report, LeavingProbability? Leaving)
{
    /// <summary>The share of units that the verification test accepted.</summary>
    public double? Yield => Report?.Steps[^3].Through.Value;
}

/// <summary>
/// Tries a value over a range. Every value is read, specified and tried anew with the same seed; streams are drawn by name, so that two
/// values share their chance and their difference is not noise.
/// </summary>
/// <param name="request">What is tried.</param>
/// <param name="sweep">The value and its range.</param>
/// <param name="terminal">Where the table is shown.</param>
internal sealed class SweepRun(TryRequest request, Sweep sweep, Terminal terminal)
{
    /// <summary>Runs the sweep, writes its table and, when a file is named, its chart.</summary>
    public ExitCode Run(string? chart, bool json, CancellationToken cancellation)
    {
        List<SweepStep> steps = [];
        foreach (string value in sweep.Values)
        {
            if (cancellation.IsCancellationRequested)
                break;
            steps.Add(StepOf(value, cancellation));
        }

        SweepPlace[] places = [.. steps.Select(PlaceOf).OfType<SweepPlace>()];
        string? drawn = places.Length > 0 ? chart : null;
        if (drawn is not null)
            WholeFile.WriteInFolder(
                Path.GetFullPath(drawn, terminal.Folder), SweepDrawing.Draw(sweep.Path, places, new DocumentOptions { Program = CommandLine.Program }));
        terminal.Out.Write(json ? SweepScreen.Json(sweep, steps) : SweepScreen.Of(sweep, steps, drawn, terminal.Ink));
        return steps.Any(step => step.Report is null) ? ExitCode.Findings : steps.Count < sweep.Values.Count ? ExitCode.AnswerIsNo : ExitCode.Done;
    }

    private SweepStep StepOf(string value, CancellationToken cancellation)
    {
        TryRequest changed = request with { Changes = [.. request.Changes, InputChange.Of(sweep.Path, value)] };
        Tried tried = new TryRun(terminal).Try(changed, cancellation);
        if (tried is not { Specification: { } specification, Result: { LotsMade: >= 2 } result })
            return new SweepStep(value, tried.Inputs.Findings.Count, double.NaN, double.NaN, null, null);
        return new SweepStep(
            value, 0, specification.Bands.Margin, specification.Choice.Run.CostPerUnit, LotReport.Of(specification, result),
            LeavingProbability.Of(specification, changed.Order.Seed, TryRun.RelativeError, TryRun.MostDraws, cancellation));
    }

    private static SweepPlace? PlaceOf(SweepStep step) => step is { Yield: { } yield, Leaving: { } leaving }
        ? new SweepPlace(double.Parse(step.Value, CultureInfo.InvariantCulture), step.Margin, yield, leaving.AnyUnit.Value)
        : null;
}
