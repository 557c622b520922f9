using System.Buffers;

namespace BandSpec.Files.Yaml;

/// <summary>
/// Characters that have no business in an input: control characters, line ends that only some programs see, and marks that turn the direction
/// of writing, with which a line can show something else than it says.
/// </summary>
internal static class OddCharacters
{
    /// <summary>All of them; the tab, the line feed and the carriage return are not among them.</summary>
    internal static SearchValues<char> Values { get; } = SearchValues.Create(
        [.. Range(0x00, 0x08), '\u000B', '\u000C', .. Range(0x0E, 0x1F), .. Range(0x7F, 0x9F), '\u200B', '\u200E', '\u200F',
        .. Range(0x2028, 0x202E), .. Range(0x2066, 0x2069), '\uFEFF', '\uFFFD', '\uFFFE', '\uFFFF']);

    private static IEnumerable<char> Range(int first, int last) => Enumerable.Range(first, last - first + 1).Select(code => (char)code);
}
