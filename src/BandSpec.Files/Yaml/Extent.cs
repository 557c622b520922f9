namespace BandSpec.Files.Yaml;

/// <summary>A stretch of one line of a file, in characters; unlike a <see cref="Place"/> it does not say of which file.</summary>
/// <param name="Line">The line, counted from 1.</param>
/// <param name="Column">The first character, counted from 1.</param>
/// <param name="Length">How many characters, at least 1.</param>
internal readonly record struct Extent(int Line, int Column, int Length)
{
    /// <summary>The beginning of a file, for what concerns it as a whole.</summary>
    internal static Extent Start { get; } = new(1, 1, 1);
}

/// <summary>A place in an input file that a caret can point at.</summary>
/// <param name="File">The file's name as the user knows it.</param>
/// <param name="Line">The line, counted from 1.</param>
/// <param name="Column">The first character, counted from 1.</param>
/// <param name="Length">How many characters, at least 1.</param>
/// <param name="Text">The whole line, without its end.</param>
public sealed record Place(string File, int Line, int Column, int Length, string Text);
