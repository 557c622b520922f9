using System.Runtime.Intrinsics;
using BandSpec.Core.Requirements;
using Lanes = System.Runtime.Intrinsics.Vector512<double>;

namespace BandSpec.Core.VirtualLots;

/// <summary>
/// The customer's temperature profile as something to draw from: temperatures by dwell, uniform inside a bin, pressures at the eleven nodes
/// by their trapezoid weights, and what is allowed at each.
/// </summary>
internal sealed class UseProfile
{
    private readonly Stretch[] stretches;
    private readonly Allowance[] allowances;
    private readonly double lowerFraction;
    private readonly UnitTraits traits;
    private readonly NominalError nominal;

    /// <summary>The profile of a subject.</summary>
    public UseProfile(LotSubject subject, ShapePlaces places, NominalError nominal, UnitTraits traits)
    {
        (Places, this.nominal, this.traits) = (places, nominal, traits);
        Requirement requirement = subject.Requirement;
        double Tau(Quantities.Temperature t) => (t - subject.Platform.Temperature.Reference).Kelvin / 100;
        double total = requirement.Profile.Sum(b => b.Dwell.Hours);
        double before = 0;
        stretches = new Stretch[requirement.Profile.Count];
        for (int i = 0; i < stretches.Length; i++)
        {
            DwellBin bin = requirement.Profile[i];
            double share = bin.Dwell.Hours / total;
            stretches[i] = new Stretch(before, Tau(bin.From), share > 0 ? (Tau(bin.To) - Tau(bin.From)) / share : 0);
            before += share;
        }
        allowances = [.. requirement.AllowedError.Select(r => AllowanceOf(r, Tau(r.From), Tau(r.To)))];
        lowerFraction = requirement.Pressure.Lower.Pascals / requirement.Pressure.SpanInPascals;
        Steps = new OutputSteps(requirement.Output);
        Repeatability = subject.Platform.Repeatability.Percent;
        HistogramEnd = 1.5 * requirement.AllowedError.Max(r => Math.Max(r.Limit.Percent, (r.LimitAtEnd ?? r.Limit).Percent));
    }

    /// <summary>Where the coefficients of an error stand.</summary>
    public ShapePlaces Places { get; }

    /// <summary>The output's steps.</summary>
    public OutputSteps Steps { get; }

    /// <summary>Standard deviation of the unit's repeatability.</summary>
    public double Repeatability { get; }

    /// <summary>The upper end of the histogram's closed bins, %FS; the lower is its opposite.</summary>
    public double HistogramEnd { get; }

    /// <summary>The part of the final drift reached after a part of the life.</summary>
    public double DriftAfter(double partOfLife) => Numerics.RandomStreams.PortableFunctions.Power(partOfLife, traits.TimeExponent);

    /// <summary>Every number of the profile, to tell one from another.</summary>
    public IEnumerable<double> Numbers =>
        stretches.SelectMany(s => new[] { s.Before, s.From, s.Slope })
            .Concat(allowances.SelectMany(a => new[] { a.From, a.AtZero, a.Slope, a.OfReading })).Append(lowerFraction);

    /// <summary>Reduced temperatures at uniform numbers: the inverse of the distribution of dwell.</summary>
    public Lanes Temperatures(Lanes uniform)
    {
        Lanes tau = Lanes.Zero;
        foreach (Stretch stretch in stretches)
        {
            Lanes here = Vector512.FusedMultiplyAdd(
                uniform - Vector512.Create(stretch.Before), Vector512.Create(stretch.Slope), Vector512.Create(stretch.From));
            tau = Vector512.ConditionalSelect(Vector512.GreaterThanOrEqual(uniform, Vector512.Create(stretch.Before)), here, tau);
        }
        return tau;
    }

    /// <summary>Pressure fractions at uniform numbers: the nearest of 0, 0.1 … 1, which gives both ends half the weight of the others.</summary>
    public static Lanes Pressures(Lanes uniform) => Vector512.Round(uniform * Vector512.Create(10.0)) / Vector512.Create(10.0);

    /// <summary>What is allowed at pressures and reduced temperatures.</summary>
    public Lanes Allowed(Lanes x, Lanes tau)
    {
        Lanes allowed = Lanes.Zero;
        Lanes magnitude = Vector512.Abs(x + Vector512.Create(lowerFraction));
        foreach (Allowance allowance in allowances)
        {
            Lanes line = Vector512.FusedMultiplyAdd(tau, Vector512.Create(allowance.Slope), Vector512.Create(allowance.AtZero));
            Lanes here = Vector512.Max(line, Vector512.Create(100 * allowance.OfReading) * magnitude);
            allowed = Vector512.ConditionalSelect(Vector512.GreaterThanOrEqual(tau, Vector512.Create(allowance.From)), here, allowed);
        }
        return allowed;
    }

    /// <summary>
    /// Where the mean unit stands: the side on which the band is nearer, and the mean drift to be taken off where the new unit is the worse.
    /// </summary>
    public (Lanes Side, Lanes MeanDriftOff) NearerSide(in LaneShapes shapes, Lanes tau)
    {
        Lanes fresh = nominal.At(shapes, tau);
        Lanes drift = Vector512.FusedMultiplyAdd(
            shapes.Span, Vector512.Create(traits.MeanDrift(1) - traits.MeanDrift(0)), Vector512.Create(traits.MeanDrift(0)));
        Lanes freshIsWorse = Vector512.GreaterThan(Vector512.Abs(fresh), Vector512.Abs(fresh + drift));
        Lanes worse = Vector512.ConditionalSelect(freshIsWorse, fresh, fresh + drift);
        return (LaneMasks.WithSign(Lanes.One, worse), freshIsWorse & drift);
    }

    /// <summary>The sums of the further bounds at pressures.</summary>
    public Lanes Bounds(Lanes x) =>
        Vector512.FusedMultiplyAdd(x, Vector512.Create(traits.ProportionalBound), Vector512.Create(traits.ConstantBound));

    private static Allowance AllowanceOf(AllowedErrorRegion region, double from, double to)
    {
        double atStart = region.Limit.Percent;
        double slope = to > from ? ((region.LimitAtEnd ?? region.Limit).Percent - atStart) / (to - from) : 0;
        return new Allowance(from, atStart - (slope * from), slope, region.OfReading);
    }

    /// <summary>A bin of the profile: the dwell before it as a part of all, its colder end, its width per part of dwell.</summary>
    private readonly record struct Stretch(double Before, double From, double Slope);

    /// <summary>A region: its colder end, and the allowed error as a line in reduced temperature.</summary>
    private readonly record struct Allowance(double From, double AtZero, double Slope, double OfReading);
}
