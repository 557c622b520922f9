namespace BandSpec.Core.Deciding;

/// <summary>
/// True values beyond the tolerance on one side of a place, each with the probability that it is accepted there: <c>g(y) = f(y)·A(y)</c> in a table of
/// equal cells from the tolerance outwards, in which <c>g</c> is taken as constant. Both factors are log-concave, so <c>g</c> has one peak, and where it
/// has fallen to 10⁻¹³ of that nothing is left to speak of.
/// </summary>
internal sealed class WrongTail
{
    private const int Cells = 64;
    private const double Fall = 1e-13;

    private readonly PlaceLaw law;
    private readonly int side;
    private readonly double from;
    private readonly double width;
    private readonly double[] densities = [];
    private readonly double[] cumulative = [];

    /// <summary>The table of a place and a side.</summary>
    /// <param name="law">The law of the place.</param>
    /// <param name="place">Index of the place.</param>
    /// <param name="side">−1 or 1.</param>
    public WrongTail(PlaceLaw law, int place, int side)
    {
        (this.law, Place, this.side, from) = (law, place, side, law.Tolerance.Upper);
        if (law.Sigma == 0)
            return;
        width = (End() - from) / Cells;
        if (width <= 0)
            return;
        densities = [.. Enumerable.Range(0, Cells).Select(i => Joint(from + ((i + 0.5) * width)))];
        cumulative = new double[Cells];
        for (int i = 0; i < Cells; i++)
            cumulative[i] = Probability += densities[i] * width;
    }

    /// <summary>Index of the place.</summary>
    public int Place { get; }

    /// <summary>Probability of being beyond the tolerance on this side and accepted at this place.</summary>
    public double Probability { get; }

    /// <summary>A true value of the table's law.</summary>
    /// <param name="cell">A uniform number in [0, 1) for the cell.</param>
    /// <param name="within">Another for the place in the cell.</param>
    public double True(double cell, double within)
    {
        int found = Array.BinarySearch(cumulative, cell * Probability);
        int i = Math.Min(found < 0 ? ~found : found + 1, Cells - 1);
        return side * (from + ((i + within) * width));
    }

    /// <summary>The density of the table's law over that of the unit's at a true value whose reading is accepted; 0 outside the table.</summary>
    public double DensityRatio(double truth)
    {
        double cell = ((side * truth) - from) / width;
        if (!(cell >= 0 && cell < Cells))
            return 0;
        double joint = Joint(side * truth);
        return joint > 0 ? densities[(int)cell] / Probability / joint : 0;
    }

    private double Joint(double y) => law.Density(side * y) * law.AcceptedGiven(side * y);

    /// <summary>Where the table ends: past the peak, where the density has fallen to next to nothing, found by doubling and halving.</summary>
    private double End()
    {
        double step = law.ReadingVariance > 0 ? Math.Min(law.Sigma, Math.Sqrt(law.ReadingVariance)) : law.Sigma;
        double highest = Joint(from), reach = step / 16;
        for (; reach < 1e3 * (law.Sigma + step); reach *= 2)
        {
            double joint = Joint(from + reach);
            if (joint <= Fall * highest)
                break;
            highest = Math.Max(highest, joint);
        }

        double least = Fall * highest, inside = 0;
        for (int halving = 0; halving < 20; halving++)
        {
            double middle = (inside + reach) / 2;
            if (Joint(from + middle) > least)
                inside = middle;
            else
                reach = middle;
        }

        return highest > 0 ? from + reach : from;
    }
}
