using System.CommandLine;
using System.CommandLine.Help;
using System.CommandLine.Invocation;
using BandSpec.Cli.Commands;
using BandSpec.Cli.Printing;
using BandSpec.Cli.Storing;
using BandSpec.Core.Findings;
using BandSpec.Documents.Templates;

namespace BandSpec.Cli;

/// <summary>The program: reads the command line, runs the command, and turns whatever happens into an exit code.</summary>
internal static class CommandLine
{
    /// <summary>Name and version as documents show them.</summary>
    public static string Program { get; } = $"BandSpec {typeof(CommandLine).Assembly.GetName().Version!.ToString(3)}";

    /// <summary>Runs the program with its arguments; the exit code is one of <see cref="ExitCode"/>.</summary>
    public static int Run(IReadOnlyList<string> arguments, Terminal terminal)
    {
        try
        {
            // Whoever names no command wants to know which there are.
            ParseResult parsed = Build(terminal).Parse(arguments.Count == 0 ? ["--help"] : arguments);
            if (parsed.Errors.Count > 0 && parsed.Action is ParseErrorAction)
                return RefuseArguments(parsed, terminal);
            // Signals are our own matter: a command that was stopped still has to write what it found, however long that takes.
            InvocationConfiguration configuration = new()
            {
                Output = terminal.Out, Error = terminal.Error, EnableDefaultExceptionHandler = false, ProcessTerminationTimeout = null,
            };
            return parsed.Action is AsynchronousCommandLineAction
                ? parsed.InvokeAsync(configuration, terminal.Interruption()).GetAwaiter().GetResult()
                : parsed.Invoke(configuration);
        }
        catch (OperationCanceledException)
        {
            terminal.Error.WriteLine("bandspec: stopped; nothing was written");
            return (int)ExitCode.AnswerIsNo;
        }
        catch (TemplateException template)
        {
            terminal.Error.WriteLine(template.Message);
            return (int)ExitCode.Findings;
        }
        catch (RefusalException refusal)
        {
            terminal.Error.WriteLine($"bandspec: {refusal.Message}");
            return (int)refusal.Code;
        }
        catch (IOException closed) when (WritingFault.IsClosedPipe(closed))
        {
            // Whoever read the output has seen enough.
            return (int)ExitCode.Fault;
        }
        catch (Exception refused) when (WritingFault.IsOfDisk(refused))
        {
            terminal.Error.WriteLine($"bandspec: {WritingFault.Refuse("the output", refused).Message}");
            return (int)ExitCode.Fault;
        }
        catch (Exception fault)
        {
            FaultReport.Write(fault, arguments, terminal);
            return (int)ExitCode.Fault;
        }
    }

    private static RootCommand Build(Terminal terminal)
    {
        RootCommand root = new(
            "Turns a customer's application for a pressure transmitter into a proven custom error-band specification: how wide the band has to be, "
            + "which compensation plan keeps it, how the error is shared out, and the limits to test against.");
        root.Add(DraftCommand.Create(terminal));
        root.Add(CheckCommand.Create(terminal));
        root.Add(TradeoffCommand.Create(terminal));
        root.Add(RulesCommand.Create(terminal));
        root.Add(CompareCommand.Create(terminal));
        root.Add(ReleaseCommand.Create(terminal));
        root.Add(VerifyCommand.Create(terminal));
        root.Add(UnpackCommand.Create(terminal));
        root.Add(JudgeCommand.Create(terminal));
        root.Add(SampleCommand.Create(terminal));
        root.Add(NewCommand.Create(terminal));
        root.Add(TryCommand.Create(terminal));
        root.Add(GatherCommand.Create(terminal));
        root.Add(SchemaCommand.Create(terminal));
        root.Add(CharacterizeCommand.Create(terminal));
        root.Add(AgeCommand.Create(terminal));
        HelpOption help = root.Options.OfType<HelpOption>().Single();
        help.Action = new TeachingHelp((HelpAction)help.Action!, terminal.Ink);
        return root;
    }

    private static int RefuseArguments(ParseResult parsed, Terminal terminal)
    {
        Command command = parsed.CommandResult.Command;
        string? unknown = command is RootCommand ? parsed.UnmatchedTokens.FirstOrDefault() : null;
        if (unknown is not null)
        {
            string? nearest = Spelling.Nearest(unknown, command.Subcommands.Select(known => known.Name));
            terminal.Error.WriteLine($"bandspec: there is no command `{unknown}`{(nearest is null ? "" : $"; did you mean `{nearest}`?")}");
        }
        else
        {
            foreach (string message in parsed.Errors.Select(error => error.Message).Distinct())
                terminal.Error.WriteLine($"bandspec: {message}");
        }
        terminal.Error.WriteLine($"bandspec: see `bandspec {(command is RootCommand ? "" : $"{command.Name} ")}--help`");
        return (int)ExitCode.Findings;
    }
}
