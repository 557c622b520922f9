using System.Buffers;
using System.IO.Compression;

namespace BandSpec.Documents.Pdf.Sharp;

/// <summary>
/// What a PDF packs, measured before a reader unpacks it: object and offset streams are unpacked whole while a file is opened, and a few bytes can be
/// made to unpack to gigabytes. Every stream is looked at, whatever its dictionary says of itself; packings that this program does not write, one
/// within the other or encrypted, are refused, since what they come to cannot be told from here.
/// </summary>
internal static class PackedStreams
{
    /// <summary>What all streams of a file may come to, in bytes; those of the demos come to about one million. Objects take some thirty times that in memory.</summary>
    public const int Largest = 16 << 20;

    private static readonly SearchValues<byte> Space = SearchValues.Create("\0\t\n\f\r "u8);
    private static readonly SearchValues<byte> EndOfName = SearchValues.Create("\0\t\n\f\r ()<>[]{}/%"u8);

    /// <summary>Refuses a file that would unpack to more than <see cref="Largest"/> bytes.</summary>
    /// <param name="pdf">The file's bytes.</param>
    /// <exception cref="IOException">It unpacks to more.</exception>
    /// <exception cref="InvalidDataException">It is packed in a way that this program does not use, or nested deeper than <see cref="Nesting.Deepest"/>.</exception>
    public static void Check(byte[] pdf)
    {
        CheckPacking(WithoutEscapes(pdf));
        new Nesting().Follow(pdf);
        long total = 0;
        for (int at = 0; Find(pdf, "stream"u8, ref at);)
        {
            int begin = at + Math.Max(0, pdf.AsSpan(at).IndexOfAnyExcept(Space));
            total += Unpacked(pdf, begin, Largest - total);
            if (total > Largest) throw new IOException($"what it packs unpacks to more than {Largest} bytes");
        }
    }

    /// <summary>How many bytes come out of a place, counted up to one more than a number; 0 where nothing was packed.</summary>
    private static long Unpacked(byte[] pdf, int begin, long most)
    {
        const int methodOfDeflate = 8, header = 2;
        if (begin + header >= pdf.Length || (pdf[begin] & 0xF) != methodOfDeflate) return 0;
        long length = 0;
        Nesting nesting = new();
        byte[] buffer = ArrayPool<byte>.Shared.Rent(1 << 16);
        try
        {
            using var packed = new DeflateStream(new MemoryStream(pdf, begin + header, pdf.Length - begin - header), CompressionMode.Decompress);
            for (int read; length <= most && (read = packed.Read(buffer)) > 0; length += read) nesting.Follow(buffer.AsSpan(0, read));
        }
        catch (InvalidDataException) when (!nesting.IsTooDeep)
        {
            // Damaged, or not packed after all: as much as came out of it counts.
        }
        finally
        {
            ArrayPool<byte>.Shared.Return(buffer);
        }

        return length;
    }

    private static void CheckPacking(ReadOnlySpan<byte> pdf)
    {
        if (pdf.IndexOf("/Encrypt"u8) >= 0) throw new InvalidDataException("The PDF is encrypted.");
        for (int at = 0; Find(pdf, "/Filter"u8, ref at);)
            if (!IsPlain(pdf[at..]))
                throw new InvalidDataException("The PDF is packed in a way that this program does not use.");
    }

    /// <summary>Whether one filter follows, alone or as a list of one, that unpacks in one step; or one that is none, as of a signature.</summary>
    private static bool IsPlain(ReadOnlySpan<byte> value)
    {
        value = value.TrimStart("\0\t\n\f\r "u8);
        bool isList = value.StartsWith("["u8);
        if (isList) value = value[1..].TrimStart("\0\t\n\f\r "u8);
        if (!value.StartsWith("/"u8)) return false;
        int end = value[1..].IndexOfAny(EndOfName) + 1;
        ReadOnlySpan<byte> name = value[..Math.Max(1, end)];
        bool isOne = !isList || value[name.Length..].TrimStart("\0\t\n\f\r "u8).StartsWith("]"u8);
        return isOne && (!name.EndsWith("Decode"u8) || name.SequenceEqual("/FlateDecode"u8) || name.SequenceEqual("/DCTDecode"u8));
    }

    /// <summary>Names may spell any letter as <c>#</c> and two hexadecimal digits (ISO 32000-1, 7.3.5).</summary>
    private static byte[] WithoutEscapes(byte[] pdf)
    {
        byte[] plain = new byte[pdf.Length];
        int length = 0;
        for (int i = 0; i < pdf.Length; i++)
        {
            bool isEscape = pdf[i] == '#' && i + 2 < pdf.Length && char.IsAsciiHexDigit((char)pdf[i + 1]) && char.IsAsciiHexDigit((char)pdf[i + 2]);
            plain[length++] = isEscape ? Convert.FromHexString([(char)pdf[i + 1], (char)pdf[i + 2]])[0] : pdf[i];
            if (isEscape) i += 2;
        }

        return plain[..length];
    }

    /// <summary>Finds the next place of some bytes and moves behind it.</summary>
    private static bool Find(ReadOnlySpan<byte> pdf, ReadOnlySpan<byte> wanted, ref int at)
    {
        int found = pdf[at..].IndexOf(wanted);
        at += Math.Max(0, found) + wanted.Length;
        return found >= 0;
    }
}
