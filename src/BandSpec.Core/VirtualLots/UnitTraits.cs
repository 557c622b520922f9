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

    /// <summary>
    /// By how much truncation at zero raises thermal hysteresis and half the pressure hysteresis at its peak, together:
    /// <c>σ·φ(α)/Φ(α)</c> with <c>α = mean/σ</c> each.
    /// </summary>
    public double TruncationShift => ShiftOf(thermal) + (ShiftOf(hysteresis) / 2);

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

    private static double ShiftOf(Spread spread)
    {
        double alpha = spread.Sigma.Percent > 0 ? spread.Mean.Percent / spread.Sigma.Percent : double.PositiveInfinity;
        return alpha < 38 ? spread.Sigma.Percent * NormalTail.Density(alpha) / (1 - NormalTail.Probability(alpha)) : 0;
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
