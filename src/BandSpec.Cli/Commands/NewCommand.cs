using System.CommandLine;
using System.Reflection;
using BandSpec.Cli.Printing;
using BandSpec.Cli.Storing;

namespace BandSpec.Cli.Commands;

/// <summary><c>bandspec new FILE</c>: a file to fill in, every key explained.</summary>
internal static class NewCommand
{
    /// <summary>The command.</summary>
    public static Command Create(Terminal terminal)
    {
        Argument<string> file = new("FILE") { Description = "The file to write; it must not exist yet." };
        Option<string> kind = new("--kind")
        {
            Description = "What to write: requirement, platform or station.", DefaultValueFactory = _ => "requirement", HelpName = "KIND",
        };
        kind.AcceptOnlyFromAmong("requirement", "platform", "station");
        TaughtCommand command = new(
            "new", "Writes a commented file to start from: a requirement, a platform or a station.",
            ("bandspec new pump.yaml", "a requirement"),
            ("bandspec new platform.yaml --kind platform", "the platform that it names"),
            ("bandspec new station.yaml --kind station", "the station that it names"))
        {
            file, kind,
        };
        command.SetAction(parsed => (int)Run(parsed.GetRequiredValue(file), parsed.GetValue(kind)!, terminal));
        return command;
    }

    private static ExitCode Run(string file, string kind, Terminal terminal)
    {
        string path = Path.GetFullPath(file, terminal.Folder);
        if (File.Exists(path) || Directory.Exists(path))
        {
            terminal.Error.WriteLine($"bandspec: {file} exists already and was left as it is");
            return ExitCode.Findings;
        }

        using Stream starter = Assembly.GetExecutingAssembly().GetManifestResourceStream($"BandSpec.Cli.Starters.{kind}.yaml")
            ?? throw new InvalidOperationException($"the starter of a {kind} is built into the program");
        using MemoryStream text = new();
        starter.CopyTo(text);
        WholeFile.Write(path, text.ToArray());
        terminal.Out.WriteLine($"{terminal.Ink.Green(file)} is written; fill it in, then run {terminal.Ink.Blue($"bandspec check {file}")}");
        return ExitCode.Done;
    }
}
