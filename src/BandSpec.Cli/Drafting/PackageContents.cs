using BandSpec.Core.Specifying;
using BandSpec.Documents;
using BandSpec.Documents.Templates;
using BandSpec.Files.Csv;
using BandSpec.Files.Inputs;
using BandSpec.Files.Json;
using BandSpec.Files.Releases;

namespace BandSpec.Cli.Drafting;

/// <summary>The files of a package, ready to be written.</summary>
internal static class PackageContents
{
    /// <summary>All of them, the documents first and the manifest last.</summary>
    /// <param name="specification">The finished record.</param>
    /// <param name="source">What it was made from.</param>
    /// <exception cref="TemplateException">A template of the user's is at fault.</exception>
    public static IReadOnlyList<PackageFile> Of(Specification specification, PackageSource source)
    {
        PackageFile[] records =
        [
            new(PackageNames.Result, ResultJson.Write(specification)),
            new(PackageNames.Limits, LimitsJson.Write(specification)),
            new("limits.csv", LimitsCsv.Write(specification)),
        ];
        PackageFile[] documents =
            [.. SpecificationPackage.Draw(specification, Attached(source, records), source.Look).Select(drawn => new PackageFile(drawn.Name, drawn.Bytes))];
        PackageFile[] outputs = [.. documents, .. records];
        RefuseTwice(outputs, source);
        return [.. outputs, new PackageFile(PackageNames.Manifest, ManifestJson.Write(source.Identity, source.Making, source.Inputs, outputs))];
    }

    /// <summary>What the PDF carries, so that the whole package can be made again from it.</summary>
    private static SourceFile[] Attached(PackageSource source, PackageFile[] records)
    {
        ReadOnlyMemory<byte> provenance = ManifestJson.WriteProvenance(source.Identity, source.Making, source.Inputs);
        return
        [
            .. source.Inputs.Select(input => new SourceFile(
                input.AttachedAs, input.Kind == "template" ? "text/plain" : "application/yaml", $"The {input.Kind}", input.Kind != "template", input.Bytes)),
            .. records.Select(record => new SourceFile(record.Name, MediaType(record.Name), "A record of figures", IsInput: false, record.Bytes)),
            new SourceFile(CarriedInputs.ProvenanceName, "application/json", "How the document was made", IsInput: false, provenance),
            .. source.Released is { } released
                ? [new SourceFile(ReleaseRecord.FileName, "application/jsonl", "The release record", IsInput: false, released.ToBytes())]
                : Array.Empty<SourceFile>(),
        ];
    }

    /// <summary>A layout of the user's is named after what it writes; that must not be another file of the package.</summary>
    private static void RefuseTwice(PackageFile[] outputs, PackageSource source)
    {
        string? twice = outputs.Select(output => output.Name).Append(PackageNames.Manifest)
            .GroupBy(name => name, StringComparer.OrdinalIgnoreCase).FirstOrDefault(same => same.Count() > 1)?.Key;
        if (twice is not null)
            throw new TemplateException($"{source.Look.Templates?.Name}/limits/{twice}.scriban", 1, 1, $"The package has another file named {twice}.");
    }

    private static string MediaType(string name) => name.EndsWith(".csv", StringComparison.Ordinal) ? "text/csv" : "application/json";
}
