namespace BandSpec.Files.LotReadings;

/// <summary>Units of readings that can be turned into each other: volts and amperes with their decimal prefixes.</summary>
internal static class OutputUnits
{
    private static readonly (string Symbol, char Kind, double Size)[] Known =
    [
        ("V", 'V', 1), ("mV", 'V', 1e-3), ("µV", 'V', 1e-6), ("uV", 'V', 1e-6), ("μV", 'V', 1e-6),
        ("A", 'A', 1), ("mA", 'A', 1e-3), ("µA", 'A', 1e-6), ("uA", 'A', 1e-6), ("μA", 'A', 1e-6),
        ("code", 'c', 1), ("counts", 'c', 1), ("LSB", 'c', 1),
    ];

    /// <summary>
    /// What a number in one unit is multiplied with to be in another; <see langword="null"/> when the unit is unknown or of another kind. Case counts
    /// for known units (mV is not MV); an unknown one is only itself.
    /// </summary>
    public static double? Factor(ReadOnlySpan<char> from, string to)
    {
        if (from.SequenceEqual(to))
            return 1;
        (char Kind, double Size)? source = Find(from), target = Find(to);
        return source is { } s && target is { } t && s.Kind == t.Kind ? s.Size / t.Size : null;
    }

    private static (char Kind, double Size)? Find(ReadOnlySpan<char> symbol)
    {
        foreach ((string known, char kind, double size) in Known)
            if (symbol.SequenceEqual(known))
                return (kind, size);
        return null;
    }
}
