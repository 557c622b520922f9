namespace BandSpec.Core.VirtualLots;

/// <summary>
/// Mean and spreads at one place from the sums over lots, with the standard error of any of their combinations. Every lot gives a mean
/// <c>m</c> and a variance within, <c>w</c>; lots are independent, so the scatter of <c>m</c>, <c>w</c> and
/// <c>g = (m − m̄)² + (1 − 1/n)·w</c>, whose mean is the variance over lots, tells how uncertain their means are, whatever the law of the
/// errors (delta method).
/// </summary>
internal sealed class NodeFigures
{
    private readonly double lots;
    private readonly double varianceOfMean;
    private readonly double varianceOfWithin;
    private readonly double varianceOfWhole;
    private readonly double meanWithWithin;
    private readonly double meanWithWhole;
    private readonly double wholeWithWithin;

    /// <summary>The figures of a place.</summary>
    /// <param name="tally">The sums.</param>
    /// <param name="node">Index of the place.</param>
    /// <param name="lotSize">Units in a lot, <c>n</c>.</param>
    public NodeFigures(LotTally tally, int node, int lotSize)
    {
        lots = tally.Lots;
        double Average(NodeFigure figure) => tally.Node(node, figure) / lots;
        double m = Average(NodeFigure.Mean);
        double m2 = Average(NodeFigure.Mean2);
        double m3 = Average(NodeFigure.Mean3);
        double w = Average(NodeFigure.Within);
        double mw = Average(NodeFigure.MeanWithin);
        double part = 1 - (1.0 / lotSize);
        double c2 = m2 - (m * m);
        double c3 = m3 - (3 * m * m2) + (2 * m * m * m);
        double c4 = Average(NodeFigure.Mean4) - (4 * m * m3) + (6 * m * m * m2) - (3 * m * m * m * m);
        double squareWithWithin = Average(NodeFigure.Mean2Within) - (2 * m * mw) + (m * m * w) - (c2 * w);
        (Off, varianceOfMean, varianceOfWithin, meanWithWithin) = (m, c2, Average(NodeFigure.Within2) - (w * w), mw - (m * w));
        varianceOfWhole = c4 - (c2 * c2) + (2 * part * squareWithWithin) + (part * part * varianceOfWithin);
        meanWithWhole = c3 + (part * meanWithWithin);
        wholeWithWithin = squareWithWithin + (part * varianceOfWithin);
        SigmaSample = Math.Sqrt(Math.Max(0, w));
        SigmaLongRun = Math.Sqrt(Math.Max(0, (c2 * lots / (lots - 1)) + (part * w)));
        double residue = Average(NodeFigure.Residue);
        ResidueOff = residue;
        ResidueError = Math.Sqrt(Math.Max(0, Average(NodeFigure.Residue2) - (residue * residue)) / lots);
    }

    /// <summary>Mean of the whole error less its nominal value.</summary>
    public double Off { get; }

    /// <summary>Standard deviation within a lot.</summary>
    public double SigmaSample { get; }

    /// <summary>Standard deviation over lots.</summary>
    public double SigmaLongRun { get; }

    /// <summary>Mean of what compensation left over, less its nominal value.</summary>
    public double ResidueOff { get; }

    /// <summary>Its standard error.</summary>
    public double ResidueError { get; }

    /// <summary>Standard error of <c>a·mean + b·σ_w + c·σ_t</c>.</summary>
    public double ErrorOf(double a, double b, double c)
    {
        double within = SigmaSample > 0 ? b / (2 * SigmaSample) : 0;
        double whole = SigmaLongRun > 0 ? c / (2 * SigmaLongRun) : 0;
        double variance = (a * a * varianceOfMean) + (within * within * varianceOfWithin) + (whole * whole * varianceOfWhole)
            + (2 * a * within * meanWithWithin) + (2 * a * whole * meanWithWhole) + (2 * within * whole * wholeWithWithin);
        return Math.Sqrt(Math.Max(0, variance) / lots);
    }
}
