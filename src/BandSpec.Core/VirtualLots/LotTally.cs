using BandSpec.Core.Numerics;

namespace BandSpec.Core.VirtualLots;

/// <summary>
/// Sums over lots, all of them exact: counts as integers, numbers on the grid of <see cref="FixedPointSum"/>. Tallies of different lots added
/// together are the tally of all those lots, to the last bit and in any order.
/// </summary>
internal sealed class LotTally
{
    private readonly Int128[] figures;

    /// <summary>A tally of no lot.</summary>
    public LotTally(TallyPlan plan) => (Plan, figures) = (plan, new Int128[plan.Length]);

    /// <summary>A tally from its figures.</summary>
    /// <exception cref="ArgumentException">They are not as many as the plan has.</exception>
    public LotTally(TallyPlan plan, IReadOnlyList<Int128> figures)
        : this(plan)
    {
        if (figures.Count != plan.Length)
            throw new ArgumentException($"a tally of this lot has {plan.Length} figures, not {figures.Count}", nameof(figures));
        for (int i = 0; i < figures.Count; i++)
            this.figures[i] = figures[i];
    }

    /// <summary>Where every figure stands.</summary>
    public TallyPlan Plan { get; }

    /// <summary>All figures.</summary>
    public IReadOnlyList<Int128> Figures => figures;

    /// <summary>How many lots were counted.</summary>
    public long Lots => (long)figures[0];

    /// <summary>Adds all lots of another tally.</summary>
    public void Add(LotTally other)
    {
        for (int i = 0; i < figures.Length; i++)
            figures[i] = checked(figures[i] + other.figures[i]);
    }

    /// <summary>Adds what was counted in one lot.</summary>
    public void AddCounts(ReadOnlySpan<long> counts)
    {
        figures[0]++;
        for (int i = 0; i < counts.Length; i++)
        {
            int at = TallyPlan.FiguresOf(i);
            figures[at] += counts[i];
            figures[at + 1] += counts[i] * counts[i];
            figures[at + 2] += counts[i] * counts[(int)Counted.Accepted];
        }
    }

    /// <summary>Adds moments of use to a bin of the histogram.</summary>
    public void AddToBin(int bin, long moments) => figures[Plan.Histogram + bin] += moments;

    /// <summary>Adds a lot's mean square of the worst use.</summary>
    public void AddUseSquare(double square)
    {
        figures[Plan.UseSquare] += FixedPointSum.From(square);
        figures[Plan.UseSquare + 1] += FixedPointSum.From(square * square);
    }

    /// <summary>Adds a lot's moments at a place.</summary>
    /// <param name="node">Index of the place.</param>
    /// <param name="mean">Mean of the whole error less its nominal value.</param>
    /// <param name="within">Variance of the whole error within the lot.</param>
    /// <param name="residue">Mean of what compensation left over less its nominal value.</param>
    public void AddNode(int node, double mean, double within, double residue)
    {
        Span<Int128> at = figures.AsSpan(Plan.FirstNode + (node * TallyPlan.FiguresPerNode), TallyPlan.FiguresPerNode);
        double square = mean * mean;
        at[(int)NodeFigure.Mean] += FixedPointSum.From(mean);
        at[(int)NodeFigure.Mean2] += FixedPointSum.From(square);
        at[(int)NodeFigure.Mean3] += FixedPointSum.From(square * mean);
        at[(int)NodeFigure.Mean4] += FixedPointSum.From(square * square);
        at[(int)NodeFigure.Within] += FixedPointSum.From(within);
        at[(int)NodeFigure.Within2] += FixedPointSum.From(within * within);
        at[(int)NodeFigure.MeanWithin] += FixedPointSum.From(mean * within);
        at[(int)NodeFigure.Mean2Within] += FixedPointSum.From(square * within);
        at[(int)NodeFigure.Residue] += FixedPointSum.From(residue);
        at[(int)NodeFigure.Residue2] += FixedPointSum.From(residue * residue);
    }

    /// <summary>The sum of a count over lots.</summary>
    public long Sum(int count) => (long)figures[TallyPlan.FiguresOf(count)];

    /// <summary>The sum of a count's squares over lots.</summary>
    public double Squares(int count) => (double)figures[TallyPlan.FiguresOf(count) + 1];

    /// <summary>The sum of a count's products with the accepted units over lots.</summary>
    public double WithAccepted(int count) => (double)figures[TallyPlan.FiguresOf(count) + 2];

    /// <summary>Moments of use in a bin of the histogram.</summary>
    public long Bin(int bin) => (long)figures[Plan.Histogram + bin];

    /// <summary>Sum and squares over lots of the mean square of the worst use.</summary>
    public (double Sum, double Squares) UseSquare =>
        (FixedPointSum.ToDouble(figures[Plan.UseSquare]), FixedPointSum.ToDouble(figures[Plan.UseSquare + 1]));

    /// <summary>A sum over lots at a place.</summary>
    public double Node(int node, NodeFigure figure) =>
        FixedPointSum.ToDouble(figures[Plan.FirstNode + (node * TallyPlan.FiguresPerNode) + (int)figure]);
}
