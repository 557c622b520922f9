namespace BandSpec.Documents.Pdf;

/// <summary>How an attached file relates to the document, in the words of PDF/A-3.</summary>
internal enum Relationship
{
    /// <summary>The document was made from it.</summary>
    Source,

    /// <summary>Figures the document shows.</summary>
    Data,

    /// <summary>It belongs to the document in another way.</summary>
    Supplement,
}

/// <summary>A file carried inside the document.</summary>
internal sealed record Attachment(string Name, string MediaType, string Description, Relationship Relationship, byte[] Bytes);

/// <summary>
/// What a PDF says about itself. The claim to follow the archive and accessibility standards is made only when asked for.
/// </summary>
internal sealed record PdfFacts(
    string Title,
    string Author,
    string Subject,
    string Language,
    DateOnly Date,
    string Creator,
    IReadOnlyList<Attachment> Attachments,
    bool ClaimsConformance);
