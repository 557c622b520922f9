using System.Security.Cryptography;
using System.Text;
using System.Text.RegularExpressions;

namespace BandSpec.Documents.Pdf.Finishing;

/// <summary>
/// Re-emits PDFsharp's bytes as a file fit for an archive: compressed with complete zlib streams, marked content nested rightly, font
/// entries mended, metadata of our own, and every identifier taken from the content itself instead of chance.
/// </summary>
internal static partial class Finisher
{
    public static byte[] Finish(byte[] file, PdfFacts facts)
    {
        var plain = PlainFile.Read(file);
        var pages = plain.Objects.Where(o => o.Is("Page")).Select(o => o.Reference("/Contents")).ToHashSet();
        IReadOnlyList<PdfObject> objects = [.. plain.Objects.Select(o => pages.Contains(o.Number) ? Nested(o) : o)];
        objects = FontEntries.Mend(objects);
        var digest = Digest(objects);
        objects = [.. objects.Select(o => o.Is("Metadata") ? Metadata(o, facts, digest) : o)];
        return PackedFile.Write(objects, plain.Root, plain.Info, digest);
    }

    // PDFsharp opens a text object before the marked content that belongs around it, at the first text of a page and after decoration.
    private static PdfObject Nested(PdfObject content)
    {
        var text = Encoding.Latin1.GetString(content.Stream!);
        return content with { Stream = Encoding.Latin1.GetBytes(TextBeforeMark().Replace(text, "$1BT\n")) };
    }

    private static byte[] Digest(IReadOnlyList<PdfObject> objects)
    {
        using var hash = IncrementalHash.CreateHash(HashAlgorithmName.SHA256);
        foreach (var item in objects.Where(o => !o.Is("Metadata")))
        {
            hash.AppendData(item.TextBytes);
            hash.AppendData(item.Stream ?? []);
        }
        return hash.GetHashAndReset();
    }

    private static PdfObject Metadata(PdfObject old, PdfFacts facts, byte[] digest)
    {
        var packet = Encoding.UTF8.GetBytes(Xmp.Packet(facts, digest));
        return old with { Text = $"<</Type/Metadata/Subtype/XML/Length {packet.Length}>>", Stream = packet };
    }

    [GeneratedRegex(@"^BT\n(/\w+(?:<</MCID \d+>>BDC| BMC)\n)", RegexOptions.Multiline)]
    private static partial Regex TextBeforeMark();
}
