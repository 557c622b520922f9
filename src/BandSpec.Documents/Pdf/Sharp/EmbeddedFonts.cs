using BandSpec.Documents.Fonts;
using PdfSharp.Fonts;

namespace BandSpec.Documents.Pdf.Sharp;

/// <summary>
/// Gives PDFsharp the embedded faces and nothing else: an unknown family is an error, so no font of the machine is taken.
/// </summary>
internal sealed class EmbeddedFonts : IFontResolver
{
    private static readonly Lock Gate = new();

    /// <summary>PDFsharp holds one resolver for the whole process.</summary>
    public static void Install()
    {
        lock (Gate)
            if (GlobalFontSettings.FontResolver is not EmbeddedFonts)
                GlobalFontSettings.FontResolver = new EmbeddedFonts();
    }

    public byte[] GetFont(string faceName) => Typeface.Named(faceName).Bytes;

    public FontResolverInfo ResolveTypeface(string familyName, bool isBold, bool isItalic) => new(Typeface.Named(familyName).Name);
}
