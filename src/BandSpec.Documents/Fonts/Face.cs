namespace BandSpec.Documents.Fonts;

/// <summary>
/// The four faces a document is set in. Their files are part of the assembly, so that no font of the machine is ever used.
/// </summary>
internal enum Face
{
    Regular,
    Italic,
    SemiBold,
    Mono,
}
