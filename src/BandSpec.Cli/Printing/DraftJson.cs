using System.Text;
using System.Text.Json;
using BandSpec.Cli.Drafting;
using BandSpec.Core.Requirements;
using BandSpec.Files.Json;

namespace BandSpec.Cli.Printing;

/// <summary>What came of drafts, for programs; everything else about each stands in its package.</summary>
internal static class DraftJson
{
    /// <summary>The whole document.</summary>
    public static string Of(IReadOnlyList<Draft> drafts) => Encoding.UTF8.GetString(JsonFile.Of(json =>
    {
        json.WriteString("format", "bandspec/drafts/1");
        json.Objects("files", drafts, Write);
    }).Span);

    private static void Write(Utf8JsonWriter json, Draft draft)
    {
        json.WriteString("file", draft.File);
        json.WriteBoolean("valid", draft.Specification is not null);
        if (draft is { Specification: { } specification, Package: { } package })
        {
            SpecificationIdentity identity = specification.Application.Requirement.Identity;
            json.WriteString("number", identity.Number);
            json.WriteString("revision", identity.Revision);
            json.WriteBoolean("feasible", specification.Feasible);
            json.Figure("margin", specification.Bands.Margin);
            json.WriteString("folder", package.Folder);
            json.WriteStartArray("package");
            foreach (string file in package.Files)
                json.WriteStringValue(file);
            json.WriteEndArray();
        }
        json.Findings(draft.Inputs.Findings);
    }
}
