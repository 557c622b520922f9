using BandSpec.Cli.Opening;
using BandSpec.Core.Requirements;
using BandSpec.Documents;
using BandSpec.Files.Inputs;
using BandSpec.Files.Json;
using BandSpec.Files.Releases;

namespace BandSpec.Cli.Drafting;

/// <summary>Everything that the bytes of a package depend on: the same source gives the same package.</summary>
/// <param name="Identity">The specification.</param>
/// <param name="Inputs">The files it is made from: requirement, platform, station, then the user's templates.</param>
/// <param name="Look">Paper, language, templates, and who released it.</param>
/// <param name="Released">The release record up to this revision; null for a draft.</param>
/// <param name="IsDiagnosed">Whether a diagnosis was asked for.</param>
internal sealed record PackageSource(
    SpecificationIdentity Identity, IReadOnlyList<ManifestInput> Inputs, DocumentOptions Look, ReleaseRecord? Released, bool IsDiagnosed)
{
    /// <summary>Names that a PDF gives to what it carries besides inputs.</summary>
    private static readonly string[] Taken =
        [PackageNames.Result, PackageNames.Limits, "limits.csv", CarriedInputs.ProvenanceName, ReleaseRecord.FileName];

    /// <summary>How the package is made, as its manifest says it.</summary>
    public PackageMaking Making => new(Look.Program, Look.Paper.ToString(), Look.Language, Look.Release?.Digest, IsDiagnosed);

    /// <summary>The source of an application's package.</summary>
    /// <param name="identity">The specification.</param>
    /// <param name="inputs">Requirement, platform and station.</param>
    /// <param name="templates">The user's templates, if there are any.</param>
    /// <param name="look">Paper and language.</param>
    /// <param name="released">The release record up to this revision; null for a draft.</param>
    /// <param name="isDiagnosed">Whether a diagnosis was asked for.</param>
    public static PackageSource Of(
        SpecificationIdentity identity, IReadOnlyList<InputSource> inputs, HeldTemplates? templates, DocumentOptions look, ReleaseRecord? released,
        bool isDiagnosed)
    {
        ChainedRelease? entry = released?.Entries[^1];
        ReleaseMark? mark = entry is null ? null : new ReleaseMark(entry.Release.By, entry.Release.At, entry.Digest);
        return new PackageSource(
            identity, [.. Named(inputs), .. templates?.Inputs ?? []], look with { Templates = templates, Release = mark }, released, isDiagnosed);
    }

    /// <summary>Inputs by their file names; where two files would share one, each input gets what it is before its name.</summary>
    private static ManifestInput[] Named(IReadOnlyList<InputSource> inputs)
    {
        string[] names = [.. inputs.Select(input => Path.GetFileName(input.Name)), .. Taken];
        bool isUnique = names.Distinct(StringComparer.OrdinalIgnoreCase).Count() == names.Length;
        return
        [
            .. from input in inputs
               let kind = input.Kind.ToString().ToLowerInvariant()
               let plain = Path.GetFileName(input.Name)
               let name = isUnique ? plain : $"{kind}-{plain}"
               select new ManifestInput(kind, name, name, input.Bytes),
        ];
    }
}
