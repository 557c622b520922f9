using BandSpec.Documents.Pdf.Sharp;

namespace BandSpec.Documents;

/// <summary>A specification's PDF, years later: what was attached to it comes back byte for byte.</summary>
public static class SpecificationFile
{
    /// <summary>The files attached to a PDF, sorted by name; empty when there are none.</summary>
    /// <param name="pdf">The PDF's bytes.</param>
    /// <exception cref="InvalidDataException">The bytes are not a PDF that can be read.</exception>
    /// <exception cref="IOException">What the PDF packs would unpack to more than 16 MiB.</exception>
    public static IReadOnlyList<DocumentFile> Attachments(ReadOnlyMemory<byte> pdf) => SharpAttachments.Read(pdf);
}
