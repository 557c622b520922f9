using BandSpec.Core.Bands;
using BandSpec.Core.Specifying;

namespace BandSpec.Documents.Charts;

/// <summary>The curves of a specification over temperature, from the figures before rounding: the worst pressure of each temperature. Errors in %FS, temperatures in °C.</summary>
internal sealed record BandCurves(IReadOnlyList<Spot> Allowed, IReadOnlyList<Spot> Design, IReadOnlyList<Spot> Maximum, IReadOnlyList<Spot> Typical)
{
    /// <summary>The curves of a specification; without a safety factor the design band is the allowed error, and left empty.</summary>
    public static BandCurves Of(Specification specification) => new(
        OverTemperature(specification, nodes => nodes.Min(n => n.Allowed.Percent)),
        specification.Application.Requirement.SafetyFactor > 1 ? OverTemperature(specification, nodes => nodes.Min(n => n.Design.Percent)) : [],
        OverTemperature(specification, nodes => nodes.Max(n => n.Maximum.Percent)),
        OverTemperature(specification, nodes => nodes.Max(n => n.Typical.Percent)));

    // A region's edge appears once for each neighbour, so that a step in the allowance is drawn upright.
    private static Spot[] OverTemperature(Specification specification, Func<IEnumerable<BandNode>, double> worst) =>
        [.. specification.Bands.Nodes.GroupBy(n => (n.Region, n.Temperature)).Select(g => new Spot(g.Key.Temperature.Celsius, worst(g)))];
}
