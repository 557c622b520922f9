using PdfSharp.Pdf;
using PdfSharp.Pdf.IO;

namespace BandSpec.Documents.Pdf.Sharp;

/// <summary>Reads attached files with PDFsharp, from the list of associated files in the catalogue.</summary>
internal static class SharpAttachments
{
    public static IReadOnlyList<DocumentFile> Read(ReadOnlyMemory<byte> pdf)
    {
        using var stream = new MemoryStream(pdf.ToArray());
        using var document = Open(stream);
        if (document.Internals.Catalog.Elements.GetArray("/AF") is not { } files) return [];
        var read = Enumerable.Range(0, files.Elements.Count).Select(i => ReadFile(files.Elements.GetDictionary(i)));
        return [.. read.OrderBy(f => f.Name, StringComparer.Ordinal)];
    }

    private static PdfDocument Open(MemoryStream stream)
    {
        try
        {
            return PdfReader.Open(stream, PdfDocumentOpenMode.Import);
        }
        catch (Exception fault) when (fault is not OutOfMemoryException)
        {
            // PDFsharp meets a damaged file with exceptions of many kinds.
            throw new InvalidDataException($"The file cannot be read as PDF: {fault.Message}", fault);
        }
    }

    private static DocumentFile ReadFile(PdfDictionary? specification)
    {
        var content = specification?.Elements.GetDictionary("/EF")?.Elements.GetDictionary("/F")
            ?? throw new InvalidDataException("The PDF names an attached file without its content.");
        if (!content.Stream.TryUncompress()) throw new InvalidDataException("The content of an attached file cannot be unpacked.");
        return new DocumentFile(specification.Elements.GetString("/UF"), content.Stream.Value);
    }
}
