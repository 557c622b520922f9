using System.CommandLine;
using System.CommandLine.Help;
using System.CommandLine.Invocation;

namespace BandSpec.Cli.Printing;

/// <summary>The help of a command, followed by examples that can be copied and by what the exit code says.</summary>
internal sealed class TeachingHelp(HelpAction plain, Ink ink) : SynchronousCommandLineAction
{
    public override int Invoke(ParseResult parseResult)
    {
        TextWriter output = parseResult.InvocationConfiguration.Output;
        int code = plain.Invoke(parseResult);
        if (parseResult.CommandResult.Command is TaughtCommand taught)
            Write(output, "Examples:", taught.Examples);
        else
            Write(output, "A first round:", [
                ("bandspec new pump.yaml", "a requirement to fill in, every key explained"),
                ("bandspec check pump.yaml", "everything that is wrong with it, in one go"),
                ("bandspec draft pump.yaml", "the specification package, in out/")]);
        Write(output, "Exit codes:", [
            ("0", "done"),
            ("1", "done, and the answer is no: no plan fits, a decision rule cannot be met, limits differ, a package does not verify, a lot falls short; or it was stopped by Ctrl-C"),
            ("2", "findings in the input; nothing is written"),
            ("3", "a fault of the program or of the disk")]);
        return code;
    }

    private void Write(TextWriter output, string heading, IReadOnlyList<(string Text, string Meaning)> lines)
    {
        int width = lines.Max(line => line.Text.Length) + 2;
        output.WriteLine(heading);
        foreach ((string text, string meaning) in lines)
            output.WriteLine($"  {ink.Blue(text)}{new string(' ', width - text.Length)}{meaning}");
        output.WriteLine();
    }
}

/// <summary>A command with examples for its help.</summary>
internal sealed class TaughtCommand(string name, string description, params IReadOnlyList<(string Text, string Meaning)> examples)
    : Command(name, description)
{
    /// <summary>Command lines and what they do.</summary>
    public IReadOnlyList<(string Text, string Meaning)> Examples { get; } = examples;
}
