using BandSpec.Cli.Drafting;
using BandSpec.Cli.Opening;
using BandSpec.Core.Requirements;
using BandSpec.Core.Revisions;
using BandSpec.Core.Specifying;
using BandSpec.Documents;
using BandSpec.Documents.Fonts;
using BandSpec.Documents.Templates;
using BandSpec.Files.Inputs;
using BandSpec.Files.Json;
using BandSpec.Files.Releases;

namespace BandSpec.Cli.Verifying;

/// <summary>What a specification's PDF carries, and the package made from it once more.</summary>
internal sealed class CarriedPackage
{
    private readonly string name;
    private readonly IReadOnlyDictionary<string, ReadOnlyMemory<byte>> files;
    private readonly CarriedInputs inputs;

    private CarriedPackage(string name, IReadOnlyDictionary<string, ReadOnlyMemory<byte>> files, CarriedInputs inputs) =>
        (this.name, this.files, this.inputs) = (name, files, inputs);

    /// <summary>How the PDF says that it was made.</summary>
    public Manifest Provenance => inputs.Provenance;

    /// <summary>What a PDF carries; null when it is not the PDF of a specification.</summary>
    /// <param name="name">The PDF as the user named it.</param>
    /// <param name="pdf">Its bytes.</param>
    /// <exception cref="RefusalException">What it packs would unpack to more than any specification does.</exception>
    public static CarriedPackage? Of(string name, ReadOnlyMemory<byte> pdf)
    {
        try
        {
            Dictionary<string, ReadOnlyMemory<byte>> files =
                SpecificationFile.Attachments(pdf).DistinctBy(file => file.Name).ToDictionary(file => file.Name, file => file.Bytes);
            return CarriedInputs.Of(name, files) is { } inputs ? new CarriedPackage(name, files, inputs) : null;
        }
        catch (InvalidDataException)
        {
            return null;
        }
        catch (IOException tooLarge)
        {
            throw new RefusalException($"{name} cannot be read: {tooLarge.Message}", ExitCode.Findings);
        }
    }

    /// <summary>Whether the draft was stopped before its proof: what it found by then depends on when that was, and cannot be found again.</summary>
    public bool WasStopped =>
        files.TryGetValue(PackageNames.Result, out ReadOnlyMemory<byte> result) && Verdict.Read(result) is { Proven: false };

    /// <summary>The release record that it carries; null for a draft, or when the chain is broken.</summary>
    public ReleaseRecord? Record() =>
        files.TryGetValue(ReleaseRecord.FileName, out ReadOnlyMemory<byte> bytes) ? ReleaseRecord.Read(InputContent.Of(name, bytes), out _) : null;

    /// <summary>The package made once more from the carried inputs, the same way; null with a reason when that cannot be done.</summary>
    public IReadOnlyList<PackageFile>? MakeAgain(ReleaseRecord? released, CancellationToken cancellation, out string? reason)
    {
        reason = null;
        InputSet set = inputs.Read(Letters.Missing);
        if (set.Application is not { } application)
            reason = $"the inputs that it carries have findings: {set.Findings[0].Finding.Found}";
        else if (!Enum.TryParse(Provenance.Making.Paper, out Paper paper))
            reason = $"there is no paper {Provenance.Making.Paper}";
        else
            return MakeAgain(set, paper, released, Solve(application, cancellation), out reason);
        return null;
    }

    private Specification Solve(Application application, CancellationToken cancellation)
    {
        DraftExtras extras = Provenance.Making.Diagnosed ? DraftExtras.All : DraftExtras.Usual;
        Specification specification = SpecificationDraft.Draft(application, null, extras, cancellation);
        cancellation.ThrowIfCancellationRequested();
        return specification;
    }

    private IReadOnlyList<PackageFile>? MakeAgain(
        InputSet set, Paper paper, ReleaseRecord? released, Specification specification, out string? reason)
    {
        try
        {
            reason = null;
            DocumentOptions look = new() { Program = CommandLine.Program, Language = Provenance.Making.Language, Paper = paper };
            IReadOnlyDictionary<string, ReadOnlyMemory<byte>> carried = inputs.Templates();
            HeldTemplates? templates = carried.Count == 0 ? null : HeldTemplates.Of(name, carried);
            return PackageContents.Of(
                specification, PackageSource.Of(specification.Application.Requirement.Identity, set.Sources, templates, look, released, Provenance.Making.Diagnosed));
        }
        catch (Exception refused) when (refused is TemplateException or MissingLetterException)
        {
            reason = $"it cannot be drawn again: {refused.Message}";
            return null;
        }
    }

    /// <summary>What keeps a release from being that of the carried inputs.</summary>
    public string? FaultOf(ChainedRelease entry)
    {
        InputSet set = inputs.Read();
        string folder = $"{entry.Release.Number}-{entry.Release.Revision}";
        return folder != Provenance.FolderName ? $"the release is that of {folder}"
            : set.Application is null ? "the inputs that it carries have findings"
            : ReleaseRules.ChangesSince(set.Application.Requirement.Identity, Releasing.ReleasedRevision.Digests(set), [entry.Release]) is [var change, ..] ? change.Found
            : null;
    }
}
