using System.Text;
using BandSpec.Documents;
using BandSpec.Documents.Templates;
using BandSpec.Files.Json;

namespace BandSpec.Cli.Opening;

/// <summary>
/// The templates that a package depends on, read once: what is drawn with them, what the manifest says of them and what the PDF carries of
/// them is then the same, whatever happens to the folder meanwhile.
/// </summary>
internal sealed class HeldTemplates : ITemplateFolder
{
    /// <summary>The most templates of a folder; a house has a handful of layouts.</summary>
    private const int MostTemplates = 100;

    private readonly SortedDictionary<string, byte[]> files = new(StringComparer.Ordinal);

    private HeldTemplates(string name) => Name = name;

    /// <inheritdoc/>
    public string Name { get; }

    /// <summary>The templates as inputs of a package.</summary>
    public IReadOnlyList<ManifestInput> Inputs =>
        [.. files.Select(file => new ManifestInput("template", file.Key, $"template-{file.Key.Replace('/', '-')}", file.Value))];

    /// <summary>The templates of a folder that are read for a language.</summary>
    public static HeldTemplates Of(ITemplateFolder folder, string language)
    {
        HeldTemplates held = new(folder.Name);
        IReadOnlyList<string> paths = SpecificationPackage.TemplatePaths(folder, language);
        if (paths.Count > MostTemplates)
            throw new TemplateException($"{folder.Name}/limits", 1, 1, $"The folder has more than {MostTemplates} templates.");
        foreach (string path in paths)
            held.files[path] = Encoding.UTF8.GetBytes(folder.Read(path) ?? "");
        return held;
    }

    /// <summary>Templates that a PDF carries.</summary>
    public static HeldTemplates Of(string name, IReadOnlyDictionary<string, ReadOnlyMemory<byte>> carried)
    {
        HeldTemplates held = new(name);
        foreach ((string path, ReadOnlyMemory<byte> bytes) in carried)
            held.files[path] = bytes.ToArray();
        return held;
    }

    /// <inheritdoc/>
    public string? Read(string path) => files.TryGetValue(path, out byte[]? bytes) ? Encoding.UTF8.GetString(bytes) : null;

    /// <inheritdoc/>
    public IReadOnlyList<string> Files(string folder) => [.. files.Keys.Where(path => Path.GetDirectoryName(path) == folder)];
}
