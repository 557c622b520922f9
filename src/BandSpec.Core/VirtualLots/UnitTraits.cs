using System.Runtime.Intrinsics;
using BandSpec.Core.Numerics.RandomStreams;
using BandSpec.Core.Requirements;
using Lanes = System.Runtime.Intrinsics.Vector512<double>;

namespace BandSpec.Core.VirtualLots;

/// <summary>What a unit is besides its raw error: its hystereses, its drift over life, and what the application adds.</summary>
internal sealed class UnitTraits
{
    private readonly Spread hysteresis;
    private readonly Spread thermal;
    private readonly Ageing ageing;
    private readonly FurtherTerm[] further;

    /// <summary>The traits of a platform in an application.</summary>
    public UnitTraits(LotSubject subject)
    {
        hysteresis = subject.Platform.PressureHysteresis;
        thermal = subject.Platform.ThermalHysteresis;
        ageing = subject.Platform.Ageing;
        further = [.. subject.Requirement.FurtherTerms];
        AgeFactor = LifeClock.AgeFactor(ageing, subject.Requirement.Profile);
        TimeExponent = ageing.TimeExponent;
        ConstantBound = further.Where(f => f.Shape == FurtherTermShape.Constant).Sum(f => f.Bound.Percent);
        ProportionalBound = further.Where(f => f.Shape == FurtherTermShape.Proportional).Sum(f => f.Bound.Percent);
    }

    /// <summary>Drift at the end of life as a multiple of the drift in the ageing test.</summary>
    public double AgeFactor { get; }

    /// <summary>The exponent of the time law.</summary>
    public double TimeExponent { get; }

    /// <summary>Sum of the further bounds that are the same at every pressure.</summary>
    public double ConstantBound { get; }

    /// <summary>Sum of the further bounds in proportion to pressure, at the upper range value.</summary>
    public double ProportionalBound { get; }

    /// <summary>Every number of the traits, to tell one from another.</summary>
    public IEnumerable<double> Numbers =>
        new[] { hysteresis, thermal, ageing.Zero, ageing.Span }.SelectMany(s => new[] { s.Mean.Percent, s.Sigma.Percent })
            .Concat(further.SelectMany(f => new[] { f.Bound.Percent, f.Sigma.Percent, (double)f.Shape }))
            .Concat([AgeFactor, TimeExponent]);

    /// <summary>Mean drift at the end of life.</summary>
    public double MeanDrift(double x) => AgeFactor * (ageing.Zero.Mean.Percent + (ageing.Span.Mean.Percent * x));

    /// <summary>All that adds and does not scatter at a pressure, for the mean unit.</summary>
    public double MeanAdded(in ShapeValues shapes) =>
        (hysteresis.Mean.Percent / 2 * shapes.Bow) + thermal.Mean.Percent + ConstantBound + (ProportionalBound * shapes.Span);

    /// <summary>
    /// What one standard deviation of each trait does to the error at a pressure, in the order pressure hysteresis, thermal hysteresis, drift
    /// of zero, drift of span, further terms. Hystereses add on either side; the others turn round with the side.
    /// </summary>
    public double[] Sources(in ShapeValues shapes)
    {
        double x = shapes.Span;
        return
        [
            hysteresis.Sigma.Percent / 2 * shapes.Bow, thermal.Sigma.Percent,
            AgeFactor * ageing.Zero.Sigma.Percent, AgeFactor * ageing.Span.Sigma.Percent * x,
            .. further.Select(f => f.Sigma.Percent * (f.Shape == FurtherTermShape.Constant ? 1 : x)),
        ];
    }

    /// <summary>How many traits scatter.</summary>
    public int Count => 4 + further.Length;

    /// <summary>Half the mean pressure hysteresis at a pressure.</summary>
    public double MeanHysteresis(in ShapeValues shapes) => hysteresis.Mean.Percent / 2 * shapes.Bow;

    /// <summary>By how much truncation at zero changes mean and variance of what the two hystereses add at a pressure.</summary>
    public (double Mean, double Variance) TruncationAt(in ShapeValues shapes)
    {
        (double pressureMean, double pressureVariance) = ChangeOf(hysteresis);
        (double thermalMean, double thermalVariance) = ChangeOf(thermal);
        double half = shapes.Bow / 2;
        return (thermalMean + (half * pressureMean), thermalVariance + (half * half * pressureVariance));
    }

    /// <summary>Draws the traits of a whole lot.</summary>
    public void Draw(LotStreams streams, ulong firstUnit, LotUnits lot)
    {
        Span<Lanes> normals = stackalloc Lanes[2];
        for (int group = 0; group < lot.Groups; group++)
        {
            Vector512<ulong> units = LotStreams.Group(firstUnit, group);
            lot.PressureHysteresis[group] = Vector512.Create(0.5)
                * streams.PressureHysteresis.TruncatedNormals(units, 0, hysteresis.Mean.Percent, hysteresis.Sigma.Percent);
            lot.ThermalHysteresis[group] = streams.ThermalHysteresis.TruncatedNormals(units, 0, thermal.Mean.Percent, thermal.Sigma.Percent);
            streams.Ageing.FillNormals(units, 0, normals);
            lot.ZeroDrift[group] = Drift(ageing.Zero, normals[0]);
            lot.SpanDrift[group] = Drift(ageing.Span, normals[1]);
            DrawFurther(streams.Further, units, lot, group);
        }
    }

    /// <summary>
    /// With <c>α = mean/σ</c> and <c>λ = φ(α)/Φ(α)</c> the truncated mean is larger by <c>σλ</c>, the variance smaller by <c>σ²λ(λ + α)</c>.
    /// </summary>
    private static (double Mean, double Variance) ChangeOf(Spread spread)
    {
        double sigma = spread.Sigma.Percent;
        double alpha = sigma > 0 ? spread.Mean.Percent / sigma : double.PositiveInfinity;
        if (alpha > 38)
            return (0, 0);
        double lambda = NormalTail.Density(alpha) / (1 - NormalTail.Probability(alpha));
        return (sigma * lambda, -sigma * sigma * lambda * (lambda + alpha));
    }

    private Lanes Drift(Spread spread, Lanes normal) =>
        Vector512.FusedMultiplyAdd(
            Vector512.Create(AgeFactor * spread.Sigma.Percent), normal, Vector512.Create(AgeFactor * spread.Mean.Percent));

    private void DrawFurther(RandomStream stream, Vector512<ulong> units, LotUnits lot, int group)
    {
        Lanes constant = Lanes.Zero;
        Lanes proportional = Lanes.Zero;
        for (int i = 0; i < further.Length; i++)
        {
            Lanes value = Vector512.Create(further[i].Sigma.Percent) * stream.Normals(units, (uint)i).First;
            if (further[i].Shape == FurtherTermShape.Constant)
                constant += value;
            else
                proportional += value;
        }
        lot.FurtherConstant[group] = constant;
        lot.FurtherProportional[group] = proportional;
    }
}
