using BandSpec.Core.Quantities;

namespace BandSpec.Core.Bands;

/// <summary>The band of one plan over the whole operating range.</summary>
/// <param name="Nodes">All nodes, by region, then temperature, then pressure.</param>
/// <param name="Regions">One row a region, cold to hot.</param>
/// <param name="Worst">The node of least margin; the first of several.</param>
public sealed record BandMap(IReadOnlyList<BandNode> Nodes, IReadOnlyList<RegionBand> Regions, BandNode Worst)
{
    /// <summary>The plan's margin: the smallest over all nodes. Feasible when at least 1.</summary>
    public double Margin => Worst.Margin;
}

/// <summary>The band in one temperature region.</summary>
/// <param name="From">Colder end.</param>
/// <param name="To">Hotter end.</param>
/// <param name="AllowedTightest">The smallest allowed error in the region.</param>
/// <param name="Maximum">The largest maximum band in the region.</param>
/// <param name="Typical">The largest typical band in the region.</param>
/// <param name="Worst">The region's node of least margin.</param>
public sealed record RegionBand(
    Temperature From, Temperature To, PercentOfSpan AllowedTightest, PercentOfSpan Maximum, PercentOfSpan Typical, BandNode Worst)
{
    /// <summary>The region's margin.</summary>
    public double Margin => Worst.Margin;
}

/// <summary>What a unit does over the customer's temperature profile.</summary>
/// <param name="RmsError">Dwell-weighted root of the mean of <c>M² + σ_t²</c>.</param>
/// <param name="OutsideProbability">Dwell-weighted probability that the error is larger than allowed, 0 … 1.</param>
/// <param name="EquivalentTime">The service life expressed as time at the ageing test's temperature.</param>
/// <param name="AgeFactor">Drift at the end of life as a multiple of the drift in the ageing test.</param>
public sealed record ProfileFigures(PercentOfSpan RmsError, double OutsideProbability, Duration EquivalentTime, double AgeFactor);

/// <summary>What would be left with a perfect correction, and what no correction at all can beat.</summary>
/// <param name="Worst">The node of least margin when nothing is left of the raw error and only the pressure standard is carried.</param>
/// <param name="Bound">
/// A margin that no plan exceeds. It is above <see cref="Margin"/> where ageing drifts one way: a correction that leaves half the drift with
/// the opposite sign does better than a perfect one.
/// </param>
public sealed record BandFloor(BandNode Worst, double Bound)
{
    /// <summary>The margin with a perfect correction.</summary>
    public double Margin => Worst.Margin;
}
