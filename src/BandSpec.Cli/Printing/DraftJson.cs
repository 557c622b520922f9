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
        json.WriteBoolean("valid", draft.Verdict is not null);
        json.WriteString("state", StateOf(draft.State));
        if (draft.Note is { } note)
            json.WriteString("note", note);
        if (draft is { Verdict: { } verdict, Package: { } package, Inputs.Application: { } application })
        {
            SpecificationIdentity identity = application.Requirement.Identity;
            json.WriteString("number", identity.Number);
            json.WriteString("revision", identity.Revision);
            json.WriteBoolean("released", draft.Release is not null);
            json.WriteBoolean("feasible", verdict.Feasible);
            json.Figure("margin", verdict.Margin);
            json.WriteBoolean("proven", verdict.Proven);
            json.WriteString("folder", package.Folder);
            json.WriteStartArray("package");
            foreach (string file in package.Files)
                json.WriteStringValue(file);
            json.WriteEndArray();
        }
        json.Findings(draft.Findings);
    }

    private static string StateOf(DraftState state) => state switch
    {
        DraftState.UpToDate => "up-to-date",
        DraftState.LeftOut => "left-out",
        _ => state.ToString().ToLowerInvariant(),
    };
}
