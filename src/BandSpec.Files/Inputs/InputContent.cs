namespace BandSpec.Files.Inputs;

/// <summary>The bytes of an input file, or why they could not be had: this library opens no file itself.</summary>
public sealed record InputContent
{
    private InputContent(string name, ReadOnlyMemory<byte> bytes, string? refusal) => (Name, Bytes, Refusal) = (name, bytes, refusal);

    /// <summary>The file's name as the user knows it.</summary>
    public string Name { get; }

    /// <summary>Its bytes; empty when they could not be had.</summary>
    public ReadOnlyMemory<byte> Bytes { get; }

    /// <summary>Why the bytes could not be had, a sentence without a full stop; <see langword="null"/> when they are there.</summary>
    public string? Refusal { get; }

    /// <summary>The content of a file.</summary>
    public static InputContent Of(string name, ReadOnlyMemory<byte> bytes) => new(name, bytes, null);

    /// <summary>A file that could not be had.</summary>
    public static InputContent Refused(string name, string why) => new(name, default, why);
}
