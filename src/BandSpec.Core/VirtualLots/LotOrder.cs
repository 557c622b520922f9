namespace BandSpec.Core.VirtualLots;

/// <summary>How many units are to be made, in which lots, from which chance, and which part of them here.</summary>
public sealed record LotOrder
{
    /// <summary>Units that are worked on side by side; a lot is a multiple of it.</summary>
    public const int UnitsSideBySide = 8;

    private LotOrder(long lots, int lotSize, ulong seed, int part, int parts) =>
        (Lots, LotSize, Seed, Part, Parts) = (lots, lotSize, seed, part, parts);

    /// <summary>Lots in the whole order, at least 2: one lot alone says nothing about how lots scatter.</summary>
    public long Lots { get; }

    /// <summary>Units in a lot, a multiple of <see cref="UnitsSideBySide"/>.</summary>
    public int LotSize { get; }

    /// <summary>The root seed of every random stream.</summary>
    public ulong Seed { get; }

    /// <summary>Which part is made here, 1 … <see cref="Parts"/>.</summary>
    public int Part { get; }

    /// <summary>Into how many parts the order is divided; 1 for an order that is not.</summary>
    public int Parts { get; }

    /// <summary>Units in the whole order.</summary>
    public long Units => Lots * LotSize;

    /// <summary>The first lot of the part, counted from 0.</summary>
    public long FirstLot => (long)((Int128)Lots * (Part - 1) / Parts);

    /// <summary>The lot after the part's last.</summary>
    public long EndLot => (long)((Int128)Lots * Part / Parts);

    /// <summary>An order of at least that many units, rounded up to whole lots.</summary>
    /// <param name="units">1 to 10¹².</param>
    /// <param name="lotSize">16 to 100,000, rounded up to a multiple of <see cref="UnitsSideBySide"/>.</param>
    /// <param name="seed">Any number.</param>
    /// <exception cref="ArgumentOutOfRangeException">A number is outside its range.</exception>
    public static LotOrder For(long units, int lotSize, ulong seed)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(units, 1);
        ArgumentOutOfRangeException.ThrowIfGreaterThan(units, 1_000_000_000_000);
        ArgumentOutOfRangeException.ThrowIfLessThan(lotSize, 2 * UnitsSideBySide);
        ArgumentOutOfRangeException.ThrowIfGreaterThan(lotSize, 100_000);
        int whole = (lotSize + UnitsSideBySide - 1) / UnitsSideBySide * UnitsSideBySide;
        return new LotOrder(Math.Max(2, (units + whole - 1) / whole), whole, seed, 1, 1);
    }

    /// <summary>One part of this order.</summary>
    /// <exception cref="ArgumentOutOfRangeException">There is no such part, or there are more parts than lots.</exception>
    public LotOrder InPart(int part, int parts)
    {
        ArgumentOutOfRangeException.ThrowIfLessThan(parts, 1);
        ArgumentOutOfRangeException.ThrowIfGreaterThan(parts, Lots);
        ArgumentOutOfRangeException.ThrowIfLessThan(part, 1);
        ArgumentOutOfRangeException.ThrowIfGreaterThan(part, parts);
        return new LotOrder(Lots, LotSize, Seed, part, parts);
    }
}
