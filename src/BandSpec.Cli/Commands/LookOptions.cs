using System.CommandLine;
using BandSpec.Cli.Opening;
using BandSpec.Documents;

namespace BandSpec.Cli.Commands;

/// <summary>The options of how documents look: templates, language and paper.</summary>
internal sealed class LookOptions
{
    private readonly Option<string?> templates = new("--templates")
    {
        Description = "Folder of your own templates; otherwise `templates` in the project, if there is one.", HelpName = "DIR",
    };

    private readonly Option<string> language = new("--language")
    {
        Description = "Language of the documents.", DefaultValueFactory = _ => "en", HelpName = "en|de",
    };

    private readonly Option<Paper> paper = PaperOption.Create();

    /// <summary>Adds all of them to a command.</summary>
    public void AddTo(Command command)
    {
        foreach (Option option in new Option[] { templates, language, paper })
            command.Add(option);
    }

    /// <summary>The folder of templates that was named; null for that of the project.</summary>
    public string? TemplatesIn(ParseResult parsed) => parsed.GetValue(templates);

    /// <summary>The look that was asked for, templates aside.</summary>
    public DocumentOptions Of(ParseResult parsed) =>
        new() { Program = CommandLine.Program, Language = parsed.GetValue(language)!, Paper = parsed.GetValue(paper) };

    /// <summary>The look that was asked for, with the templates for a file.</summary>
    public DocumentOptions Of(ParseResult parsed, string file, Terminal terminal) =>
        Of(parsed) with { Templates = TemplateFolder.Find(TemplatesIn(parsed), file, terminal.Folder) };
}
