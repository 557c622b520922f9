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
    private readonly HashSet<(int First, int Last)> ends;

    public PlanFamilies(Application application)
    {
        Requirement requirement = application.Requirement;
        scope = requirement.Compensation;
        Candidates = CandidateTemperatures.Of(scope, requirement.Temperature);
        All = [.. FamiliesOf(requirement, application.Station).OrderBy(f => f.Minutes).ThenBy(f => f.Count).ThenBy(f => f.First).ThenBy(f => f.Last)];
        ends = [.. All.Select(f => (f.First, f.Last))];
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

    /// <summary>The families by what they cost, cheapest first; costs that tie are one level.</summary>
    public IEnumerable<IReadOnlyList<PlanFamily>> CostLevels()
    {
        for (int begin = 0, end; begin < All.Count; begin = end)
        {
            end = begin + 1;
            while (end < All.Count && All[end].Minutes <= Contest.TieAbove(All[begin].Minutes))
                end++;
            yield return [.. All.Skip(begin).Take(end - begin)];
        }
    }

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

    /// <summary>Temperatures spread over the widest family as evenly as the separation allows; nothing when no plan has so many.</summary>
    public int[]? SpreadList(int count)
    {
        PlanFamily[] widest = [.. All.Where(f => f.Count == count).OrderByDescending(f => f.Last - f.First).Take(1)];
        if (widest.Length == 0)
            return null;
        (int first, int last) = (widest[0].First, widest[0].Last);
        int[] list = [.. Enumerable.Repeat(last, count)];
        for (int i = count - 2; i > 0; i--)
            while (!Apart(list[i], list[i + 1]))
                list[i]--;
        list[0] = first;
        for (int i = 1; i < count - 1; i++)
        {
            int even = first + (int)Math.Round(i * (double)(last - first) / (count - 1)), latest = list[i];
            list[i] = Math.Min(even, latest);
            while (!Apart(list[i - 1], list[i]))
                list[i]++;
        }

        return list;
    }

    /// <summary>Whether a list is one of the candidate plans.</summary>
    public bool Allows(int[] list)
    {
        if (list[0] < 0)
            return false;
        for (int i = 1; i < list.Length; i++)
            if (list[i] <= list[i - 1] || list[i] >= Candidates.Count || !Apart(list[i - 1], list[i]))
                return false;
        return ends.Contains((list[0], list[^1]));
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
    public bool Apart(int colder, int hotter) => (Candidates[hotter] - Candidates[colder]).Kelvin >= scope.Separation.Kelvin - 1e-9;

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
