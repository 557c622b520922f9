using System.Text;
using System.Text.Json;
using BandSpec.Files.Inputs;
using BandSpec.Files.Json;

namespace BandSpec.Cli.Printing;

/// <summary>Findings for programs: one object a requirement, with every finding's place and facts.</summary>
internal static class FindingJson
{
    /// <summary>The whole document.</summary>
    public static string Of(IReadOnlyList<(string File, InputSet Set)> read) => Encoding.UTF8.GetString(JsonFile.Of(json =>
    {
        json.WriteString("format", "bandspec/findings/1");
        json.Objects("files", read, (one, file) =>
        {
            one.WriteString("file", file.File);
            one.WriteBoolean("valid", file.Set.Application is not null);
            one.Findings(file.Set.Findings);
        });
    }).Span);

    /// <summary>The member <c>findings</c>.</summary>
    public static void Findings(this Utf8JsonWriter json, IReadOnlyList<PlacedFinding> findings) =>
        json.Objects("findings", findings, (one, placed) =>
        {
            one.WriteString("file", placed.Place.File);
            one.WriteNumber("line", placed.Place.Line);
            one.WriteNumber("column", placed.Place.Column);
            one.WriteNumber("length", placed.Place.Length);
            one.WriteString("field", placed.Finding.Field.Path);
            one.WriteString("rule", placed.Finding.Rule);
            one.WriteString("found", placed.Finding.Found);
            one.WriteString("accepted", placed.Finding.Accepted);
            if (placed.Finding.Nearest is { } nearest)
                one.WriteString("nearest", nearest);
        });
}
