using BandSpec.Core.Findings;
using BandSpec.Core.Requirements;

namespace BandSpec.Files.Inputs;

/// <summary>Reads a platform by itself, without a requirement that names it.</summary>
public static class PlatformReading
{
    /// <summary>Reads the file and checks its own rules; the platform is <see langword="null"/> exactly when there are findings.</summary>
    /// <param name="content">The file.</param>
    public static (Platform? Platform, IReadOnlyList<PlacedFinding> Findings) Read(InputContent content)
    {
        ArgumentNullException.ThrowIfNull(content);
        OpenedFile file = OpenedFile.Open(InputFile.Platform, content);
        PlatformParts parts = file.Read(PlatformForm.Form, null) ?? new PlatformParts();
        foreach (Finding finding in Application.FindingsIn(new RequirementParts(), parts, new StationParts()))
            file.Place(finding);
        IReadOnlyList<PlacedFinding> findings = [.. file.PlacedFindings()];
        return (findings.Count == 0 ? PlatformForm.Whole(parts) : null, findings);
    }
}
