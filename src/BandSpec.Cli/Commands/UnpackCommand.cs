using System.CommandLine;
using BandSpec.Cli.Opening;
using BandSpec.Cli.Printing;
using BandSpec.Cli.Storing;
using BandSpec.Documents;

namespace BandSpec.Cli.Commands;

/// <summary><c>bandspec unpack FILE</c>: the files that a specification's PDF carries, byte for byte.</summary>
internal static class UnpackCommand
{
    /// <summary>The command.</summary>
    public static Command Create(Terminal terminal)
    {
        Argument<string> file = new("FILE") { Description = "A specification as PDF." };
        Option<string?> output = new("--out")
        {
            Description = "Folder for the files; it must not exist yet. The PDF's name without its ending when left out.", HelpName = "DIR",
        };
        TaughtCommand command = new(
            "unpack", "Takes the inputs, results and limits out of a specification's PDF, byte for byte.",
            ("bandspec unpack specification.pdf", "its files in the folder specification/"),
            ("bandspec unpack archive/HV-3107-A.pdf --out rework", "in a folder of your choice"))
        {
            file, output,
        };
        command.SetAction(parsed => (int)Run(parsed.GetRequiredValue(file), parsed.GetValue(output), terminal));
        return command;
    }

    private static ExitCode Run(string file, string? output, Terminal terminal)
    {
        IReadOnlyList<DocumentFile> carried = Read(file, terminal);
        string shown = output ?? Path.ChangeExtension(file, null), folder = Path.GetFullPath(shown, terminal.Folder);
        if (carried.Count == 0)
            throw new RefusalException($"{file} carries no files", ExitCode.Findings);
        if (carried.FirstOrDefault(f => Path.GetFileName(f.Name) != f.Name || f.Name is "." or "..") is { } stray)
            throw new RefusalException($"{file} carries a file that would not stay in its folder, `{stray.Name}`; nothing was written", ExitCode.Findings);
        if (Path.Exists(folder))
            throw new RefusalException($"{shown} exists already and was left as it is; name another folder with --out", ExitCode.Findings);
        WholeFile.WriteInto(folder, carried);
        foreach (DocumentFile one in carried)
            terminal.Out.WriteLine(Path.Combine(shown, one.Name));

        return ExitCode.Done;
    }

    private static IReadOnlyList<DocumentFile> Read(string file, Terminal terminal)
    {
        try
        {
            return SpecificationFile.Attachments(BoundedFile.Read(Path.GetFullPath(file, terminal.Folder)));
        }
        catch (InvalidDataException)
        {
            throw new RefusalException($"{file} is not a PDF that can be read", ExitCode.Findings);
        }
        catch (Exception refused) when (refused is IOException or UnauthorizedAccessException)
        {
            throw new RefusalException($"{file} cannot be read: {refused.Message.TrimEnd('.')}", ExitCode.Findings);
        }
    }
}
