using System.CommandLine;
using BandSpec.Cli.Drafting;

namespace BandSpec.Cli.Commands;

/// <summary>The options of commands that write packages: where inputs, templates and packages are, and how documents look.</summary>
internal sealed class PackageOptions
{
    private readonly Option<string> output = new("--out")
    {
        Description = "Folder for the packages; `out` when left out.", DefaultValueFactory = _ => "out", HelpName = "DIR",
    };

    private readonly LookOptions look = new();
    private readonly Option<string?> root = CommonOptions.Root();
    private readonly Option<bool> diagnose = new("--diagnose")
    {
        Description = "Add what holds the margin and what each input's improvement buys; when no plan fits, what would make one fit is there anyway.",
    };

    /// <summary>Adds all of them to a command.</summary>
    public void AddTo(Command command)
    {
        command.Add(output);
        look.AddTo(command);
        command.Add(root);
        command.Add(diagnose);
    }

    /// <summary>A run with what the command line says.</summary>
    public DraftRun RunOf(ParseResult parsed, Terminal terminal) => new(
        terminal, new DraftFolders(parsed.GetValue(output)!, parsed.GetValue(root), look.TemplatesIn(parsed)), look.Of(parsed), parsed.GetValue(diagnose));
}
