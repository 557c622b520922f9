using BandSpec.Core.TestLimits;

namespace BandSpec.Files.Csv;

/// <summary>How test benches write whether pressure was rising or falling.</summary>
internal static class DirectionWords
{
    private const int Longest = 10;

    /// <summary>Reads a cell: rising, up, increasing or +; falling, down, decreasing or -; in capitals or not.</summary>
    /// <param name="text">The cell without blanks around it.</param>
    /// <param name="side">The direction; <see langword="null"/> when none was noted.</param>
    /// <returns>False when it is another word.</returns>
    public static bool TryRead(ReadOnlySpan<char> text, out PressureDirection? side)
    {
        Span<char> lower = stackalloc char[Longest];
        int length = text.Length > Longest ? -1 : text.ToLowerInvariant(lower);
        ReadOnlySpan<char> word = length < 0 ? text : lower[..length];
        (bool known, side) = word switch
        {
            "" => (true, (PressureDirection?)null),
            "rising" or "up" or "increasing" or "+" => (true, PressureDirection.Rising),
            "falling" or "down" or "decreasing" or "-" => (true, PressureDirection.Falling),
            _ => (false, null),
        };
        return known;
    }
}
