using BandSpec.Cli.Opening;
using BandSpec.Cli.Printing;
using BandSpec.Cli.Storing;
using BandSpec.Core.Specifying;
using BandSpec.Documents;
using BandSpec.Files.Inputs;
using BandSpec.Files.Json;

namespace BandSpec.Cli.Drafting;

/// <summary>What came of one requirement.</summary>
/// <param name="File">The requirement as the user named it.</param>
/// <param name="Inputs">What was read, and the findings.</param>
/// <param name="Specification">The finished record; null when there are findings.</param>
/// <param name="Package">The package as it was written; null when there are findings.</param>
internal sealed record Draft(string File, InputSet Inputs, Specification? Specification, WrittenPackage? Package)
{
    /// <summary>What the exit code says about this requirement.</summary>
    public ExitCode ExitCode => Specification is null ? ExitCode.Findings : Specification.Feasible ? ExitCode.Done : ExitCode.AnswerIsNo;
}

/// <summary>A package on the disk.</summary>
/// <param name="Folder">Its folder as the user would name it.</param>
/// <param name="Files">The names of its files, in order.</param>
internal sealed record WrittenPackage(string Folder, IReadOnlyList<string> Files);

/// <summary>Folders of a run, as the user named them.</summary>
/// <param name="Out">For the packages.</param>
/// <param name="Root">The folder that inputs have to be in; null to find it.</param>
/// <param name="Templates">The folder of the user's templates; null for that of the project.</param>
internal sealed record DraftFolders(string Out, string? Root, string? Templates);

/// <summary>Drafts one requirement after the other; the search of each uses all processors.</summary>
/// <param name="terminal">Where progress is shown.</param>
/// <param name="folders">Where inputs and templates are, and where packages go.</param>
/// <param name="look">Paper and language of the documents.</param>
internal sealed class DraftRun(Terminal terminal, DraftFolders folders, DocumentOptions look)
{
    /// <summary>From a requirement to its package.</summary>
    public Draft Run(string file, CancellationToken cancellation)
    {
        InputSet inputs = InputFolder.Read(file, folders.Root, terminal.Folder);
        if (inputs.Application is not { } application)
            return new Draft(file, inputs, null, null);
        Specification specification = SearchBar.Over(
            terminal, application.Requirement.Identity.FolderName, bar => SpecificationDraft.Draft(application, bar, cancellation, DraftExtras.DiagnosisOfNo));
        TemplateFolder? templates = TemplateFolder.Find(folders.Templates, file, terminal.Folder);
        IReadOnlyList<PackageFile> files = PackageContents.Of(specification, inputs.Sources, templates, look);
        PackageFolder folder = new(Path.GetFullPath(folders.Out, terminal.Folder), application.Requirement.Identity.FolderName);
        folder.Replace(files, terminal.Clock);
        string shown = Path.Combine(folders.Out, application.Requirement.Identity.FolderName);
        return new Draft(file, inputs, specification, new WrittenPackage(shown, [.. files.Select(written => written.Name)]));
    }
}
