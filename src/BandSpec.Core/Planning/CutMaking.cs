using BandSpec.Core.Bands;

namespace BandSpec.Core.Planning;

/// <summary>
/// Makes the cuts of a search before it begins: from lists picked at even distances a cut is made for each that no earlier cut discards. One
/// after the other and always the same in each group, so that what a search discards does not depend on its threads.
/// </summary>
internal sealed class CutMaking
{
    /// <summary>Fewer lists than this are decided sooner than cut.</summary>
    private const int FewestLists = 2000;

    private const int MostPicked = 512;
    private const int MostTried = 60;

    /// <summary>After so many tries without a cut for most, a group is left without: its plans fail for reasons that prices do not see.</summary>
    private const int EnoughTried = 8;

    private readonly SearchTables tables;
    private readonly IReadOnlyList<NodePlace> added;
    private readonly PlanForm[] forms;

    public CutMaking(SearchTables tables, IReadOnlyList<NodePlace> added)
    {
        (this.tables, this.added) = (tables, added);
        forms =
        [
            .. from count in tables.Families.All.Select(f => f.Count).Distinct().Order()
               from degrees in tables.Families.DegreesOf[count]
               select new PlanForm(count, degrees.Zero, degrees.Span),
        ];
    }

    /// <summary>All groups of a search, without cuts.</summary>
    public IReadOnlyList<ListGroup> Uncut() => [.. forms.Select((f, i) => new ListGroup(tables, i, f, []))];

    /// <summary>All groups of a search with cuts that discard plans of less than a margin.</summary>
    /// <param name="level">The margin; cuts are made for a positive one only.</param>
    /// <param name="threads">How many threads may be used; −1 for one a processor.</param>
    public IReadOnlyList<ListGroup> CutAt(double level, int threads = -1)
    {
        var groups = new ListGroup[forms.Length];
        Parallel.For(
            0, forms.Length, new ParallelOptions { MaxDegreeOfParallelism = threads },
            i => groups[i] = new ListGroup(tables, i, forms[i], CutsFor(forms[i], level)));
        return groups;
    }

    private List<PriceCut> CutsFor(PlanForm form, double level)
    {
        List<PriceCut> cuts = [];
        long lists = tables.Families.All.Where(f => f.Count == form.Count).Sum(tables.Families.ListsIn);
        if (level <= 0 || lists < FewestLists)
            return cuts;
        var tariff = new PriceTables(tables, form.Zero, form.Span);
        if (!tariff.HaveNoise)
            return cuts;
        var making = new MarginPrices(tables, tariff, added, level);
        int tried = 0;
        foreach (int[] list in Picked(form.Count, 1 + (lists / MostPicked)))
        {
            if (cuts.Any(c => c.Discards(list, tables.NearestIn(list))))
                continue;
            if (making.Against(list) is { } cut)
                cuts.Add(cut);
            if (++tried >= MostTried || (tried >= EnoughTried && cuts.Count < tried / 2))
                break;
        }

        return cuts;
    }

    private List<int[]> Picked(int count, long distance)
    {
        List<int[]> picked = [];
        long number = 0;
        foreach (PlanFamily family in tables.Families.All.Where(f => f.Count == count))
            foreach (int second in tables.Families.SecondsOf(family))
                tables.Families.ForEachList(family, second, list =>
                {
                    if (number++ % distance == 0)
                        picked.Add([.. list]);
                });
        return picked;
    }
}
