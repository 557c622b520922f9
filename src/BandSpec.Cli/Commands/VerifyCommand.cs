using System.CommandLine;
using System.Text;
using BandSpec.Cli.Printing;
using BandSpec.Cli.Verifying;
using BandSpec.Files.Json;

namespace BandSpec.Cli.Commands;

/// <summary><c>bandspec verify FOLDER|PDF</c>: proves that a package is what its inputs give, and what was released.</summary>
internal static class VerifyCommand
{
    /// <summary>The command.</summary>
    public static Command Create(Terminal terminal)
    {
        Argument<string> package = new("PACKAGE") { Description = "A package folder, or a specification's PDF alone." };
        Option<string?> record = new("--record")
        {
            Description = "Also hold it against this release record, the releases.json of the requirement's folder.", HelpName = "FILE",
        };
        (Option<bool> json, Option<bool> quiet) = (CommonOptions.Json(), CommonOptions.Quiet());
        TaughtCommand command = new(
            "verify", "Computes and draws everything again from the inputs that a specification's PDF carries, compares every byte, and follows the chain of releases. Exit code 1 when anything differs.",
            ("bandspec verify out/HV-3107-A", "a whole package"),
            ("bandspec verify specification.pdf", "the document alone, wherever it was found"),
            ("bandspec verify out/HV-3107-A --record requirements/releases.json", "and that the release is still on record"))
        {
            package, record, json, quiet,
        };
        command.SetAction((parsed, cancellation) => Task.FromResult((int)Run(
            new PackageVerification(parsed.GetRequiredValue(package), parsed.GetValue(record), terminal.Folder).Run(cancellation),
            parsed.GetValue(json), parsed.GetValue(quiet), terminal)));
        return command;
    }

    private static ExitCode Run(Verification verification, bool json, bool quiet, Terminal terminal)
    {
        if (json)
            terminal.Out.Write(JsonOf(verification));
        else
            WriteScreen(verification, quiet, terminal);
        return verification.Holds ? ExitCode.Done : ExitCode.AnswerIsNo;
    }

    private static void WriteScreen(Verification verification, bool quiet, Terminal terminal)
    {
        foreach (VerifiedPart part in verification.Parts.Where(part => part.Fault is not null || !quiet))
            terminal.Out.WriteLine(part.Fault is null ? $"{terminal.Ink.Green("same")}    {part.What}" : $"{terminal.Ink.Red("DIFFERS")} {part.What}: {part.Fault}");
        if (quiet)
            return;
        string standing = verification.Manifest?.Making.ReleaseDigest is null ? "a draft" : "a release";
        terminal.Out.WriteLine(verification.Holds
            ? $"{terminal.Ink.Green("verified")}: {verification.Name} is {standing}, and what its inputs give"
            : $"{terminal.Ink.Red("not verified")}: {verification.Name}");
    }

    private static string JsonOf(Verification verification) => Encoding.UTF8.GetString(JsonFile.Of(json =>
    {
        json.WriteString("format", "bandspec/verification/1");
        json.WriteString("package", verification.Name);
        json.WriteBoolean("verified", verification.Holds);
        json.WriteBoolean("released", verification.Manifest?.Making.ReleaseDigest is not null);
        json.Objects("parts", verification.Parts, (one, part) =>
        {
            one.WriteString("part", part.What);
            one.WriteBoolean("same", part.Fault is null);
            if (part.Fault is { } fault)
                one.WriteString("fault", fault);
        });
    }).Span);
}
