using BandSpec.Cli.Opening;
using BandSpec.Core.Requirements;
using BandSpec.Core.Specifying;
using BandSpec.Documents;
using BandSpec.Files.Csv;
using BandSpec.Files.Inputs;
using BandSpec.Files.Json;

namespace BandSpec.Cli.Drafting;

/// <summary>The files of a package, ready to be written.</summary>
internal static class PackageContents
{
    /// <summary>All of them, the documents first and the manifest last.</summary>
    /// <param name="specification">The finished record.</param>
    /// <param name="inputs">The files it was made from.</param>
    /// <param name="templates">The user's templates, if there are any.</param>
    /// <param name="look">Paper and language.</param>
    public static IReadOnlyList<PackageFile> Of(
        Specification specification, IReadOnlyList<InputSource> inputs, TemplateFolder? templates, DocumentOptions look)
    {
        PackageFile[] records =
        [
            new("result.json", ResultJson.Write(specification)),
            new("limits.json", LimitsJson.Write(specification)),
            new("limits.csv", LimitsCsv.Write(specification)),
        ];
        IReadOnlyList<ManifestInput> named = Named(inputs);
        SourceFile[] attached =
        [
            .. named.Select(input => new SourceFile(input.Name, "application/yaml", $"The {input.Kind}", IsInput: true, input.Bytes)),
            .. records.Select(record => new SourceFile(record.Name, MediaType(record.Name), "A record of figures", IsInput: false, record.Bytes)),
        ];
        PackageFile[] documents =
            [.. SpecificationPackage.Draw(specification, attached, look with { Templates = templates }).Select(drawn => new PackageFile(drawn.Name, drawn.Bytes))];
        SpecificationIdentity identity = specification.Application.Requirement.Identity;
        ReadOnlyMemory<byte> manifest = ManifestJson.Write(
            identity, [.. named, .. templates?.Inputs ?? []], [.. documents, .. records], CommandLine.Program);
        return [.. documents, .. records, new PackageFile("manifest.json", manifest)];
    }

    /// <summary>Inputs by their file names; where two share one, each gets what it is before its name.</summary>
    private static ManifestInput[] Named(IReadOnlyList<InputSource> inputs)
    {
        bool isUnique = inputs.Select(input => Path.GetFileName(input.Name)).Distinct(StringComparer.OrdinalIgnoreCase).Count() == inputs.Count;
        return
        [
            .. from input in inputs
               let kind = input.Kind.ToString().ToLowerInvariant()
               let name = Path.GetFileName(input.Name)
               select new ManifestInput(kind, isUnique ? name : $"{kind}-{name}", input.Bytes),
        ];
    }

    private static string MediaType(string name) => name.EndsWith(".csv", StringComparison.Ordinal) ? "text/csv" : "application/json";
}
