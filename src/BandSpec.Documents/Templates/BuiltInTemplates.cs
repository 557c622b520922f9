using System.Reflection;

namespace BandSpec.Documents.Templates;

/// <summary>The templates that are part of the program: the same files that lie in the visible templates folder.</summary>
internal sealed class BuiltInTemplates : ITemplateFolder
{
    private const string Root = "templates/";

    public static readonly BuiltInTemplates Instance = new();

    public string Name => "built-in templates";

    public string? Read(string path)
    {
        using var stream = Assembly.GetExecutingAssembly().GetManifestResourceStream(Root + path);
        if (stream is null) return null;
        using var reader = new StreamReader(stream);
        return reader.ReadToEnd();
    }

    public IReadOnlyList<string> Files(string folder) =>
        [.. Assembly.GetExecutingAssembly().GetManifestResourceNames()
            .Where(n => n.StartsWith($"{Root}{folder}/", StringComparison.Ordinal) && n.LastIndexOf('/') == Root.Length + folder.Length)
            .Select(n => n[Root.Length..])];
}

/// <summary>The user's folder where it has a file, the built-in templates where it has not.</summary>
internal sealed class TemplateSources(ITemplateFolder? own)
{
    /// <summary>The text of a file and the name it goes by in messages.</summary>
    public (string Name, string Text)? Read(string path)
    {
        if (own?.Read(path) is { } text) return ($"{own.Name}/{path}", text);
        return BuiltInTemplates.Instance.Read(path) is { } builtIn ? ("templates/" + path, builtIn) : null;
    }

    /// <summary>
    /// The files of a folder, sorted by name. A user's folder with any file in it replaces the built-in one whole, so that a layout that is
    /// not wanted can be left out.
    /// </summary>
    public IReadOnlyList<string> Files(string folder)
    {
        var files = own?.Files(folder) ?? [];
        return [.. (files.Count > 0 ? files : BuiltInTemplates.Instance.Files(folder)).Order(StringComparer.Ordinal)];
    }
}
