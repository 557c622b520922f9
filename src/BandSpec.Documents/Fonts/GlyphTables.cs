using static System.Buffers.Binary.BinaryPrimitives;

namespace BandSpec.Documents.Fonts;

/// <summary>The three tables of a TrueType file that setting text needs: cmap (formats 4 and 12), hmtx and the heights.</summary>
internal sealed class GlyphTables
{
    private readonly byte[] _file;
    private readonly Dictionary<int, int> _glyphs = [];
    private readonly int _metrics;
    private readonly int _metricCount;

    public GlyphTables(byte[] file)
    {
        _file = file;
        UnitsPerEm = U16(Table("head") + 18);
        _metrics = Table("hmtx");
        _metricCount = U16(Table("hhea") + 34);
        CapHeight = I16(Table("OS/2") + 88) / (double)UnitsPerEm;
        ReadCharacterMap();
    }

    public int UnitsPerEm { get; }

    public double CapHeight { get; }

    /// <summary>The glyph of a code point; 0 where the face has none.</summary>
    public int Glyph(int codePoint) => _glyphs.GetValueOrDefault(codePoint);

    public int Advance(int glyph) => U16(_metrics + 4 * Math.Min(glyph, _metricCount - 1));

    private int Table(string tag)
    {
        for (int i = 0, at = 12; i < U16(4); i++, at += 16)
            if (tag.Select((c, k) => _file[at + k] == c).All(same => same))
                return I32(at + 8);
        throw new InvalidOperationException($"The font file has no table '{tag}'.");
    }

    private void ReadCharacterMap()
    {
        var map = Table("cmap");
        for (int i = 0; i < U16(map + 2); i++)
        {
            var at = map + I32(map + 4 + 8 * i + 4);
            if (U16(at) == 4) ReadSegments(at);
            else if (U16(at) == 12) ReadGroups(at);
        }
    }

    // Format 4: parallel arrays of segment ends, starts, deltas and offsets into a glyph array.
    private void ReadSegments(int at)
    {
        int length = U16(at + 6), ends = at + 14, starts = ends + length + 2, deltas = starts + length, offsets = deltas + length;
        for (int k = 0; k < length; k += 2)
            for (int code = U16(starts + k); code <= U16(ends + k) && code != 0xFFFF; code++)
                Note(code, SegmentGlyph(code, U16(starts + k), U16(deltas + k), offsets + k));
    }

    private int SegmentGlyph(int code, int start, int delta, int offsetAt)
    {
        var offset = U16(offsetAt);
        if (offset == 0) return (code + delta) & 0xFFFF;
        var glyph = U16(offsetAt + offset + 2 * (code - start));
        return glyph == 0 ? 0 : (glyph + delta) & 0xFFFF;
    }

    // Format 12: groups of consecutive code points with consecutive glyphs.
    private void ReadGroups(int at)
    {
        for (int i = 0, group = at + 16; i < I32(at + 12); i++, group += 12)
            for (int code = I32(group); code <= I32(group + 4); code++)
                Note(code, I32(group + 8) + code - I32(group));
    }

    private void Note(int code, int glyph)
    {
        if (glyph != 0) _glyphs[code] = glyph;
    }

    private int U16(int at) => ReadUInt16BigEndian(_file.AsSpan(at));

    private int I16(int at) => ReadInt16BigEndian(_file.AsSpan(at));

    private int I32(int at) => ReadInt32BigEndian(_file.AsSpan(at));
}
