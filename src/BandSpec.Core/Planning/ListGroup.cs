using BandSpec.Core.Residuals;

namespace BandSpec.Core.Planning;

/// <summary>All temperature lists of one length with one form of correction, and the cuts that hold for them.</summary>
internal sealed class ListGroup
{
    private readonly Dictionary<int, OnwardTables> onward;

    public ListGroup(SearchTables tables, int index, PlanForm form, IReadOnlyList<PriceCut> cuts)
    {
        (Index, Form, Cuts) = (index, form, cuts);
        Rows = tables.RowsOf(form.Zero, form.Span);
        onward = tables.Families.All.Where(f => f.Count == form.Count).Select(f => f.Last).Distinct()
            .ToDictionary(last => last, last => new OnwardTables(tables.Families, form.Count, last, cuts));
    }

    /// <summary>Position among the groups of a search.</summary>
    public int Index { get; }

    /// <summary>What its plans have in common.</summary>
    public PlanForm Form { get; }

    /// <summary>What the correction cannot follow.</summary>
    public LeftoverRows Rows { get; }

    /// <summary>Cuts that hold for all its lists; may be none.</summary>
    public IReadOnlyList<PriceCut> Cuts { get; }

    /// <summary>What can follow in lists that end with a candidate.</summary>
    public OnwardTables OnwardTo(int last) => onward[last];
}

/// <summary>What plans of a group have in common. Equality is that of its three parts.</summary>
/// <param name="Count">Number of temperatures.</param>
/// <param name="Zero">Degree of the zero correction.</param>
/// <param name="Span">Degree of the span correction.</param>
internal readonly record struct PlanForm(int Count, int Zero, int Span);

/// <summary>For lists that end with one candidate: in how many ways they go on from each place, and the most that can be paid on the way.</summary>
internal sealed class OnwardTables
{
    private readonly int candidates;
    private readonly long[] ways;
    private readonly double[][] dearest;

    public OnwardTables(PlanFamilies families, int count, int last, IReadOnlyList<PriceCut> cuts)
    {
        candidates = families.Candidates.Count;
        ways = new long[count * candidates];
        dearest = [.. cuts.Select(_ => new double[count * candidates])];
        for (int place = count - 2; place >= 0; place--)
            for (int i = 0; i < last; i++)
                if (place == count - 2)
                    ways[At(place, i)] = families.Apart(i, last) ? 1 : 0;
                else
                    Gather(families, place, i, last, cuts);
    }

    /// <summary>How many lists go on from a candidate at a place.</summary>
    public long Ways(int place, int candidate) => ways[At(place, candidate)];

    /// <summary>The most that the temperatures between a candidate at a place and the last one can pay for a cut.</summary>
    public double Dearest(int cut, int place, int candidate) => dearest[cut][At(place, candidate)];

    private void Gather(PlanFamilies families, int place, int candidate, int last, IReadOnlyList<PriceCut> cuts)
    {
        int at = At(place, candidate);
        for (int j = candidate + 1; j < last; j++)
        {
            int next = At(place + 1, j);
            if (ways[next] == 0 || !families.Apart(candidate, j))
                continue;
            ways[at] += ways[next];
            for (int c = 0; c < cuts.Count; c++)
                dearest[c][at] = Math.Max(dearest[c][at], cuts[c].Prices[j] + dearest[c][next]);
        }
    }

    private int At(int place, int candidate) => (place * candidates) + candidate;
}
