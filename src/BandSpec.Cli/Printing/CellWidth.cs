using System.Globalization;
using System.Text;

namespace BandSpec.Cli.Printing;

/// <summary>How many cells a text takes on a terminal, so that carets and columns line up below it.</summary>
internal static class CellWidth
{
    /// <summary>Blocks of characters that terminals draw two cells wide (Unicode Standard Annex 11, the ranges of common use).</summary>
    private static readonly (int First, int Last)[] Wide =
    [
        (0x1100, 0x115F), (0x2E80, 0x303E), (0x3041, 0xA4CF), (0xAC00, 0xD7A3), (0xF900, 0xFAFF), (0xFE30, 0xFE6F), (0xFF00, 0xFF60),
        (0xFFE0, 0xFFE6), (0x1F300, 0x1FAFF), (0x20000, 0x3FFFD),
    ];

    /// <summary>The width of a text without control characters.</summary>
    public static int Of(string text) => text.EnumerateRunes().Sum(Of);

    private static int Of(Rune rune) => Rune.GetUnicodeCategory(rune) switch
    {
        UnicodeCategory.NonSpacingMark or UnicodeCategory.EnclosingMark or UnicodeCategory.Format => 0,
        _ => Wide.Any(range => rune.Value >= range.First && rune.Value <= range.Last) ? 2 : 1,
    };
}
