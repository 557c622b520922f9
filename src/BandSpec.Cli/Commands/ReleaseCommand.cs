using System.CommandLine;
using BandSpec.Cli.Drafting;
using BandSpec.Cli.Printing;
using BandSpec.Cli.Releasing;
using BandSpec.Core.Revisions;
using BandSpec.Documents.Fonts;
using BandSpec.Files.Releases;

namespace BandSpec.Cli.Commands;

/// <summary><c>bandspec release FILE --by NAME</c>: freezes a revision.</summary>
internal static class ReleaseCommand
{
    /// <summary>The command.</summary>
    public static Command Create(Terminal terminal)
    {
        Argument<string> file = new("FILE") { Description = "The requirement whose revision is released." };
        Option<string> by = new("--by") { Description = "Who releases it, as documents show it.", Required = true, HelpName = "NAME" };
        by.Validators.Add(result =>
        {
            string name = result.GetValueOrDefault<string>() ?? "";
            if (!ReleaseRules.IsName(name))
                result.AddError("--by takes a name on one line, of at most 100 letters");
            else if (Letters.Missing(name) is { Count: > 0 } missing)
                result.AddError($"no font of the documents has {string.Join(", ", missing)} in the name after --by");
        });
        PackageOptions package = new();
        TaughtCommand command = new(
            "release", $"Freezes a revision: its package says RELEASED with who and when, and {ReleaseRecord.FileName} beside the requirement keeps the digests of its inputs. From then on the same number and revision cannot be drafted with other content.",
            ("bandspec release pump.yaml --by \"Ylva Berg\"", "release what pump.yaml describes"),
            ("bandspec verify out/HV-3107-A", "prove a package, whenever and wherever"))
        {
            file, by,
        };
        package.AddTo(command);
        command.SetAction((parsed, cancellation) => Task.FromResult((int)Run(
            new ReleaseRun(terminal, package.RunOf(parsed, terminal), parsed.GetRequiredValue(by)).Release(parsed.GetRequiredValue(file), cancellation), terminal)));
        return command;
    }

    private static ExitCode Run(Draft draft, Terminal terminal)
    {
        if (draft is not { Release: { } entry, Specification: { } specification, Package: { } package })
        {
            terminal.Out.Write(FindingScreen.Of(draft.Findings, terminal.Ink));
            return ExitCode.Findings;
        }

        terminal.Out.Write(DraftScreen.Of(specification, package, terminal.Ink));
        terminal.Out.WriteLine($"{terminal.Ink.Green("RELEASED")} by {entry.Release.By}; commit {ReleaseFile.NameFor(draft.File)} with the requirement");
        return ExitCode.Done;
    }
}
