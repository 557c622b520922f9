using BandSpec.Cli.Printing;
using BandSpec.Core.VirtualLots;
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
    string Value, int Findings, double Margin, double CostPerUnit, LotReport? Report, LeavingProbability? Leaving);

/// <summary>
/// Tries a value over a range. Every value is read, specified and tried anew with the same seed; streams are drawn by name, so that two
/// values share their chance and their difference is not noise.
/// </summary>
internal static class SweepRun
{
    /// <summary>Runs the sweep and writes its table.</summary>
    public static ExitCode Run(TryRequest request, Sweep sweep, bool json, Terminal terminal, CancellationToken cancellation)
    {
        List<SweepStep> steps = [];
        foreach (string value in sweep.Values)
        {
            if (cancellation.IsCancellationRequested)
                break;
            steps.Add(StepOf(request with { Changes = [.. request.Changes, InputChange.Of(sweep.Path, value)] }, value, terminal, cancellation));
        }
        terminal.Out.Write(json ? SweepScreen.Json(sweep, steps) : SweepScreen.Of(sweep, steps, terminal.Ink));
        return steps.Any(step => step.Report is null) ? ExitCode.Findings : steps.Count < sweep.Values.Count ? ExitCode.AnswerIsNo : ExitCode.Done;
    }

    private static SweepStep StepOf(TryRequest request, string value, Terminal terminal, CancellationToken cancellation)
    {
        Tried tried = new TryRun(terminal).Try(request, cancellation);
        if (tried is not { Specification: { } specification, Result: { LotsMade: >= 2 } result })
            return new SweepStep(value, tried.Inputs.Findings.Count, double.NaN, double.NaN, null, null);
        return new SweepStep(
            value, 0, specification.Bands.Margin, specification.Choice.Run.CostPerUnit, LotReport.Of(specification, result),
            LeavingProbability.Of(specification, request.Order.Seed, TryRun.RelativeError, TryRun.MostDraws, cancellation));
    }
}
