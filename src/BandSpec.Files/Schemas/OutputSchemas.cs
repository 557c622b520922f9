using System.Reflection;

namespace BandSpec.Files.Schemas;

/// <summary>
/// JSON Schemas (draft 2020-12) of <c>result.json</c>, <c>limits.json</c> and <c>judgement.json</c>. They are files of their own, since nothing reads those documents
/// back by a form; a test holds every document written against them, and they accept no member that they do not name.
/// </summary>
public static class OutputSchemas
{
    /// <summary>The schema of <c>result.json</c>.</summary>
    public static ReadOnlyMemory<byte> Result => Load("result");

    /// <summary>The schema of <c>limits.json</c>.</summary>
    public static ReadOnlyMemory<byte> Limits => Load("limits");

    /// <summary>The schema of <c>judgement.json</c>.</summary>
    public static ReadOnlyMemory<byte> Judgement => Load("judgement");

    private static ReadOnlyMemory<byte> Load(string name)
    {
        using Stream stream = Assembly.GetExecutingAssembly().GetManifestResourceStream($"BandSpec.Files.Schemas.{name}.schema.json")
            ?? throw new InvalidOperationException($"the schema of {name} is built into the program");
        using MemoryStream bytes = new();
        stream.CopyTo(bytes);
        return bytes.ToArray();
    }
}
