using System.Text;
using BandSpec.Documents.Templates;

namespace BandSpec.Cli.Opening;

/// <summary>A user's folder of templates on the disk.</summary>
internal sealed class TemplateFolder : ITemplateFolder
{
    private const int LargestTemplate = 1 << 20;
    private readonly string folder;

    private TemplateFolder(string folder, string name) => (this.folder, Name) = (folder, name);

    /// <inheritdoc/>
    public string Name { get; }

    /// <summary>The folder's full path.</summary>
    public string FullPath => folder;

    /// <summary>
    /// The folder that the user named, or else <c>templates</c> in the project of a requirement; null when there is none.
    /// </summary>
    /// <param name="named">The folder that the user named; null for the project's.</param>
    /// <param name="requirement">The requirement's file.</param>
    /// <param name="workingFolder">The folder that relative paths are counted from.</param>
    /// <exception cref="RefusalException">The named folder does not exist.</exception>
    public static TemplateFolder? Find(string? named, string requirement, string workingFolder)
    {
        if (named is not null)
        {
            string path = Path.GetFullPath(named, workingFolder);
            return Directory.Exists(path) ? new TemplateFolder(path, named) : throw new RefusalException($"there is no folder of templates {named}");
        }
        string project = InputFolder.ProjectOf(Path.GetDirectoryName(Path.GetFullPath(requirement, workingFolder))!);
        string usual = Path.Combine(project, "templates");
        return Directory.Exists(usual) ? new TemplateFolder(usual, Path.GetRelativePath(workingFolder, usual)) : null;
    }

    /// <inheritdoc/>
    public string? Read(string path)
    {
        string full = Path.Combine(folder, path);
        if (!File.Exists(full) || !RealPath.IsInside(RealPath.Of(full), RealPath.Of(folder)))
            return null;
        if (new FileInfo(full).Length > LargestTemplate)
            throw new TemplateException($"{Name}/{path}", 1, 1, $"the template is larger than {LargestTemplate} bytes");
        return Encoding.UTF8.GetString(BoundedFile.Read(full, LargestTemplate));
    }

    /// <inheritdoc/>
    public IReadOnlyList<string> Files(string folder)
    {
        string full = Path.Combine(this.folder, folder);
        return Directory.Exists(full) ? [.. Directory.EnumerateFiles(full).Select(file => $"{folder}/{Path.GetFileName(file)}").Order(StringComparer.Ordinal)] : [];
    }
}
