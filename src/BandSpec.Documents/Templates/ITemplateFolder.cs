namespace BandSpec.Documents.Templates;

/// <summary>
/// A folder of templates, read on behalf of this library, which knows no file system. Paths are relative, with <c>/</c> between their
/// parts and without <c>..</c>: <c>words/en/document.scriban</c>, <c>limits/points.csv</c>.
/// </summary>
public interface ITemplateFolder
{
    /// <summary>The text of a file, or <see langword="null"/> when the folder has none of that name.</summary>
    /// <param name="path">A relative path as described above.</param>
    string? Read(string path);

    /// <summary>
    /// The paths of all files directly in a folder such as <c>limits</c>, in any order; empty when there is no such folder.
    /// </summary>
    /// <param name="folder">A relative path without a slash at its end.</param>
    IReadOnlyList<string> Files(string folder);

    /// <summary>What the folder is called in messages, such as the path the user gave.</summary>
    string Name { get; }
}
