using System.CommandLine;
using System.CommandLine.Parsing;
using BandSpec.Core.Findings;

namespace BandSpec.Cli.Commands;

/// <summary>Arguments and options that several commands have.</summary>
internal static class CommonOptions
{
    /// <summary>One or more requirement files.</summary>
    public static Argument<string[]> Files()
    {
        Argument<string[]> files = new("FILE")
        {
            Description = "Requirement files; platform and station are found from there.", Arity = ArgumentArity.OneOrMore,
        };
        files.Validators.Add(RefuseOptions);
        return files;
    }

    /// <summary>A misspelt option would otherwise be taken for a file; a file with such a name can be given as <c>./-name</c>.</summary>
    private static void RefuseOptions(ArgumentResult argument)
    {
        foreach (string option in argument.Tokens.Select(token => token.Value).Where(value => value.StartsWith('-')))
        {
            IEnumerable<string> known = argument.Parent is CommandResult { Command: { } command } ? command.Options.Select(o => o.Name) : [];
            string? nearest = Spelling.Nearest(option, known);
            argument.AddError($"there is no option `{option}`{(nearest is null ? "" : $"; did you mean `{nearest}`?")}");
        }
    }

    /// <summary>Output for machines.</summary>
    public static Option<bool> Json() => new("--json") { Description = "Write JSON to standard output, for programs." };

    /// <summary>No output but findings.</summary>
    public static Option<bool> Quiet() => new("--quiet", "-q") { Description = "Write nothing but findings and faults." };

    /// <summary>The folder that inputs have to be in.</summary>
    public static Option<string?> Root() => new("--root")
    {
        Description = "Folder that platform and station files have to be in; otherwise the folder with .git above the requirement, or the requirement's own.",
        HelpName = "DIR",
    };
}
