using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.Planning;

/// <summary>
/// All temperature lists with the same first, last and number of temperatures. They cost the same, whatever lies between.
/// </summary>
/// <param name="First">Index of the coldest candidate.</param>
/// <param name="Last">Index of the hottest candidate.</param>
/// <param name="Count">How many temperatures.</param>
/// <param name="Minutes">Chamber minutes of each.</param>
internal readonly record struct PlanFamily(int First, int Last, int Count, double Minutes);

/// <summary>The space of candidate plans of an application, by family.</summary>
internal sealed class PlanFamilies
{
    private readonly CompensationScope scope;

    public PlanFamilies(Application application)
    {
        Requirement requirement = application.Requirement;
        scope = requirement.Compensation;
        Candidates = CandidateTemperatures.Of(scope, requirement.Temperature);
        All = [.. FamiliesOf(requirement, application.Station).OrderBy(f => f.Minutes).ThenBy(f => f.Count).ThenBy(f => f.First).ThenBy(f => f.Last)];
        DegreesOf = [.. Enumerable.Range(0, scope.MostTemperatures + 1).Select(n => DegreePairs(n, application.Platform))];
    }

    /// <summary>The candidate temperatures, rising.</summary>
    public IReadOnlyList<Temperature> Candidates { get; }

    /// <summary>Every family with at least one plan, cheapest first.</summary>
    public IReadOnlyList<PlanFamily> All { get; }

    /// <summary>The pairs of degrees to be tried for a number of temperatures, the index.</summary>
    public IReadOnlyList<IReadOnlyList<(int Zero, int Span)>> DegreesOf { get; }

    /// <summary>How many plans there are.</summary>
    public long PlanCount() => All.Sum(f => ListsIn(f) * DegreesOf[f.Count].Count);

    /// <summary>
    /// Calls back with each temperature list of a family, rising and in the order of the lists; <paramref name="second"/> fixes its second
    /// temperature so that a family can be shared out.
    /// </summary>
    public void ForEachList(PlanFamily family, int second, Action<int[]> visit)
    {
        var list = new int[family.Count];
        list[0] = family.First;
        list[^1] = family.Last;
        if (family.Count > 2)
            list[1] = second;
        Fill(list, Math.Min(2, family.Count - 1), visit);
    }

    /// <summary>The second temperatures that lists of a family can have; the last one for a family of two.</summary>
    public IEnumerable<int> SecondsOf(PlanFamily family)
    {
        if (family.Count == 2)
            return [family.Last];
        return Enumerable.Range(family.First + 1, family.Last - family.First - 1)
            .Where(i => Apart(family.First, i) && Apart(i, family.Last));
    }

    /// <summary>How many temperature lists a family has, without listing them.</summary>
    public long ListsIn(PlanFamily family)
    {
        var ways = new long[Candidates.Count];
        ways[family.First] = 1;
        for (int step = 1; step < family.Count; step++)
        {
            var next = new long[Candidates.Count];
            for (int i = family.First; i <= family.Last; i++)
                for (int j = i + 1; ways[i] > 0 && j <= family.Last; j++)
                    if (Apart(i, j) && (j < family.Last || step == family.Count - 1))
                        next[j] += ways[i];
            ways = next;
        }

        return ways[family.Last];
    }

    private void Fill(int[] list, int place, Action<int[]> visit)
    {
        int last = list.Length - 1;
        if (place >= last)
        {
            if (Apart(list[last - 1], list[last]))
                visit(list);
            return;
        }

        for (int i = list[place - 1] + 1; i < list[last]; i++)
        {
            if (!Apart(list[place - 1], i))
                continue;
            list[place] = i;
            Fill(list, place + 1, visit);
        }
    }

    /// <summary>Whether two candidates are at least the separation apart; decimal steps leave no doubt by 10⁻⁹ K.</summary>
    private bool Apart(int colder, int hotter) => (Candidates[hotter] - Candidates[colder]).Kelvin >= scope.Separation.Kelvin - 1e-9;

    private IEnumerable<PlanFamily> FamiliesOf(Requirement requirement, Station station)
    {
        double reach = scope.Reach.Kelvin + 1e-9;
        int[] firsts = [.. Indices().Where(i => (Candidates[i] - requirement.Temperature.Lower).Kelvin <= reach)];
        int[] lasts = [.. Indices().Where(i => (requirement.Temperature.Upper - Candidates[i]).Kelvin <= reach)];
        return from count in Enumerable.Range(scope.FewestTemperatures, scope.MostTemperatures - scope.FewestTemperatures + 1)
               from first in firsts
               from last in lasts
               where last > first
               let points = station.PressurePoints.Reference.Count + ((count - 1) * station.PressurePoints.Others.Count)
               let minutes = ChamberRun.Minutes(Candidates[first], Candidates[last], count, points, station.Chamber)
               let family = new PlanFamily(first, last, count, minutes)
               where ListsIn(family) > 0
               select family;
    }

    private IEnumerable<int> Indices() => Enumerable.Range(0, Candidates.Count);

    /// <summary><c>d_z</c> from <c>max(1, m − 1)</c> to <c>m = min(n − 1, zero-degree)</c>, <c>d_s</c> likewise.</summary>
    private static (int Zero, int Span)[] DegreePairs(int temperatures, Platform platform) =>
    [
        .. from zero in Degrees(temperatures, platform.ZeroDegree)
           from span in Degrees(temperatures, platform.SpanDegree)
           select (zero, span),
    ];

    private static IEnumerable<int> Degrees(int temperatures, int highest)
    {
        int most = Math.Min(temperatures - 1, highest);
        return Enumerable.Range(1, Math.Max(0, most)).Where(d => d >= most - 1);
    }
}
