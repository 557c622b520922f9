using BandSpec.Core.Numerics;
using BandSpec.Core.Requirements;
using BandSpec.Core.Residuals;

namespace BandSpec.Core.Bands;

/// <summary>
/// A part of a region in which everything a margin is made of is smooth, as polynomials in <c>u, v = 0 … 1</c>. Where the allowance passes
/// from its line to the reading there is a kink; the parts meet there, so that <c>x</c> runs between two lines in <c>v</c>. The other kink,
/// <c>max(|μ|, |μ + d|)</c>, is the largest of ±μ and ±(μ + d): the room <c>D − M</c> is the least of four branches.
/// </summary>
internal sealed class RegionPiece
{
    private readonly double[] lower;
    private readonly double[] upper;
    private readonly double[] along;

    private RegionPiece(Requirement requirement, PieceBounds bounds, RegionErrors errors)
    {
        (lower, upper, along) = (bounds.Lower, bounds.Upper, bounds.Along);
        Surface x = Surface.Product([1], lower);
        x = Surface.Add(x, Surface.Product([0, 1], Polynomials.Add(upper, lower, -1)));
        Surface Inside(Surface s) => s.Substitute(x, along);
        Surface room = Inside(Surface.Add(bounds.Allowance, errors.Added, -1)), mean = Inside(errors.Mean), drift = Inside(errors.Drift);
        Surface drifted = Surface.Add(mean, drift);
        Rooms = [Surface.Add(room, mean, -1), Surface.Add(room, mean), Surface.Add(room, drifted, -1), Surface.Add(room, drifted)];
        Needs = [Need(Inside(errors.Within), requirement.Capability.Sample), Need(Inside(errors.LongRun), requirement.Capability.LongRun)];
    }

    /// <summary>The branches of the room, %FS.</summary>
    public IReadOnlyList<Surface> Rooms { get; }

    /// <summary>For each criterion <c>(3Cσ)²</c>, (%FS)².</summary>
    public IReadOnlyList<Surface> Needs { get; }

    /// <summary>The parts of a region.</summary>
    public static IEnumerable<RegionPiece> AllOf(
        Requirement requirement, AllowedErrorRegion region, ResidueSurface residue, SteadyPolynomials steady, TemperatureScale scale)
    {
        double from = scale.Scaled(region.From), to = scale.Scaled(region.To);
        var errors = RegionErrors.Of(residue, steady, [from, to - from]);
        return PieceBounds.AllOf(requirement, region).Select(b => new RegionPiece(requirement, b, errors));
    }

    /// <summary>The pressure fraction and the place between the region's ends, 0 … 1, of a point.</summary>
    public (double Fraction, double Along) PlaceOf(double u, double v)
    {
        double low = lower[0] + (lower[1] * v), high = upper[0] + (upper[1] * v);
        return (Math.Clamp(((1 - u) * low) + (u * high), 0, 1), Math.Clamp(along[0] + (along[1] * v), 0, 1));
    }

    private static Surface Need(Surface variance, double capability) => Surface.Multiply(Surface.Product([9 * capability * capability], [1]), variance);

    /// <summary>The errors of a region in <c>x</c> and the place between its ends.</summary>
    private sealed record RegionErrors(Surface Mean, Surface Added, Surface Drift, Surface Within, Surface LongRun)
    {
        public static RegionErrors Of(ResidueSurface residue, SteadyPolynomials steady, double[] scaled)
        {
            Surface same = Surface.Product([0, 1], [1]), variance = Surface.Product(steady.Variance, [1]);
            return new RegionErrors(
                residue.Mean.Substitute(same, scaled), Surface.Product(steady.Added, [1]), Surface.Product(steady.Drift, [1]),
                Surface.Add(residue.Within.Substitute(same, scaled), variance), Surface.Add(residue.LongRun.Substitute(same, scaled), variance));
        }
    }
}
