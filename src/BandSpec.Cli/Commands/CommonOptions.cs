using System.CommandLine;

namespace BandSpec.Cli.Commands;

/// <summary>Arguments and options that several commands have.</summary>
internal static class CommonOptions
{
    /// <summary>One or more requirement files.</summary>
    public static Argument<string[]> Files() => new("FILE")
    {
        Description = "Requirement files; platform and station are found from there.", Arity = ArgumentArity.OneOrMore,
    };

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
