using BandSpec.Core.Requirements;

namespace BandSpec.Core.Bands;

/// <summary>What would be left with a perfect correction, and what no correction at all can beat.</summary>
/// <param name="Worst">The node of least margin when nothing is left of the raw error and only the pressure standard is carried.</param>
/// <param name="Bound">
/// A margin that no plan exceeds; 0 when not even a unit without scatter fits. It is above <see cref="Margin"/> where ageing drifts one way:
/// a correction that leaves half the drift with the opposite sign does better than a perfect one.
/// </param>
public sealed record BandFloor(BandNode Worst, double Bound)
{
    /// <summary>The margin with a perfect correction.</summary>
    public double Margin => Worst.Margin;

    /// <summary>The floor of an application, over its design nodes.</summary>
    public static BandFloor Of(Application application)
    {
        ArgumentNullException.ThrowIfNull(application);
        var formulas = new BandFormulas(application, correction: null);
        BandMap map = BandMap.Of(application.Requirement, formulas, []);
        return new BandFloor(map.Worst, map.Nodes.Min(n => BoundAt(n, formulas.DriftMean(n.PressureFraction), application.Requirement)));
    }

    /// <summary>
    /// The margin at a node when the mean left over is <c>−d/2</c>, the best there is against a drift <c>d</c>:
    /// <c>max(|μ|, |μ + d|) ≥ |d|/2</c> for every <c>μ</c>. No correction scatters less than a perfect one.
    /// </summary>
    private static double BoundAt(BandNode perfect, double drift, Requirement requirement)
    {
        double room = perfect.Design.Percent - perfect.Added.Percent + (Math.Abs(drift) / 2);
        if (room < 0)
            return 0;
        double needed = Math.Max(
            3 * requirement.Capability.Sample * perfect.SigmaSample.Percent,
            3 * requirement.Capability.LongRun * perfect.SigmaLongRun.Percent);
        return needed > 0 ? room / needed : double.PositiveInfinity;
    }
}
