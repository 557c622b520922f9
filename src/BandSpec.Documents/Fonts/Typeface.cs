using System.Collections.Concurrent;
using System.Reflection;

namespace BandSpec.Documents.Fonts;

/// <summary>
/// One embedded face: which letters it has and how wide they are. PDFsharp sets letters side by side without kerning, so the sum of the
/// advance widths is exactly the width on paper, and the charts in SVG are laid out with the same figures.
/// </summary>
internal sealed class Typeface
{
    private static readonly string[] Files = ["SourceSans3-Regular", "SourceSans3-Italic", "SourceSans3-SemiBold", "SourceCodePro-Regular"];
    private static readonly ConcurrentDictionary<Face, Typeface> Loaded = new();

    private readonly GlyphTables _tables;

    private Typeface(Face face)
    {
        Face = face;
        Name = Files[(int)face];
        Bytes = Read(Name + ".ttf");
        _tables = new GlyphTables(Bytes);
    }

    public Face Face { get; }

    /// <summary>The name under which PDFsharp asks for the face.</summary>
    public string Name { get; }

    public byte[] Bytes { get; }

    /// <summary>Height of a capital letter above the baseline, as a fraction of the size.</summary>
    public double CapHeight => _tables.CapHeight;

    public static Typeface Of(Face face) => Loaded.GetOrAdd(face, static f => new Typeface(f));

    public static Typeface Named(string name) => Of((Face)Array.IndexOf(Files, name) switch
    {
        var face when Enum.IsDefined(face) => face,
        _ => throw new InvalidOperationException($"No face '{name}' is embedded, and no font of the machine is used."),
    });

    public bool Has(int codePoint) => _tables.Glyph(codePoint) != 0;

    /// <summary>Width of the text in points when set at <paramref name="size"/> points.</summary>
    public double Width(string text, double size)
    {
        long units = 0;
        foreach (var rune in text.EnumerateRunes())
            units += _tables.Advance(_tables.Glyph(rune.Value));
        return units * size / _tables.UnitsPerEm;
    }

    private static byte[] Read(string file)
    {
        using var stream = Assembly.GetExecutingAssembly().GetManifestResourceStream("Fonts/" + file)
            ?? throw new InvalidOperationException($"The assembly lacks the font file {file}.");
        var bytes = new byte[stream.Length];
        stream.ReadExactly(bytes);
        return bytes;
    }
}
