using BandSpec.Cli.Printing;
using BandSpec.Core.Specifying;
using BandSpec.Core.VirtualLots;
using BandSpec.Files.Json;

namespace BandSpec.Cli.Trying;

/// <summary>Reports on a result of virtual lots.</summary>
internal static class LotAnswer
{
    /// <summary>Writes the report; the exit code says whether all that was ordered is in it.</summary>
    public static ExitCode Write(
        Specification specification, LotResult result, bool json, bool quiet, Terminal terminal, CancellationToken cancellation)
    {
        if (result.LotsMade < 2)
        {
            terminal.Error.WriteLine("bandspec: stopped before two lots were made; there is nothing to report");
            return ExitCode.AnswerIsNo;
        }
        LotReport report = LotReport.Of(specification, result);
        LeavingProbability leaving = LeavingProbability.Of(specification, result.Order.Seed, TryRun.RelativeError, TryRun.MostDraws, cancellation);
        if (json)
            terminal.Out.Write(System.Text.Encoding.UTF8.GetString(LotReportJson.Write(specification, report, leaving).Span));
        else if (!quiet)
            terminal.Out.Write(LotScreen.Of(specification, report, leaving, terminal.Ink));
        return report.IsComplete ? ExitCode.Done : ExitCode.AnswerIsNo;
    }
}
