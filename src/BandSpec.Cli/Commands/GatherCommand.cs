using System.CommandLine;
using BandSpec.Cli.Printing;
using BandSpec.Cli.Trying;
using BandSpec.Core.Specifying;
using BandSpec.Core.VirtualLots;
using BandSpec.Files.Inputs;

namespace BandSpec.Cli.Commands;

/// <summary><c>bandspec gather PART…</c>: parts of an order of virtual lots put together, exactly.</summary>
internal static class GatherCommand
{
    /// <summary>The command.</summary>
    public static Command Create(Terminal terminal)
    {
        Argument<string[]> parts = new("PART") { Description = "Files that `bandspec try --part` wrote, in any order.", Arity = ArgumentArity.OneOrMore };
        (Option<bool> json, Option<bool> quiet) = (CommonOptions.Json(), CommonOptions.Quiet());
        TaughtCommand command = new(
            "gather", "Puts parts of virtual lots together: sums are added exactly, so that the parts equal one run bit for bit.",
            ("bandspec gather HV-3107-A.part-*.json", "the report of the whole order"),
            ("bandspec gather parts/*.json --json", "the same for programs"))
        {
            parts, json, quiet,
        };
        command.SetAction((parsed, cancellation) => Task.FromResult((int)Run(
            parsed.GetRequiredValue(parts), parsed.GetValue(json), parsed.GetValue(quiet), terminal, cancellation)));
        return command;
    }

    private static ExitCode Run(IReadOnlyList<string> files, bool json, bool quiet, Terminal terminal, CancellationToken cancellation)
    {
        PartShelf shelf = new(terminal);
        if (!shelf.Read(files))
            return ExitCode.Findings;
        InputSet inputs = shelf.Parts[0].ReadInputs();
        if (inputs.Application is not { } application)
        {
            terminal.Out.Write(FindingScreen.Of(inputs.Findings, terminal.Ink));
            return ExitCode.Findings;
        }
        Specification specification = SpecificationDraft.Draft(application, null, cancellation: cancellation);
        GatheredLots gathered = shelf.Gather(LotSubject.Of(specification));
        foreach (PartFinding finding in gathered.Findings)
            terminal.Error.WriteLine($"bandspec: {PartWords.Of(finding, files, shelf.Parts[0].Order)}");
        return gathered.Result is { } result
            ? LotAnswer.Write(specification, result, json, quiet, terminal, cancellation)
            : ExitCode.Findings;
    }
}
