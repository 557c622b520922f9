using System.Text.Json;
using BandSpec.Cli.Opening;

namespace BandSpec.Cli.Storing;

/// <summary>The names of the files that a package's manifest lists.</summary>
internal static class ManifestNames
{
    /// <summary>The names, the manifest's own included; none when there is no manifest or it cannot be read.</summary>
    public static HashSet<string> In(string manifest)
    {
        try
        {
            using JsonDocument document = JsonDocument.Parse(BoundedFile.Read(manifest));
            return [.. document.RootElement.GetProperty("outputs").EnumerateArray().Select(file => file.GetProperty("name").GetString()!), "manifest.json"];
        }
        catch (Exception unreadable) when (unreadable is IOException or JsonException or InvalidOperationException or KeyNotFoundException)
        {
            return [];
        }
    }
}
