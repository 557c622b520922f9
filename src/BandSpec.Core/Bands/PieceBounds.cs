using BandSpec.Core.Numerics;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.Bands;

/// <summary>
/// One part of a region under one branch of its allowance. <c>Along</c> is the place between the region's ends, and <c>Lower</c> and
/// <c>Upper</c> the pressure fractions between which the part lies, all lines in <c>v = 0 … 1</c>.
/// </summary>
/// <param name="Along">The place between the region's ends, 0 … 1.</param>
/// <param name="Lower">Lower pressure fraction.</param>
/// <param name="Upper">Upper pressure fraction.</param>
/// <param name="Allowance">Design band <c>D</c> in <c>x</c> and the place between the ends, %FS.</param>
internal sealed record PieceBounds(double[] Along, double[] Lower, double[] Upper, Surface Allowance)
{
    /// <summary>The parts of a region: one, unless it allows a percentage of the reading.</summary>
    public static IEnumerable<PieceBounds> AllOf(Requirement requirement, AllowedErrorRegion region)
    {
        double from = region.Limit.Percent / requirement.SafetyFactor;
        double[] line = [from, ((region.LimitAtEnd ?? region.Limit).Percent / requirement.SafetyFactor) - from];
        Surface limit = Surface.Product([1], line);
        double ratio = 100 * region.OfReading / requirement.SafetyFactor;
        if (ratio <= 0)
            return [new PieceBounds([0, 1], [0, 0], [1, 0], limit)];

        // The reading is ratio·|x − zero|; it takes over where that exceeds the line, at zero ± line/ratio.
        double zero = -requirement.Pressure.At(0).Pascals / requirement.Pressure.SpanInPascals;
        double[] left = [zero - (line[0] / ratio), -line[1] / ratio], right = [zero + (line[0] / ratio), line[1] / ratio];
        Surface rising = Surface.Product([-ratio * zero, ratio], [1]), falling = Surface.Product([ratio * zero, -ratio], [1]);
        return Cuts(left, right).SelectMany(c => (PieceBounds?[])
        [
            Between(c, [0, 0], left, falling), Between(c, left, right, limit), Between(c, right, [1, 0], rising),
        ]).OfType<PieceBounds>();
    }

    /// <summary>The region cut where a kink enters or leaves at either terminal.</summary>
    private static IEnumerable<(double From, double To)> Cuts(double[] left, double[] right)
    {
        double[] crossings = [.. from kink in (double[][])[left, right] from end in (double[])[0, 1] where kink[1] != 0 select (end - kink[0]) / kink[1]];
        double[] cuts = [0, .. crossings.Where(c => c is > 0 and < 1).Distinct().Order(), 1];
        return cuts.Zip(cuts.Skip(1));
    }

    /// <summary>The part between two lines, held inside the terminals; nothing when they leave no room there.</summary>
    private static PieceBounds? Between((double From, double To) cut, double[] lower, double[] upper, Surface allowance)
    {
        double[] along = [cut.From, cut.To - cut.From];
        double[] low = Inside(lower, cut), high = Inside(upper, cut);
        return high[0] <= low[0] && high[0] + high[1] <= low[0] + low[1] ? null : new PieceBounds(along, low, high, allowance);
    }

    /// <summary>A line over a cut: it lies inside the terminals all along, or outside all along.</summary>
    private static double[] Inside(double[] line, (double From, double To) cut)
    {
        double middle = line[0] + (line[1] * (cut.From + cut.To) / 2);
        return middle <= 0 ? [0, 0] : middle >= 1 ? [1, 0] : [line[0] + (line[1] * cut.From), line[1] * (cut.To - cut.From)];
    }
}
