using System.CommandLine;
using System.Text;
using BandSpec.Cli.Printing;
using BandSpec.Core.Findings;
using BandSpec.Files.Schemas;

namespace BandSpec.Cli.Commands;

/// <summary><c>bandspec schema KIND</c>: the JSON Schema of a file, for editors and other programs.</summary>
internal static class SchemaCommand
{
    private static readonly (string Kind, Func<ReadOnlyMemory<byte>> Write)[] Kinds =
    [
        ("requirement", () => InputSchemas.Write(InputFile.Requirement)),
        ("platform", () => InputSchemas.Write(InputFile.Platform)),
        ("station", () => InputSchemas.Write(InputFile.Station)),
        ("result", () => OutputSchemas.Result),
        ("limits", () => OutputSchemas.Limits),
        ("judgement", () => OutputSchemas.Judgement),
    ];

    /// <summary>The command.</summary>
    public static Command Create(Terminal terminal)
    {
        Argument<string> kind = new("KIND") { Description = "Which file: requirement, platform, station, result, limits or judgement." };
        kind.AcceptOnlyFromAmong([.. Kinds.Select(known => known.Kind)]);
        TaughtCommand command = new(
            "schema", "Writes the JSON Schema of an input or output file to standard output.",
            ("bandspec schema requirement > requirement.schema.json", "then name it in the first line of a requirement, and an"),
            ("# yaml-language-server: $schema=requirement.schema.json", "editor with a YAML server completes and checks while typing"))
        {
            kind,
        };
        command.SetAction(parsed =>
        {
            string wanted = parsed.GetRequiredValue(kind);
            terminal.Out.Write(Encoding.UTF8.GetString(Kinds.First(known => known.Kind == wanted).Write().Span));
            return (int)ExitCode.Done;
        });
        return command;
    }
}
