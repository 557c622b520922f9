using BandSpec.Core.Findings;
using BandSpec.Files.Forms;
using BandSpec.Files.Inputs;
using BandSpec.Files.Json;

namespace BandSpec.Files.Schemas;

/// <summary>
/// JSON Schemas (draft 2020-12) of the input files, for editors that complete and check while typing. They are written from the same forms that
/// the files are read by, so that they know the same keys and the same texts; what depends on more than one value is judged by the rules alone.
/// </summary>
public static class InputSchemas
{
    /// <summary>The bytes of one file's schema.</summary>
    public static ReadOnlyMemory<byte> Write(InputFile kind)
    {
        (Form form, string title) = kind switch
        {
            InputFile.Requirement => ((Form)RequirementForm.Form, "A customer's application for a pressure transmitter and what is promised for it"),
            InputFile.Platform => (PlatformForm.Form, "What a sensor family can do before compensation, as statistics over production"),
            _ => (StationForm.Form, "What a production line can do"),
        };
        string name = kind.ToString().ToLowerInvariant();
        return JsonFile.Of(schema =>
        {
            schema.WriteString("$schema", "https://json-schema.org/draft/2020-12/schema");
            schema.WriteString("$id", $"urn:bandspec:{name}:1");
            schema.WriteString("title", title);
            form.Describe(schema);
        });
    }
}
