using System.CommandLine;
using System.Text;
using BandSpec.Cli.Judging;
using BandSpec.Cli.Printing;
using BandSpec.Core.LotJudging;
using BandSpec.Documents;
using BandSpec.Documents.Templates;
using BandSpec.Files.Json;

namespace BandSpec.Cli.Commands;

/// <summary><c>bandspec judge LIMITS READINGS…</c>: a lot held against its limits.</summary>
internal static class JudgeCommand
{
    /// <summary>The command.</summary>
    public static Command Create(Terminal terminal)
    {
        Argument<string> limits = new("LIMITS") { Description = "The limits.json of a specification package." };
        Argument<string[]> readings = new("READINGS")
        {
            Description = "Tables of readings as CSV or Parquet, one reading a line: serial, point (or temperature, pressure, direction), reading; lot or date if known.",
            Arity = ArgumentArity.OneOrMore,
        };
        Option<string?> output = new("--out") { Description = "Folder for the judgement; otherwise out/NUMBER-REVISION-judgement. Charts of an earlier judgement there are removed, other files stay.", HelpName = "DIR" };
        Option<bool> strict = new("--strict") { Description = "Refuse the readings when any line is at fault; otherwise such lines are told and left out." };
        Option<bool> proven = new("--proven") { Description = "Answer no, with exit code 1, unless every capability is proven and not only met." };
        LookOptions look = new();
        (Option<bool> json, Option<bool> quiet) = (CommonOptions.Json(), CommonOptions.Quiet());
        TaughtCommand command = new(
            "judge", "Holds the readings of a lot against limits: the capability at every point and of every derived figure, the verdict on each unit, and how many more units would prove what is only met.",
            ("bandspec judge out/HV-3107-A/limits.json lot.csv", "the judgement on screen and in out/HV-3107-A-judgement/"),
            ("bandspec judge limits.json week1.csv week2.csv --strict", "several files as one lot, no line may be at fault"),
            ("bandspec judge limits.json lot.csv --proven --quiet", "the judgement in its folder, nothing on screen; exit code 0 when all is proven"))
        {
            limits, readings, output, strict, proven, json, quiet,
        };
        look.AddTo(command);
        command.SetAction(parsed => (int)Run(
            JudgeRun.Run(parsed.GetRequiredValue(limits), parsed.GetRequiredValue(readings), terminal),
            new Wishes(parsed.GetValue(output), parsed.GetValue(strict), parsed.GetValue(proven), parsed.GetValue(json), parsed.GetValue(quiet),
                look.Of(parsed, parsed.GetRequiredValue(limits), terminal)), terminal));
        return command;
    }

    private sealed record Wishes(string? Out, bool Strict, bool Proven, bool Json, bool Quiet, DocumentOptions Look);

    private static ExitCode Run(Judgement judgement, Wishes wishes, Terminal terminal)
    {
        if (judgement.Judged is not { } judged)
        {
            terminal.Out.Write(FindingScreen.Of(judgement.Findings, terminal.Ink));
            return ExitCode.Findings;
        }

        if (wishes.Strict && judged.Faults.Total > 0)
        {
            terminal.Out.Write(JudgementScreen.FaultsOf(judged.Faults, isWritten: false, terminal.Ink));
            return ExitCode.Findings;
        }

        if (judged.Readings == 0 && judged.Faults.Total > 0)
        {
            terminal.Out.Write(JudgementScreen.FaultsOf(judged.Faults, isWritten: false, terminal.Ink));
            throw new RefusalException(
                $"no reading is one of {judged.Limits.Specification}, whose limits these are; its points are {PointsOf(judged)}; nothing was written", ExitCode.Findings);
        }

        string folder = wishes.Out ?? Path.Combine("out", $"{judged.Limits.Specification}-judgement");
        IReadOnlyList<string> files = Written(folder, judged, judgement, wishes.Look, terminal);
        if (wishes.Json)
            terminal.Out.Write(Encoding.UTF8.GetString(JudgementJson.Write(judged, judgement.Reports).Span));
        else if (!wishes.Quiet)
            terminal.Out.Write(JudgementScreen.Of(judged, judgement.Reports, folder, files, terminal.Ink));
        return (wishes.Proven ? judged.IsProven : judged.IsMet) ? ExitCode.Done : ExitCode.AnswerIsNo;
    }

    private static string PointsOf(LotJudgement judged)
    {
        const int told = 5;
        string[] names = [.. judged.Characteristics.Where(c => !c.IsDerived).Select(c => c.Name)];
        return string.Join(", ", names.Take(told)) + (names.Length > told ? $" and {names.Length - told} more" : "");
    }

    /// <summary>A mistake in the user's own words is the user's to mend, like a finding.</summary>
    private static IReadOnlyList<string> Written(string folder, LotJudgement judged, Judgement judgement, DocumentOptions look, Terminal terminal)
    {
        DateOnly today = DateOnly.FromDateTime(terminal.Clock.GetLocalNow().DateTime);
        try
        {
            return JudgementFolder.Write(Path.GetFullPath(folder, terminal.Folder), judged, judgement.Reports, today, look);
        }
        catch (TemplateException fault)
        {
            throw new RefusalException(fault.Message, ExitCode.Findings);
        }
    }
}
