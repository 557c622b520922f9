using BandSpec.Core.Numerics;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.Bands;

/// <summary>The band of one plan over the whole operating range.</summary>
/// <param name="Nodes">All nodes, by region, then temperature, then pressure.</param>
/// <param name="Regions">One row a region, cold to hot.</param>
/// <param name="Worst">The node of least margin; the first of several.</param>
public sealed record BandMap(IReadOnlyList<BandNode> Nodes, IReadOnlyList<RegionBand> Regions, BandNode Worst)
{
    /// <summary>The plan's margin: the smallest over all nodes. Feasible when at least 1.</summary>
    public double Margin => Worst.Margin;

    /// <summary>The band of a plan at all design nodes.</summary>
    /// <param name="application">The application.</param>
    /// <param name="plan">The compensation plan.</param>
    /// <param name="added">
    /// Places between the design nodes that are judged as well; at the temperature of each the eleven pressures join too, so that every
    /// temperature of a map has them.
    /// </param>
    public static BandMap Of(Application application, CompensationPlan plan, IReadOnlyList<NodePlace>? added = null)
    {
        ArgumentNullException.ThrowIfNull(application);
        ArgumentNullException.ThrowIfNull(plan);
        return Of(application.Requirement, BandFormulas.Of(application, plan), added ?? []);
    }

    /// <summary>The band that formulas give at all design nodes and the added ones.</summary>
    internal static BandMap Of(Requirement requirement, BandFormulas formulas, IReadOnlyList<NodePlace> added)
    {
        List<BandNode> nodes = [];
        List<RegionBand> regions = [];
        for (int r = 0; r < requirement.AllowedError.Count; r++)
        {
            AllowedErrorRegion allowance = requirement.AllowedError[r];
            NodePlace[] between = [.. added.Where(a => a.Region == r)];
            List<BandNode> inRegion =
            [
                .. from temperature in DesignNodes.TemperaturesOf(allowance).Concat(between.Select(b => b.Temperature)).Distinct().Order()
                   from fraction in DesignNodes.Fractions.Concat(between.Where(b => b.Temperature == temperature).Select(b => b.PressureFraction))
                       .Distinct().Order()
                   select formulas.At(fraction, temperature, r),
            ];
            nodes.AddRange(inRegion);
            regions.Add(RegionBand.Of(allowance, inRegion, requirement.Rounding));
        }

        return new BandMap(nodes, regions, nodes.MinBy(n => n.Margin)!);
    }
}

/// <summary>The band in one temperature region.</summary>
/// <param name="From">Colder end.</param>
/// <param name="To">Hotter end.</param>
/// <param name="AllowedTightest">The smallest allowed error in the region.</param>
/// <param name="Maximum">The largest maximum band in the region.</param>
/// <param name="Stated">
/// The maximum band as the specification states it: rounded up to the band step, or the tightest allowed error when that is smaller and
/// still not below the maximum.
/// </param>
/// <param name="Typical">The largest typical band in the region, not rounded.</param>
/// <param name="Worst">The region's node of least margin.</param>
public sealed record RegionBand(
    Temperature From, Temperature To, PercentOfSpan AllowedTightest, PercentOfSpan Maximum, PercentOfSpan Stated,
    PercentOfSpan Typical, BandNode Worst)
{
    /// <summary>The region's margin.</summary>
    public double Margin => Worst.Margin;

    /// <summary>The summary of a region's nodes.</summary>
    internal static RegionBand Of(AllowedErrorRegion allowance, IReadOnlyList<BandNode> nodes, RoundingSteps rounding)
    {
        PercentOfSpan allowed = nodes.Min(n => n.Allowed), maximum = nodes.Max(n => n.Maximum);
        var rounded = PercentOfSpan.FromPercent(StepRounding.Up(maximum.Percent, rounding.Band.Percent));
        PercentOfSpan stated = maximum <= allowed && allowed < rounded ? allowed : rounded;
        return new RegionBand(
            allowance.From, allowance.To, allowed, maximum, stated, nodes.Max(n => n.Typical), nodes.MinBy(n => n.Margin)!);
    }
}
