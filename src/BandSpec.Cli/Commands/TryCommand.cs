using System.CommandLine;
using BandSpec.Cli.Printing;
using BandSpec.Cli.Storing;
using BandSpec.Cli.Trying;
using BandSpec.Core.VirtualLots;
using BandSpec.Files.Json;

namespace BandSpec.Cli.Commands;

/// <summary><c>bandspec try FILE</c>: units made, tested and used one by one, as a witness beside the closed form.</summary>
internal static class TryCommand
{
    /// <summary>The command.</summary>
    public static Command Create(Terminal terminal)
    {
        TryOptions options = new();
        TaughtCommand command = new(
            "try", "Makes virtual lots of a requirement's units: draws, reads, compensates, tests, ages and uses them one by one, and holds the closed form against what they do.",
            ("bandspec try pump.yaml", "a million units; the same seed gives the same figures on every machine"),
            ("bandspec try pump.yaml --set station.soak-gradient=0.5", "what if the oven settled less well"),
            ("bandspec try pump.yaml --sweep safety-factor=1.0..1.5:0.1", "one line a value, with common chance"),
            ("bandspec try pump.yaml --sweep station.soak-gradient=0..1:0.1 --chart soak.svg", "the same as a chart"),
            ("bandspec try pump.yaml --units 1e9 --part 3/64", "one of 64 parts, for `bandspec gather`"));
        options.AddTo(command);
        command.SetAction((parsed, cancellation) => Task.FromResult((int)Checked(parsed, options, terminal, cancellation)));
        return command;
    }

    private static ExitCode Checked(ParseResult parsed, TryOptions options, Terminal terminal, CancellationToken cancellation)
    {
        try
        {
            TryRequest request = options.RequestOf(parsed);
            if (parsed.GetValue(options.Sweep) is { } sweep)
                return new SweepRun(request, Sweep.Parse(sweep), terminal).Run(parsed.GetValue(options.Chart), parsed.GetValue(options.Json), cancellation);
            if (parsed.GetValue(options.Chart) is not null)
                throw new FormatException("--chart draws a sweep; say what to sweep, such as --sweep safety-factor=1.0..1.5:0.1");
            return Run(request, parsed, options, terminal, cancellation);
        }
        catch (FormatException wrong)
        {
            terminal.Error.WriteLine($"bandspec: {wrong.Message}");
            return ExitCode.Findings;
        }
    }

    private static ExitCode Run(TryRequest request, ParseResult parsed, TryOptions options, Terminal terminal, CancellationToken cancellation)
    {
        Tried tried = new TryRun(terminal).Try(request, cancellation);
        if (tried is not { Specification: { } specification, Result: { } result })
        {
            terminal.Out.Write(FindingScreen.Of(tried.Inputs.Findings, terminal.Ink));
            return ExitCode.Findings;
        }
        string? file = parsed.GetValue(options.Out) ?? (request.Order.Parts > 1 ? PartName(specification.Application.Requirement.Identity.FolderName, request.Order) : null);
        if (file is not null)
            WholeFile.Write(
                Path.GetFullPath(file, terminal.Folder), LotPartJson.Write(result, specification.Application.Requirement.Identity, tried.Inputs.Sources));
        if (request.Order.Parts > 1)
        {
            if (!parsed.GetValue(options.Quiet))
                terminal.Out.WriteLine($"{file}: {result.UnitsMade:N0} units, part {request.Order.Part} of {request.Order.Parts}");
            return result.IsComplete ? ExitCode.Done : ExitCode.AnswerIsNo;
        }
        return LotAnswer.Write(specification, result, parsed.GetValue(options.Json), parsed.GetValue(options.Quiet), terminal, cancellation);
    }

    private static string PartName(string folder, LotOrder order) => $"{folder}.part-{order.Part}-of-{order.Parts}.json";
}
