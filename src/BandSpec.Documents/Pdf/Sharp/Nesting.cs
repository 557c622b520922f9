using System.Buffers;

namespace BandSpec.Documents.Pdf.Sharp;

/// <summary>
/// How deep brackets stand within one another, counted as if all bytes were objects: a reader that calls itself for each of them would run out of stack.
/// Packed bytes and texts count too; brackets come and go in them, and do not heap up.
/// </summary>
internal sealed class Nesting
{
    /// <summary>The most that is read; documents of this program have ten or so.</summary>
    public const int Deepest = 20_000;

    private static readonly SearchValues<byte> Brackets = SearchValues.Create("[]<>"u8);
    private int depth;

    /// <summary>Whether they stand deeper than is read.</summary>
    public bool IsTooDeep => depth > Deepest;

    /// <summary>Counts on.</summary>
    /// <exception cref="InvalidDataException">They stand too deep.</exception>
    public void Follow(ReadOnlySpan<byte> bytes)
    {
        for (int next; (next = bytes.IndexOfAny(Brackets)) >= 0; bytes = bytes[(next + 1)..])
        {
            depth = bytes[next] is (byte)'[' or (byte)'<' ? depth + 1 : Math.Max(0, depth - 1);
            if (IsTooDeep)
                throw new InvalidDataException($"The PDF nests its objects more than {Deepest} deep.");
        }
    }
}
