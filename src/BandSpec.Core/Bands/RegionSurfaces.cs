using BandSpec.Core.Numerics;
using BandSpec.Core.Requirements;
using BandSpec.Core.Residuals;

namespace BandSpec.Core.Bands;

/// <summary>
/// What a plan's margin in one region is made of, as polynomials in the pressure fraction <c>x</c> and the place <c>v = 0 … 1</c> between
/// the region's ends. Everything with a kink is taken apart into smooth branches: <c>max(|μ|, |μ + d|)</c> is the largest of ±μ and ±(μ + d),
/// the allowance the largest of its line and of ± the reading, so that the room <c>D − M</c> is, for the best allowance, the least of four.
/// </summary>
internal sealed class RegionSurfaces
{
    public RegionSurfaces(
        Requirement requirement, AllowedErrorRegion region, ResidueSurface residue, SteadyPolynomials steady, TemperatureScale scale)
    {
        double from = scale.Scaled(region.From), slope = scale.Scaled(region.To) - from;
        Surface Inside(Surface s) => s.SubstituteT(from, slope);
        Surface mean = Inside(residue.Mean), added = Surface.Product(steady.Added, [1]), drift = Surface.Product(steady.Drift, [1]);
        Surface drifted = Surface.Add(mean, drift);
        Rooms =
        [
            .. Allowances(requirement, region).Select(allowance =>
            {
                Surface room = Surface.Add(allowance, added, -1);
                return (Surface[])[Surface.Add(room, mean, -1), Surface.Add(room, mean), Surface.Add(room, drifted, -1), Surface.Add(room, drifted)];
            }),
        ];
        Surface fixedVariance = Surface.Product(steady.Variance, [1]);
        Needs =
        [
            Scaled(Surface.Add(Inside(residue.Within), fixedVariance), 3 * requirement.Capability.Sample),
            Scaled(Surface.Add(Inside(residue.LongRun), fixedVariance), 3 * requirement.Capability.LongRun),
        ];
    }

    /// <summary>For each branch of the allowance the four branches of the room, %FS.</summary>
    public IReadOnlyList<Surface[]> Rooms { get; }

    /// <summary>For each criterion <c>(3Cσ)²</c>, (%FS)².</summary>
    public IReadOnlyList<Surface> Needs { get; }

    /// <summary><c>D = A/S</c> by branches: the line between the region's ends, and the reading for either sign of the pressure.</summary>
    private static IEnumerable<Surface> Allowances(Requirement requirement, AllowedErrorRegion region)
    {
        double from = region.Limit.Percent, to = (region.LimitAtEnd ?? region.Limit).Percent;
        yield return Scaled(Surface.Product([1], [from, to - from]), 1 / Math.Sqrt(requirement.SafetyFactor));
        if (region.OfReading <= 0)
            yield break;
        double lower = requirement.Pressure.At(0).Pascals / requirement.Pressure.SpanInPascals;
        double ratio = 100 * region.OfReading / requirement.SafetyFactor;
        yield return Surface.Product([ratio * lower, ratio], [1]);
        yield return Surface.Product([-ratio * lower, -ratio], [1]);
    }

    private static Surface Scaled(Surface surface, double root) => Surface.Add(Surface.Product([], []), surface, root * root);
}
