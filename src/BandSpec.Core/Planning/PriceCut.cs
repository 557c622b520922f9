namespace BandSpec.Core.Planning;

/// <summary>
/// A cut that discards temperature lists without looking at them: each temperature pays a price, and a list whose prices do not add up to
/// the debt belongs to a plan that cannot reach what is asked for. Proof and origin: chapter "The price of a temperature" of METHOD.md.
/// </summary>
/// <param name="Prices">What each candidate pays when it is read at the other pressures, not negative.</param>
/// <param name="Surcharges">What each candidate pays more when it is read at the reference pressures; may be negative.</param>
/// <param name="Debt">What a list has to pay.</param>
internal sealed record PriceCut(double[] Prices, double[] Surcharges, double Debt)
{
    /// <summary>Whether a list is discarded.</summary>
    /// <param name="list">The list.</param>
    /// <param name="nearest">The place in it that is read at the reference pressures.</param>
    public bool Discards(ReadOnlySpan<int> list, int nearest)
    {
        double paid = Surcharges[list[nearest]];
        foreach (int candidate in list)
            paid += Prices[candidate];
        return paid < Debt;
    }
}
