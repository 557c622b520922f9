using System.Buffers;
using System.Buffers.Binary;
using System.Globalization;
using System.IO.Compression;
using System.Text;

namespace BandSpec.Documents.Pdf.Finishing;

/// <summary>
/// Writes objects as a compact file: the small ones together in compressed object streams, the offsets in a stream of their own (ISO
/// 32000-1, 7.5.7 and 7.5.8).
/// </summary>
internal sealed class PackedFile
{
    private const int ObjectsPerStream = 200;

    private readonly ArrayBufferWriter<byte> _file = new();
    private readonly SortedDictionary<int, (byte Kind, int First, int Second)> _entries = new() { [0] = (0, 0, 0xFFFF) };
    private int _next;

    public static byte[] Write(IReadOnlyList<PdfObject> objects, int root, int info, byte[] digest)
    {
        var file = new PackedFile { _next = objects.Max(o => o.Number) + 1 };
        file.Append("%PDF-1.7\n%\u00e2\u00e3\u00cf\u00d3\n");
        foreach (var item in objects.Where(o => o.Stream is not null)) file.WriteStream(item);
        foreach (var few in objects.Where(o => o.Stream is null).OrderBy(o => o.Number).Chunk(ObjectsPerStream)) file.WriteTogether(few);
        file.WriteOffsets(root, info, digest);
        return file._file.WrittenSpan.ToArray();
    }

    private void WriteStream(PdfObject item)
    {
        // Metadata stays readable to programs that search for it without knowing PDF.
        if (item.Is("Metadata")) Write(item.Number, item.Text, item.Stream!);
        else WriteCompressed(item.Number, WithoutLength(item.Text), item.Stream!);
    }

    private void WriteCompressed(int number, string dictionary, byte[] bytes)
    {
        var packed = Compress(bytes);
        Write(number, $"<</Length {packed.Length}/Filter/FlateDecode{dictionary[2..]}", packed);
    }

    private void Write(int number, string dictionary, byte[] stream)
    {
        _entries[number] = (1, _file.WrittenCount, 0);
        Append($"{number} 0 obj\n{dictionary}\nstream\n");
        _file.Write(stream);
        Append("\nendstream\nendobj\n");
    }

    private void WriteTogether(PdfObject[] objects)
    {
        var number = _next++;
        StringBuilder index = new(), body = new();
        for (int i = 0; i < objects.Length; i++)
        {
            index.Append(CultureInfo.InvariantCulture, $"{objects[i].Number} {body.Length} ");
            body.Append(objects[i].Text).Append('\n');
            _entries[objects[i].Number] = (2, number, i);
        }
        WriteCompressed(
            number, $"<</Type/ObjStm/N {objects.Length}/First {index.Length}>>", Encoding.Latin1.GetBytes(index.ToString() + body));
    }

    private void WriteOffsets(int root, int info, byte[] digest)
    {
        var number = _next++;
        var at = _file.WrittenCount;
        _entries[number] = (1, at, 0);
        // Kind in one byte, offset or stream in four, generation or index in two; a number that was never given out is free.
        var table = new byte[7 * _next];
        foreach (var (index, entry) in _entries)
        {
            table[7 * index] = entry.Kind;
            BinaryPrimitives.WriteInt32BigEndian(table.AsSpan(7 * index + 1), entry.First);
            BinaryPrimitives.WriteUInt16BigEndian(table.AsSpan(7 * index + 5), (ushort)entry.Second);
        }
        var id = Convert.ToHexString(digest.AsSpan(0, 16));
        WriteCompressed(number, $"<</Type/XRef/Size {_next}/W[1 4 2]/Root {root} 0 R/Info {info} 0 R/ID[<{id}><{id}>]>>", table);
        Append($"startxref\n{at}\n%%EOF\n");
    }

    private static string WithoutLength(string dictionary)
    {
        var at = dictionary.IndexOf("/Length ", StringComparison.Ordinal);
        var end = at + 8;
        while (end < dictionary.Length && char.IsAsciiDigit(dictionary[end])) end++;
        return dictionary[..at] + dictionary[end..];
    }

    private static byte[] Compress(byte[] bytes)
    {
        using var packed = new MemoryStream();
        using (var zlib = new ZLibStream(packed, CompressionLevel.SmallestSize, leaveOpen: true)) zlib.Write(bytes);
        return packed.ToArray();
    }

    private void Append(string text) => _file.Write(Encoding.Latin1.GetBytes(text));
}
