using BandSpec.Core.Bands;
using BandSpec.Core.Numerics;

namespace BandSpec.Core.TestLimits;

/// <summary>
/// Acceptance limits that keep the design band for every unit, not only for the population: a unit that reads exactly on one has, everywhere in use, at least
/// the capability over lots, given that reading and nothing else.
/// </summary>
internal static class EveryUnitLimits
{
    /// <summary>
    /// The largest half width at each test place, %FS; negative where even the best reading leaves too little. With <c>k = Cov(e, r)/Var(r)</c> for an error
    /// <c>e</c> in use and the reading <c>r</c>, a unit that reads <c>A</c> has the mean <c>E e + k(A − E r)</c> and the variance <c>Var(e) − k² Var(r)</c>; so
    /// <c>kA ≤ D − E e + k E r − 3C_l σ(e|r)</c> at every place, side and age.
    /// </summary>
    /// <param name="law">The law of the units.</param>
    /// <param name="nodes">The places of use that the law was made with.</param>
    /// <param name="capability">The capability index over lots, <c>C_l</c>.</param>
    public static double[] Of(UnitLaw law, IReadOnlyList<BandNode> nodes, double capability)
    {
        (LinearError Error, double Design)[] uses =
            [.. from n in Enumerable.Range(0, nodes.Count) from s in UnitLaw.Sides select (law.Used(n, s.Side, s.Age), nodes[n].Design.Percent)];
        return [.. Enumerable.Range(0, law.Places).Select(place => HalfWidth(law, place, uses, capability))];
    }

    private static double HalfWidth(UnitLaw law, int place, (LinearError Error, double Design)[] uses, double capability)
    {
        LinearError shown = law.Shown(place);
        double total = (shown.Sigma * shown.Sigma) + law.ReadingVariance(place), least = double.PositiveInfinity;
        foreach ((LinearError error, double design) in uses)
        {
            double along = Vectors.Dot(error.Weights, shown.Weights), slope = along / total;
            double left = Math.Sqrt(Math.Max(0, (error.Sigma * error.Sigma) - (slope * along)));
            double room = design - error.Mean + (slope * shown.Mean) - (3 * capability * left);
            // Both limits are as far from zero: the reading on the side where the error grows decides.
            least = Math.Min(least, slope != 0 ? room / Math.Abs(slope) : room < 0 ? -1 : least);
        }

        return least;
    }
}
