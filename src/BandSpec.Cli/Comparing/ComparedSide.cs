using BandSpec.Cli.Opening;
using BandSpec.Cli.Versioning;
using BandSpec.Core.Findings;
using BandSpec.Documents;
using BandSpec.Files.Inputs;
using BandSpec.Files.Yaml;

namespace BandSpec.Cli.Comparing;

/// <summary>
/// One of two specifications to be compared, whatever it is given as: a requirement file, a package folder, a specification's PDF, or
/// <c>revision:path</c> in git.
/// </summary>
internal static class ComparedSide
{
    /// <summary>The inputs of a side.</summary>
    /// <param name="written">The side as the user named it.</param>
    /// <param name="root">The folder that inputs have to be in; null to find it.</param>
    /// <param name="folder">The working folder.</param>
    public static InputSet Read(string written, string? root, string folder)
    {
        string path = Path.GetFullPath(written, folder);
        if (Directory.Exists(path))
            return Carried(written, Path.Combine(path, PackageNames.Document));
        if (File.Exists(path))
            return path.EndsWith(".pdf", StringComparison.OrdinalIgnoreCase) ? Carried(written, path) : InputFolder.Read(written, root, folder);
        return written.IndexOf(':', StringComparison.Ordinal) > 0 ? GitRevision.Read(written, folder) : InputFolder.Read(written, root, folder);
    }

    /// <summary>The inputs that a specification's PDF carries.</summary>
    private static InputSet Carried(string written, string path)
    {
        if (!File.Exists(path))
            return Refuse(written, "no specification's PDF is in this folder", $"a package folder with its {PackageNames.Document}");
        try
        {
            IReadOnlyList<DocumentFile> files = SpecificationFile.Attachments(BoundedFile.Read(path));
            return CarriedInputs.Of(written, files.DistinctBy(file => file.Name).ToDictionary(file => file.Name, file => file.Bytes))?.Read()
                ?? Refuse(written, "the PDF carries no inputs", "the PDF of a specification");
        }
        catch (InvalidDataException)
        {
            return Refuse(written, "it is not a PDF that can be read", "the PDF of a specification");
        }
        catch (Exception refused) when (refused is IOException or UnauthorizedAccessException)
        {
            return Refuse(written, refused.Message.TrimEnd('.'), "the PDF of a specification");
        }
    }

    private static InputSet Refuse(string written, string found, string accepted) => new(
        null, [], [new PlacedFinding(new Finding(FieldPath.InRequirement(""), "file", found, accepted), new Place(written, 1, 1, 1, ""))]);
}
