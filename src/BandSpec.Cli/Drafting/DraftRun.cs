using BandSpec.Cli.Opening;
using BandSpec.Cli.Printing;
using BandSpec.Cli.Releasing;
using BandSpec.Cli.Storing;
using BandSpec.Core.Findings;
using BandSpec.Core.Requirements;
using BandSpec.Core.Specifying;
using BandSpec.Documents;
using BandSpec.Documents.Templates;
using BandSpec.Files.Inputs;
using BandSpec.Files.Json;
using BandSpec.Files.Releases;
using BandSpec.Files.Yaml;

namespace BandSpec.Cli.Drafting;

/// <summary>Folders of a run, as the user named them.</summary>
/// <param name="Out">For the packages.</param>
/// <param name="Root">The folder that inputs have to be in; null to find it.</param>
/// <param name="Templates">The folder of the user's templates; null for that of the project.</param>
internal sealed record DraftFolders(string Out, string? Root, string? Templates);

/// <summary>From one requirement to its package.</summary>
/// <param name="terminal">The folder that paths are counted from, and the clock.</param>
/// <param name="folders">Where inputs and templates are, and where packages go.</param>
/// <param name="look">Paper and language of the documents.</param>
/// <param name="isDiagnosed">Whether a diagnosis is asked for even when a plan fits.</param>
internal sealed class DraftRun(Terminal terminal, DraftFolders folders, DocumentOptions look, bool isDiagnosed)
{
    /// <summary>What is worked out beside a specification.</summary>
    public DraftExtras Extras => isDiagnosed ? DraftExtras.All : DraftExtras.Usual;

    /// <summary>Reads a requirement and what was released of it.</summary>
    public (InputSet Inputs, ReleaseRecord? Released) Read(string file)
    {
        InputSet inputs = ReleasedRevision.Check(
            InputFolder.Read(file, folders.Root, terminal.Folder), file, terminal.Folder, out ReleaseRecord? released);
        return (inputs, released);
    }

    /// <summary>Drafts a requirement that was read; only what differs from the package that is there is computed again.</summary>
    /// <param name="file">The requirement as the user named it.</param>
    /// <param name="inputs">What was read.</param>
    /// <param name="released">The release record up to this revision; null for a draft.</param>
    /// <param name="isWatched">Whether the search has the screen for itself and shows how far it is.</param>
    /// <param name="cancellation">Ends the search early.</param>
    public Draft Run(string file, InputSet inputs, ReleaseRecord? released, bool isWatched, CancellationToken cancellation)
    {
        if (inputs.Application is not { } application)
            return new Draft(file, DraftState.Refused, inputs);
        try
        {
            PackageSource source = SourceOf(file, inputs, released);
            Draft draft = new(file, DraftState.UpToDate, inputs) { Release = released?.Entries[^1] };
            PackageFolder folder = FolderOf(application);
            if (StoredPackage.Read(folder.FullPath) is { } stored && stored.IsOf(source) && stored.Verdict() is { } verdict)
                return draft with { Verdict = verdict, Package = new WrittenPackage(ShownFolder(application), stored.Names) };
            Specification specification = isWatched
                ? SearchBar.Over(
                    terminal, application.Requirement.Identity.FolderName, bar => SpecificationDraft.Draft(application, bar, Extras, cancellation))
                : SpecificationDraft.Draft(application, null, Extras, cancellation);
            IReadOnlyList<PackageFile> files = PackageContents.Of(specification, source);
            folder.Replace(files, terminal.Clock);
            return Written(draft, specification, files);
        }
        catch (TemplateException fault)
        {
            return new Draft(file, DraftState.Refused, inputs.Refused([Placed(fault)]));
        }
    }

    /// <summary>What the package of an application depends on.</summary>
    public PackageSource SourceOf(string file, InputSet inputs, ReleaseRecord? released)
    {
        HeldTemplates? templates = OwnTemplates(file) is { } own ? HeldTemplates.Of(own, look.Language) : null;
        return PackageSource.Of(inputs.Application!.Requirement.Identity, inputs.Sources, templates, look, released, isDiagnosed);
    }

    /// <summary>The folder of templates that a requirement's documents are drawn with; null for none.</summary>
    public string? TemplatesFor(string file) => OwnTemplates(file)?.FullPath;

    /// <summary>The folder of an application's package.</summary>
    public PackageFolder FolderOf(Application application) =>
        new(Path.GetFullPath(folders.Out, terminal.Folder), application.Requirement.Identity.FolderName);

    /// <summary>A draft whose package was written.</summary>
    public Draft Written(Draft draft, Specification specification, IReadOnlyList<PackageFile> files) => draft with
    {
        State = DraftState.Drafted,
        Specification = specification,
        Verdict = new Verdict(specification.Feasible, specification.Bands.Margin, specification.IsComplete),
        Package = new WrittenPackage(ShownFolder(specification.Application), [.. files.Select(file => file.Name)]),
    };

    /// <summary>A fault in a template, as a finding at its place.</summary>
    public static PlacedFinding Placed(TemplateException fault) => new(
        new Finding(new FieldPath(InputFile.Template, ""), "template", fault.Reason.TrimEnd('.'), "a template that can be carried out"),
        new Place(fault.File, fault.Line, fault.Column, 1, ""));

    private TemplateFolder? OwnTemplates(string file) => TemplateFolder.Find(folders.Templates, file, terminal.Folder);

    private string ShownFolder(Application application) => Path.Combine(folders.Out, application.Requirement.Identity.FolderName);
}
