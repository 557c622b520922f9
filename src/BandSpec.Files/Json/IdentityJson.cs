using System.Text.Json;
using BandSpec.Core.Requirements;

namespace BandSpec.Files.Json;

/// <summary>The member that says which specification a document belongs to.</summary>
internal static class IdentityJson
{
    /// <summary>Writes <c>specification</c>.</summary>
    internal static void Identity(this Utf8JsonWriter json, SpecificationIdentity identity) => json.Object("specification", s =>
    {
        s.WriteString("number", identity.Number);
        s.WriteString("revision", identity.Revision);
        s.WriteString("title", identity.Title);
        s.WriteString("customer", identity.Customer);
        s.WriteString("date", identity.Date.ToString("yyyy-MM-dd", null));
    });
}
