using BandSpec.Core.Numerics.RareEvents;

namespace BandSpec.Core.VirtualLots;

/// <summary>
/// That a unit leaves the allowed error, as a union of half-spaces: at each place of the map, on both sides, new and at the end of life,
/// <c>±(left over + age·drift + further + reading) + what adds ≥ A</c>. Repeatability and resolution are each place's own number.
/// </summary>
internal static class LeavingEvents
{
    /// <summary>All events of a law.</summary>
    public static HalfSpaces Of(LotLaw law, LinearUnit unit)
    {
        UseMap map = law.Map;
        HalfSpaces events = new(unit.Dimensions + law.Traits.Count, map.Nodes);
        double own = Math.Sqrt((map.Repeatability * map.Repeatability) + (map.Steps.Step * map.Steps.Step / 12));
        double[] left = new double[unit.Dimensions];
        double[] weights = new double[events.Dimensions];
        for (int node = 0; node < map.Nodes; node++)
        {
            MapColumn column = map.Columns[node / UseMap.Pressures];
            int pressure = node % UseMap.Pressures;
            unit.WeightsAt(map.Shapes[pressure], column.Tau, left);
            foreach (int age in new[] { 0, 1 })
                foreach (int side in new[] { -1, 1 })
                {
                    double drift = age * law.Traits.MeanDrift(map.Shapes[pressure].Span);
                    double mean = (side * (column.Fresh[pressure] + drift)) + law.Traits.MeanAdded(map.Shapes[pressure]);
                    Fill(weights, left, law.Traits.Sources(map.Shapes[pressure]), side, age);
                    events.Add(weights, column.Allowed[pressure] - mean, own, node);
                }
        }
        return events;
    }

    private static void Fill(double[] weights, double[] left, double[] traits, int side, int age)
    {
        const int Hystereses = 2;
        const int Drifts = 2;
        for (int i = 0; i < left.Length; i++)
            weights[i] = side * left[i];
        for (int i = 0; i < traits.Length; i++)
            weights[left.Length + i] = traits[i] * i switch
            {
                < Hystereses => 1,
                < Hystereses + Drifts => side * age,
                _ => side,
            };
    }
}
