using System.CommandLine;
using BandSpec.Cli.Drafting;
using BandSpec.Documents;

namespace BandSpec.Cli.Commands;

/// <summary>The options of commands that write packages: where inputs, templates and packages are, and how documents look.</summary>
internal sealed class PackageOptions
{
    private readonly Option<string> output = new("--out")
    {
        Description = "Folder for the packages; `out` when left out.", DefaultValueFactory = _ => "out", HelpName = "DIR",
    };

    private readonly Option<string?> templates = new("--templates")
    {
        Description = "Folder of your own templates; otherwise `templates` in the project, if there is one.", HelpName = "DIR",
    };

    private readonly Option<string> language = new("--language")
    {
        Description = "Language of the documents.", DefaultValueFactory = _ => "en", HelpName = "en|de",
    };

    private readonly Option<Paper> paper = PaperOption.Create();
    private readonly Option<string?> root = CommonOptions.Root();
    private readonly Option<bool> diagnose = new("--diagnose")
    {
        Description = "Add what holds the margin and what each input's improvement buys; when no plan fits, what would make one fit is there anyway.",
    };

    /// <summary>Adds all of them to a command.</summary>
    public void AddTo(Command command)
    {
        foreach (Option option in new Option[] { output, templates, language, paper, root, diagnose })
            command.Add(option);
    }

    /// <summary>A run with what the command line says.</summary>
    public DraftRun RunOf(ParseResult parsed, Terminal terminal) => new(
        terminal, new DraftFolders(parsed.GetValue(output)!, parsed.GetValue(root), parsed.GetValue(templates)),
        new DocumentOptions { Program = CommandLine.Program, Language = parsed.GetValue(language)!, Paper = parsed.GetValue(paper) },
        parsed.GetValue(diagnose));
}
