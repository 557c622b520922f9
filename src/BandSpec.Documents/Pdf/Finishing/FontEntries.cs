using System.Security.Cryptography;
using System.Text.RegularExpressions;

namespace BandSpec.Documents.Pdf.Finishing;

/// <summary>
/// Mends what PDFsharp writes about fonts: the random letters before a subset's name become letters of the font's own digest, the
/// descent becomes negative, and the stem width, written as nothing, is told.
/// </summary>
internal static partial class FontEntries
{
    public static IReadOnlyList<PdfObject> Mend(IReadOnlyList<PdfObject> objects)
    {
        var files = objects.Where(o => o.Stream is not null).ToDictionary(o => o.Number);
        var tags = new Dictionary<string, string>();
        foreach (var descriptor in objects.Where(o => o.Is("FontDescriptor")))
            if (descriptor.Reference("/FontFile2") is { } file && SubsetName().Match(descriptor.Text) is { Success: true } name)
                tags[name.Groups[2].Value] = Letters(files[file].Stream!);
        return [.. objects.Select(o => o.Stream is null && o.Text.Contains("/Font", StringComparison.Ordinal) ? Mend(o, tags) : o)];
    }

    private static PdfObject Mend(PdfObject font, Dictionary<string, string> tags)
    {
        var text = SubsetName().Replace(
            font.Text, m => tags.TryGetValue(m.Groups[2].Value, out var tag) ? $"{m.Groups[1].Value}{tag}+" : m.Value);
        if (!font.Is("FontDescriptor")) return font with { Text = text };
        text = Descent().Replace(text, "/Descent -$1");
        // Vertical stems of the two weights, in thousandths of the size, as measured on the letter l.
        var stem = text.Contains("Semi", StringComparison.Ordinal) ? "/StemV 124" : "/StemV 84";
        return font with { Text = text.Replace("/StemV 0", stem, StringComparison.Ordinal) };
    }

    private static string Letters(byte[] font) => string.Concat(SHA256.HashData(font).Take(6).Select(b => (char)('A' + b % 26)));

    [GeneratedRegex(@"(/FontName/|/BaseFont/)([A-Z]{6})\+")]
    private static partial Regex SubsetName();

    [GeneratedRegex(@"/Descent (\d+)")]
    private static partial Regex Descent();
}
