using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;
using BandSpec.Core.Numerics.RandomStreams;
using Lanes = System.Runtime.Intrinsics.Vector512<double>;

namespace BandSpec.Core.VirtualLots;

/// <summary>
/// Uses every unit of a lot at moments drawn from its life: temperature and pressure from the profile, the moments spread evenly over the
/// life. Two errors are looked at: the one of that moment, with hysteresis to the side from which pressure and temperature were reached, for
/// the histogram of accepted units; and the worst one of the profile figures, at the end of life with everything on the nearer side.
/// </summary>
/// <param name="profile">What to draw from.</param>
internal sealed class UseWalk(UseProfile profile)
{
    /// <summary>Moments of use of each unit.</summary>
    public const int Moments = 8;

    private readonly double[] driftReached = [.. Enumerable.Range(0, Moments).Select(i => profile.DriftAfter((i + 0.5) / Moments))];
    private readonly long[] bins = new long[TallyPlan.Bins];

    /// <summary>Uses a lot.</summary>
    public void Walk(LotStreams streams, ulong firstUnit, LotUnits lot, LotTally tally, Span<long> counts)
    {
        bins.AsSpan().Clear();
        Lanes squares = Lanes.Zero;
        for (int group = 0; group < lot.Groups; group++)
            for (uint moment = 0; moment < Moments; moment++)
                squares += UseOnce(streams, LotStreams.Group(firstUnit, group), moment, lot, group, counts);
        tally.AddUseSquare(LaneMasks.Sum(squares) / (lot.Groups * LotOrder.UnitsSideBySide * Moments));
        for (int bin = 0; bin < bins.Length; bin++)
            tally.AddToBin(bin, bins[bin]);
    }

    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    private Lanes UseOnce(LotStreams streams, Vector512<ulong> units, uint moment, LotUnits lot, int group, Span<long> counts)
    {
        (Lanes when, Lanes where) = streams.Use.Uniforms(units, moment);
        (Lanes repeated, Lanes repeatedWorst) = streams.UseRepeatability.Normals(units, moment);
        Lanes tau = profile.Temperatures(when);
        LaneShapes shapes = LaneShapes.At(UseProfile.Pressures(where));
        Lanes nominal = profile.Steps.NominalAt(shapes.Span);
        Lanes allowed = profile.Allowed(shapes.Span, tau);
        Lanes left = profile.Places.At(lot.Error.AsSpan(group), lot.Groups, shapes, tau)
            + Vector512.FusedMultiplyAdd(shapes.Span, lot.FurtherProportional[group], lot.FurtherConstant[group]);
        Lanes drift = Vector512.FusedMultiplyAdd(shapes.Span, lot.SpanDrift[group], lot.ZeroDrift[group]);
        Lanes pressure = shapes.Bow * lot.PressureHysteresis[group];
        Lanes thermal = lot.ThermalHysteresis[group] + profile.Bounds(shapes.Span);
        Lanes repeatability = Vector512.Create(profile.Repeatability);

        Lanes now = Vector512.FusedMultiplyAdd(Vector512.Create(driftReached[moment]), drift, left);
        now = Vector512.FusedMultiplyAdd(repeatability, repeated, now) + Sided(streams.UseSide, units, moment, pressure, thermal);
        now = profile.Steps.Show(now, nominal);
        counts[(int)Counted.UseOutside] += LaneMasks.Count(Vector512.GreaterThan(Vector512.Abs(now), allowed) & lot.Accepted[group]);
        Sort(now, lot.Accepted[group]);

        (Lanes side, Lanes meanDriftOff) = profile.NearerSide(shapes, tau);
        Lanes worst = Vector512.FusedMultiplyAdd(repeatability, repeatedWorst, left) + (drift - meanDriftOff);
        worst = profile.Steps.Show(Vector512.FusedMultiplyAdd(side, pressure + thermal, worst), nominal);
        counts[(int)Counted.WorstUseOutside] += LaneMasks.Count(Vector512.GreaterThan(Vector512.Abs(worst), allowed));
        return worst * worst;
    }

    /// <summary>Hysteresis to the side from which pressure and temperature were reached, each side as likely as the other.</summary>
    private static Lanes Sided(RandomStream stream, Vector512<ulong> units, uint moment, Lanes pressure, Lanes thermal)
    {
        (Lanes first, Lanes second) = stream.Uniforms(units, moment);
        Lanes half = Vector512.Create(0.5);
        return LaneMasks.WithSign(pressure, first - half) + LaneMasks.WithSign(thermal, second - half);
    }

    private void Sort(Lanes error, Lanes accepted)
    {
        const double ClosedBins = TallyPlan.Bins - 2;
        double end = profile.HistogramEnd;
        Lanes place = Vector512.Floor((error + Vector512.Create(end)) * Vector512.Create(ClosedBins / (2 * end)));
        place = Vector512.Min(Vector512.Max(place, Vector512.Create(-1.0)), Vector512.Create(ClosedBins));
        ulong taken = accepted.ExtractMostSignificantBits();
        for (int lane = 0; lane < LotOrder.UnitsSideBySide; lane++)
            bins[1 + (int)place[lane]] += (long)(taken >> lane) & 1;
    }
}
