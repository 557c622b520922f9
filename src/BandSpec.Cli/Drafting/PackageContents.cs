using BandSpec.Core.Specifying;
using BandSpec.Files.Csv;
using BandSpec.Files.Inputs;
using BandSpec.Files.Json;

namespace BandSpec.Cli.Drafting;

/// <summary>The files of a package, ready to be written.</summary>
internal static class PackageContents
{
    /// <summary>All of them, the manifest last.</summary>
    public static IReadOnlyList<PackageFile> Of(Specification specification, IReadOnlyList<InputSource> inputs)
    {
        PackageFile[] files =
        [
            new("result.json", ResultJson.Write(specification)),
            new("limits.json", LimitsJson.Write(specification)),
            new("limits.csv", LimitsCsv.Write(specification)),
        ];
        ReadOnlyMemory<byte> manifest = ManifestJson.Write(specification.Application.Requirement.Identity, inputs, files, CommandLine.Program);
        return [.. files, new PackageFile("manifest.json", manifest)];
    }
}
