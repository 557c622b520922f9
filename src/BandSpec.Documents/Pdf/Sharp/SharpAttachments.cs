using System.IO.Compression;
using System.Runtime.ExceptionServices;
using PdfSharp.Pdf;
using PdfSharp.Pdf.IO;

namespace BandSpec.Documents.Pdf.Sharp;

/// <summary>Reads attached files with PDFsharp, from the list of associated files in the catalogue.</summary>
internal static class SharpAttachments
{
    /// <summary>Room for a reader that calls itself at every level that <see cref="Nesting"/> lets through.</summary>
    private const int Stack = 128 << 20;

    public static IReadOnlyList<DocumentFile> Read(ReadOnlyMemory<byte> pdf)
    {
        byte[] bytes = pdf.ToArray();
        PackedStreams.Check(bytes);
        IReadOnlyList<DocumentFile> files = [];
        ExceptionDispatchInfo? fault = null;
        Thread reader = new(
            () =>
            {
                try
                {
                    files = ReadFiles(bytes);
                }
                catch (Exception met)
                {
                    fault = ExceptionDispatchInfo.Capture(met);
                }
            },
            Stack);
        reader.Start();
        reader.Join();
        fault?.Throw();
        return files;
    }

    private static IReadOnlyList<DocumentFile> ReadFiles(byte[] bytes)
    {
        try
        {
            using var stream = new MemoryStream(bytes);
            using var document = PdfReader.Open(stream, PdfDocumentOpenMode.Import);
            if (document.Internals.Catalog.Elements.GetArray("/AF") is not { } files) return [];
            var read = Enumerable.Range(0, files.Elements.Count).Select(i => ReadFile(files.Elements.GetDictionary(i)));
            return [.. read.OrderBy(f => f.Name, StringComparer.Ordinal)];
        }
        catch (Exception fault) when (fault is not (OutOfMemoryException or InvalidDataException))
        {
            // PDFsharp meets a damaged file with exceptions of many kinds.
            throw new InvalidDataException($"The file cannot be read as PDF: {fault.Message}", fault);
        }
    }

    private static DocumentFile ReadFile(PdfDictionary? specification)
    {
        var content = specification?.Elements.GetDictionary("/EF")?.Elements.GetDictionary("/F")
            ?? throw new InvalidDataException("The PDF names an attached file without its content.");
        return new DocumentFile(specification.Elements.GetString("/UF"), Content(content));
    }

    private static byte[] Content(PdfDictionary file)
    {
        if (!file.Elements.ContainsKey("/Filter")) return file.Stream.Value;
        if (file.Elements.GetName("/Filter") != "/FlateDecode" || file.Elements.ContainsKey("/DecodeParms"))
            throw new InvalidDataException("The content of an attached file is packed in a way that this program does not use.");
        using var packed = new ZLibStream(new MemoryStream(file.Stream.Value), CompressionMode.Decompress);
        using var unpacked = new MemoryStream();
        packed.CopyTo(unpacked);
        return unpacked.ToArray();
    }
}
