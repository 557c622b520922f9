using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;
using BandSpec.Core.Numerics.RandomStreams;
using Lanes = System.Runtime.Intrinsics.Vector512<double>;

namespace BandSpec.Core.VirtualLots;

/// <summary>
/// Uses every unit of a lot once at every place of the map, new and at the end of life, and sees who leaves the allowed error. Both ends of
/// life are enough: the drift grows one way, and an error that moves along a line is largest at one of its ends. Everything that only adds
/// is added to the side on which the unit already is. One reading a place: repeatability is drawn for each, the same for both ages.
/// </summary>
/// <param name="map">The places.</param>
/// <param name="lotSize">Units in a lot.</param>
internal sealed class MapWalk(UseMap map, int lotSize)
{
    private const int Draws = (UseMap.Pressures + 1) / 2;

    private readonly Lanes[] added = new Lanes[UseMap.Pressures * (lotSize / LotOrder.UnitsSideBySide)];
    private readonly Lanes[] drift = new Lanes[UseMap.Pressures * (lotSize / LotOrder.UnitsSideBySide)];
    private readonly Lanes[] further = new Lanes[UseMap.Pressures * (lotSize / LotOrder.UnitsSideBySide)];
    private readonly Lanes[] sums = new Lanes[3 * UseMap.Pressures];

    /// <summary>Walks the map with a lot.</summary>
    public void Walk(RandomStream noise, ulong firstUnit, LotUnits lot, LotTally tally, Span<long> counts)
    {
        Prepare(lot);
        lot.Leaves.AsSpan().Clear();
        lot.LeavesNew.AsSpan().Clear();
        for (int c = 0; c < map.Columns.Length; c++)
        {
            MapColumn column = map.Columns[c];
            if (c == 0 || map.Columns[c - 1].Region != column.Region)
                lot.LeavesRegion.AsSpan().Clear();
            sums.AsSpan().Clear();
            for (int group = 0; group < lot.Groups; group++)
                Step(column, noise, LotStreams.Group(firstUnit, group), (uint)(c * Draws), lot, group);
            Record(c, tally);
            if (c == map.Columns.Length - 1 || map.Columns[c + 1].Region != column.Region)
                CloseRegion(column.Region, lot, counts);
        }
    }

    /// <summary>What depends on unit and pressure only, worked out once for all temperatures.</summary>
    private void Prepare(LotUnits lot)
    {
        for (int group = 0; group < lot.Groups; group++)
            for (int i = 0; i < UseMap.Pressures; i++)
            {
                int at = (group * UseMap.Pressures) + i;
                Lanes x = Vector512.Create(map.Shapes[i].Span);
                added[at] = Vector512.FusedMultiplyAdd(Vector512.Create(map.Shapes[i].Bow), lot.PressureHysteresis[group], lot.ThermalHysteresis[group])
                    + Vector512.Create(map.Bounds[i]);
                drift[at] = Vector512.FusedMultiplyAdd(x, lot.SpanDrift[group], lot.ZeroDrift[group]);
                further[at] = Vector512.FusedMultiplyAdd(x, lot.FurtherProportional[group], lot.FurtherConstant[group]);
            }
    }

    [MethodImpl(MethodImplOptions.AggressiveOptimization)]
    private void Step(MapColumn column, RandomStream noise, Vector512<ulong> units, uint draw, LotUnits lot, int group)
    {
        Span<Lanes> chance = stackalloc Lanes[2 * Draws];
        noise.FillNormals(units, draw, chance);
        Lanes tau = Vector512.Create(column.Tau);
        ReadOnlySpan<Lanes> error = lot.Error.AsSpan(group);
        Lanes zero = map.Places.At(error, lot.Groups, 0, tau);
        Lanes span = map.Places.At(error, lot.Groups, 1, tau);
        Lanes bow = map.Places.At(error, lot.Groups, 2, tau);
        Lanes sShape = map.Places.At(error, lot.Groups, 3, tau);
        Lanes repeatability = Vector512.Create(map.Repeatability);
        Lanes leaves = Lanes.Zero;
        Lanes leavesNew = Lanes.Zero;
        for (int i = 0; i < UseMap.Pressures; i++)
        {
            ref readonly ShapeValues shapes = ref map.Shapes[i];
            int at = (group * UseMap.Pressures) + i;
            Lanes left = Vector512.FusedMultiplyAdd(span, Vector512.Create(shapes.Span), zero);
            left = Vector512.FusedMultiplyAdd(bow, Vector512.Create(shapes.Bow), left);
            left = Vector512.FusedMultiplyAdd(sShape, Vector512.Create(shapes.SShape), left);
            Lanes fresh = Vector512.FusedMultiplyAdd(repeatability, chance[i], left) + further[at];
            Lanes aged = fresh + drift[at];
            Lanes nominal = Vector512.Create(map.NominalSteps[i]);
            Sum(column, i, left, aged, added[at], nominal);

            // The output's steps move an error by half a step at most; only near the limit do they have to be looked at.
            Lanes reach = Vector512.Max(Vector512.Abs(fresh), Vector512.Abs(aged)) + added[at];
            if (Vector512.GreaterThanAny(reach, Vector512.Create(column.Allowed[i] - map.Steps.Step)))
            {
                Lanes allowed = Vector512.Create(column.Allowed[i]);
                Lanes beyondNew = Beyond(fresh, added[at], nominal, allowed);
                leavesNew |= beyondNew;
                leaves |= beyondNew | Beyond(aged, added[at], nominal, allowed);
            }
        }
        lot.LeavesNew[group] |= leavesNew;
        lot.LeavesRegion[group] |= leaves;
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private void Sum(MapColumn column, int i, Lanes left, Lanes aged, Lanes adds, Lanes nominal)
    {
        Lanes whole = Vector512.FusedMultiplyAdd(Vector512.Create(column.Side[i]), adds, aged - Vector512.Create(column.MeanDriftOff[i]));
        Lanes off = map.Steps.Show(whole, nominal) - Vector512.Create(column.Centre[i]);
        sums[3 * i] += off;
        sums[(3 * i) + 1] = Vector512.FusedMultiplyAdd(off, off, sums[(3 * i) + 1]);
        sums[(3 * i) + 2] += left - Vector512.Create(column.Fresh[i]);
    }

    private Lanes Beyond(Lanes error, Lanes adds, Lanes nominal, Lanes allowed) =>
        Vector512.GreaterThan(Vector512.Abs(map.Steps.Show(error + LaneMasks.WithSign(adds, error), nominal)), allowed);

    private void Record(int column, LotTally tally)
    {
        for (int i = 0; i < UseMap.Pressures; i++)
        {
            double sum = LaneMasks.Sum(sums[3 * i]);
            double squares = LaneMasks.Sum(sums[(3 * i) + 1]);
            double within = (squares - (sum * sum / lotSize)) / (lotSize - 1);
            tally.AddNode((column * UseMap.Pressures) + i, sum / lotSize, within, LaneMasks.Sum(sums[(3 * i) + 2]) / lotSize);
        }
    }

    private static void CloseRegion(int region, LotUnits lot, Span<long> counts)
    {
        for (int group = 0; group < lot.Groups; group++)
        {
            lot.Leaves[group] |= lot.LeavesRegion[group];
            counts[TallyPlan.LeavingRegion(region)] += LaneMasks.Count(lot.LeavesRegion[group] & lot.Accepted[group]);
        }
    }
}
