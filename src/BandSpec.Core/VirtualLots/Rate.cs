namespace BandSpec.Core.VirtualLots;

/// <summary>
/// A share of units with its 95 % interval. The interval is Wilson's (1927), which keeps its coverage for few events and for none, taken at
/// the effective number of units: units of one lot resemble each other, so that a scatter of lots beyond the binomial's widens it (Korn and
/// Graubard 1998). With no event at all nothing is known of that scatter, and the number is taken as it is.
/// </summary>
public sealed record Rate
{
    private const double Quantile = 1.959963984540054;

    private Rate(long count, long of, double designEffect)
    {
        (Count, Of, DesignEffect) = (count, of, designEffect);
        Value = of > 0 ? (double)count / of : double.NaN;
        (Lower, Upper) = of > 0 ? Wilson(Value, of / designEffect) : (0, 1);
    }

    /// <summary>How many it happened to.</summary>
    public long Count { get; }

    /// <summary>Out of how many; may be 0.</summary>
    public long Of { get; }

    /// <summary>The share, 0 … 1; not a number out of none.</summary>
    public double Value { get; }

    /// <summary>Lower end of the interval.</summary>
    public double Lower { get; }

    /// <summary>Upper end of the interval.</summary>
    public double Upper { get; }

    /// <summary>By how much the scatter of lots makes the variance larger than the binomial's, at least 1.</summary>
    public double DesignEffect { get; }

    /// <summary>The share of a count in another, counted over the same lots.</summary>
    /// <param name="lots">How many lots.</param>
    /// <param name="count">Sum of the count.</param>
    /// <param name="of">Sum of what it is a share of.</param>
    /// <param name="scatter">Sum over lots of <c>(count − p·of)²</c> with <c>p</c> the share of the sums.</param>
    internal static Rate Over(long lots, long count, long of, double scatter)
    {
        if (of == 0 || count == 0 || count == of || lots < 2)
            return new Rate(count, of, 1);
        double share = (double)count / of;
        double binomial = share * (1 - share) * of;
        return new Rate(count, of, Math.Max(1, scatter * lots / (lots - 1) / binomial));
    }

    private static (double Lower, double Upper) Wilson(double share, double units)
    {
        double square = Quantile * Quantile;
        double centre = share + (square / (2 * units));
        double half = Quantile * Math.Sqrt((share * (1 - share) / units) + (square / (4 * units * units)));
        double scale = 1 + (square / units);
        return (share == 0 ? 0 : Math.Max(0, (centre - half) / scale), share == 1 ? 1 : Math.Min(1, (centre + half) / scale));
    }
}
