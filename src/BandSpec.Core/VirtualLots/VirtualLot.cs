using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;
using Lanes = System.Runtime.Intrinsics.Vector512<double>;

namespace BandSpec.Core.VirtualLots;

/// <summary>
/// Makes lots one after the other in the same room: draw the units, read and compensate them, test them, use them everywhere and over their
/// life, count. One instance belongs to one thread.
/// </summary>
internal sealed class VirtualLot
{
    private readonly LotLaw law;
    private readonly LotStreams streams;
    private readonly LotUnits units;
    private readonly MapWalk map;
    private readonly UseWalk use;
    private readonly double[] lotMeans;
    private readonly Lanes[] raw;
    private readonly Lanes[] normals;
    private readonly Lanes[] soak;
    private readonly Lanes[] noise;
    private readonly Lanes[] readings;
    private readonly long[] counts;

    /// <summary>Room for lots of an order.</summary>
    public VirtualLot(LotLaw law, LotOrder order, TallyPlan plan)
    {
        this.law = law;
        streams = new LotStreams(order.Seed);
        units = new LotUnits(order.LotSize / LotOrder.UnitsSideBySide, law.Places.Count);
        map = new MapWalk(law.Map, order.LotSize);
        use = new UseWalk(law.Profile);
        lotMeans = new double[law.RawError.Count];
        raw = new Lanes[law.Places.Count];
        normals = new Lanes[law.RawError.Count];
        soak = new Lanes[law.Run.Points];
        noise = new Lanes[law.Run.Points];
        readings = new Lanes[law.Run.Points];
        counts = new long[plan.Counts];
    }

    /// <summary>Makes one lot and adds it to a tally.</summary>
    /// <param name="lot">The lot's number.</param>
    /// <param name="tally">The tally to add to.</param>
    public void Make(long lot, LotTally tally)
    {
        ulong firstUnit = (ulong)lot * (ulong)(units.Groups * LotOrder.UnitsSideBySide);
        counts.AsSpan().Clear();
        law.RawError.DrawLot(streams.Lot, (ulong)lot, lotMeans);
        for (int group = 0; group < units.Groups; group++)
            Compensate(LotStreams.Group(firstUnit, group), group);
        law.Traits.Draw(streams, firstUnit, units);
        law.Test.Test(streams, firstUnit, units, tally.Plan, counts);
        map.Walk(streams.Map, firstUnit, units, tally, counts);
        use.Walk(streams, firstUnit, units, tally, counts);
        Judge();
        tally.AddCounts(counts);
    }

    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    private void Compensate(Vector512<ulong> group, int index)
    {
        Span<Lanes> standard = stackalloc Lanes[2];
        streams.RawError.FillNormals(group, 0, normals);
        streams.Soak.FillNormals(group, 0, soak);
        streams.Reading.FillNormals(group, 0, noise);
        streams.Standard.FillNormals(group, 0, standard);
        law.RawError.Unit(lotMeans, normals, raw);
        law.Run.Compensate(new RunChance(soak, noise, standard), readings, raw);
        for (int place = 0; place < raw.Length; place++)
            units.Error[(place * units.Groups) + index] = raw[place];
    }

    private void Judge()
    {
        for (int group = 0; group < units.Groups; group++)
        {
            Lanes accepted = units.Accepted[group];
            Lanes good = ~units.Leaves[group];
            counts[(int)Counted.Good] += LaneMasks.Count(good);
            counts[(int)Counted.GoodRejected] += LaneMasks.Count(Vector512.AndNot(good, accepted));
            counts[(int)Counted.AcceptedLeaving] += LaneMasks.Count(accepted & units.Leaves[group]);
            counts[(int)Counted.AcceptedLeavingNew] += LaneMasks.Count(accepted & units.LeavesNew[group]);
        }
    }
}
