using BandSpec.Documents.Templates;

namespace BandSpec.Documents;

/// <summary>Paper sizes a document can be laid out for.</summary>
public enum Paper
{
    /// <summary>ISO 216 A4, 210 mm by 297 mm.</summary>
    A4,

    /// <summary>US Letter, 8.5 in by 11 in.</summary>
    Letter,
}

/// <summary>How a specification's documents are drawn.</summary>
public sealed record DocumentOptions
{
    /// <summary>The paper; A4 unless said otherwise.</summary>
    public Paper Paper { get; init; } = Paper.A4;

    /// <summary>
    /// The language of the words, named like their folder under <c>words</c>: <c>en</c> (the default) and <c>de</c> are built in.
    /// </summary>
    public string Language { get; init; } = "en";

    /// <summary>The user's own templates, which go before the built-in ones file by file; <see langword="null"/> for none.</summary>
    public ITemplateFolder? Templates { get; init; }

    /// <summary>
    /// Who released the specification and when, shown on every page; <see langword="null"/> for a draft, which is shown as well. A
    /// specification that is not feasible is marked so in either case.
    /// </summary>
    public ReleaseMark? Release { get; init; }

    /// <summary>Name and version of the program, as the document and the PDF's properties show it.</summary>
    public required string Program { get; init; }

    /// <summary>
    /// Whether the PDF claims to follow PDF/A-3a and PDF/UA-1. It is built along both, but no validator has confirmed it: claim it only
    /// after
    /// one has.
    /// </summary>
    public bool ClaimsConformance { get; init; }
}

/// <summary>A release as documents show it.</summary>
/// <param name="By">Who released the specification.</param>
/// <param name="At">When.</param>
/// <param name="Digest">The digest of its line in the release record.</param>
public sealed record ReleaseMark(string By, DateTimeOffset At, string Digest);

/// <summary>A drawn file of the package.</summary>
/// <param name="Name">File name without folder, unique in the package.</param>
/// <param name="Bytes">Its content; never changed afterwards.</param>
public sealed record DocumentFile(string Name, ReadOnlyMemory<byte> Bytes);

/// <summary>A file that a document rests on or shows, carried inside the PDF.</summary>
/// <param name="Name">File name without folder, unique among the attachments, such as <c>requirement.yaml</c>.</param>
/// <param name="MediaType">Its media type, such as <c>application/yaml</c> or <c>application/json</c>.</param>
/// <param name="Description">What it is, a few words.</param>
/// <param name="IsInput">Whether figures were made from it (its digest is then listed), rather than it being a record of figures.</param>
/// <param name="Bytes">Its content, attached byte for byte.</param>
public sealed record SourceFile(string Name, string MediaType, string Description, bool IsInput, ReadOnlyMemory<byte> Bytes);
