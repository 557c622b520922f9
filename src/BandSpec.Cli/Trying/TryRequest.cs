using System.Globalization;
using BandSpec.Core.VirtualLots;
using BandSpec.Files.Inputs;

namespace BandSpec.Cli.Trying;

/// <summary>What is to be tried, as the command line said.</summary>
/// <param name="File">The requirement.</param>
/// <param name="Root">The folder that inputs have to be in; null to find it.</param>
/// <param name="Changes">Values read as if they were written otherwise.</param>
/// <param name="Order">Units, lots, seed and part.</param>
/// <param name="Threads">How many threads make lots.</param>
internal sealed record TryRequest(string File, string? Root, IReadOnlyList<InputChange> Changes, LotOrder Order, int Threads)
{
    /// <summary>A number of units such as <c>1000000</c> or <c>1e9</c>.</summary>
    /// <exception cref="FormatException">It is not a whole number from 1 to 10¹².</exception>
    public static long UnitsOf(string text) =>
        decimal.TryParse(text, NumberStyles.Float, CultureInfo.InvariantCulture, out decimal units) && units == Math.Floor(units) && units is >= 1 and <= 1e12m
            ? (long)units
            : throw new FormatException($"`{text}`: units are a whole number from 1 to 1e12");

    /// <summary>A part such as <c>3/64</c> of an order.</summary>
    /// <exception cref="FormatException">It is not written like that, or there is no such part.</exception>
    public static LotOrder PartOf(LotOrder order, string text)
    {
        string[] parts = text.Split('/');
        if (parts.Length != 2 || !int.TryParse(parts[0], NumberStyles.None, CultureInfo.InvariantCulture, out int part)
            || !int.TryParse(parts[1], NumberStyles.None, CultureInfo.InvariantCulture, out int of) || part < 1 || part > of || of > order.Lots)
            throw new FormatException($"`{text}`: a part is written PART/PARTS, such as 3/64, with at most as many parts as lots ({order.Lots})");
        return order.InPart(part, of);
    }
}
