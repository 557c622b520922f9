using System.Text.Json;
using BandSpec.Files.Inputs;
using BandSpec.Files.Json;

namespace BandSpec.Cli.Printing;

/// <summary>Findings in the form that code hosting shows at their lines: SARIF 2.1.0 (OASIS, 2020), one result a finding.</summary>
internal static class FindingSarif
{
    private const string Schema = "https://docs.oasis-open.org/sarif/sarif/v2.1.0/errata01/os/schemas/sarif-schema-2.1.0.json";

    /// <summary>The whole log.</summary>
    public static ReadOnlyMemory<byte> Of(IEnumerable<PlacedFinding> findings)
    {
        PlacedFinding[] all = [.. findings.Distinct()];
        string[] rules = [.. all.Select(placed => placed.Finding.Rule).Distinct().Order(StringComparer.Ordinal)];
        return JsonFile.Of(json =>
        {
            json.WriteString("$schema", Schema);
            json.WriteString("version", "2.1.0");
            json.Objects("runs", [all], (run, _) =>
            {
                run.Object("tool", tool => tool.Object("driver", driver =>
                {
                    driver.WriteString("name", CommandLine.Program.Split(' ')[0]);
                    driver.WriteString("version", CommandLine.Program.Split(' ')[^1]);
                    driver.Objects("rules", rules, (rule, id) => rule.WriteString("id", id));
                }));
                run.WriteString("columnKind", "utf16CodeUnits");
                run.Objects("results", all, (result, placed) => WriteResult(result, placed, Array.IndexOf(rules, placed.Finding.Rule)));
            });
        });
    }

    private static void WriteResult(Utf8JsonWriter json, PlacedFinding placed, int rule)
    {
        json.WriteString("ruleId", placed.Finding.Rule);
        json.WriteNumber("ruleIndex", rule);
        json.WriteString("level", "error");
        json.Object("message", message => message.WriteString("text", TextOf(placed)));
        json.Objects("locations", [placed.Place], (location, place) =>
        {
            location.Object("physicalLocation", physical =>
            {
                physical.Object("artifactLocation", artifact => artifact.WriteString("uri", UriOf(place.File)));
                physical.Object("region", region =>
                {
                    region.WriteNumber("startLine", place.Line);
                    region.WriteNumber("startColumn", place.Column);
                    region.WriteNumber("endColumn", place.Column + place.Length);
                });
            });
            if (placed.Finding.Field.Path.Length > 0)
                location.Objects("logicalLocations", [placed.Finding.Field.Path], (logical, path) => logical.WriteString("fullyQualifiedName", path));
        });
    }

    /// <summary>A finding as one sentence after the other.</summary>
    internal static string TextOf(PlacedFinding placed)
    {
        string nearest = placed.Finding.Nearest is { } word ? $" Did you mean `{word}`?" : "";
        return $"{placed.Finding.Found}. Accepted: {placed.Finding.Accepted}.{nearest}";
    }

    /// <summary>A path as a reference: relative as it was named, with whatever a URI does not take written in percent.</summary>
    private static string UriOf(string file)
    {
        string path = file.Replace('\\', '/');
        return Path.IsPathRooted(file)
            ? new Uri(Path.GetFullPath(file)).AbsoluteUri
            : string.Join('/', path.Split('/').Select(Uri.EscapeDataString));
    }
}
