namespace BandSpec.Core.Planning;

/// <summary>
/// Walks through the temperature lists of a family in their order, and past whole groups of them: as soon as the temperatures fixed so far,
/// with the dearest that could still follow, cannot pay the debt of some cut, no list of the group is looked at.
/// </summary>
internal sealed class ListWalk
{
    private readonly PlanFamilies families;
    private readonly CandidateReadings[] candidates;
    private readonly PlanFamily family;
    private readonly IReadOnlyList<PriceCut> cuts;
    private readonly OnwardTables onward;
    private readonly double[] paid;
    private readonly int[] nearest;
    private readonly int[] list;
    private readonly Action<int[]> visit;

    /// <summary>Prepares a walk.</summary>
    /// <param name="tables">What is known of the candidates.</param>
    /// <param name="family">The family.</param>
    /// <param name="group">The group it is walked for, with its cuts.</param>
    /// <param name="visit">Is called with each list that no cut discards; the list is used again afterwards.</param>
    public ListWalk(SearchTables tables, PlanFamily family, ListGroup group, Action<int[]> visit)
    {
        (families, candidates) = (tables.Families, tables.Candidates);
        (this.family, this.visit, cuts, onward) = (family, visit, group.Cuts, group.OnwardTo(family.Last));
        list = new int[family.Count];
        (list[0], list[^1]) = (family.First, family.Last);
        nearest = new int[family.Count];
        nearest[0] = IsNearer(family.Last, family.First) ? family.Last : family.First;
        paid = new double[family.Count * cuts.Count];
        for (int c = 0; c < cuts.Count; c++)
            paid[c] = cuts[c].Prices[family.First] + cuts[c].Prices[family.Last];
    }

    /// <summary>How many lists were discarded without being looked at.</summary>
    public long Discarded { get; private set; }

    /// <summary>Walks through the lists with a second temperature; a family of two has one list.</summary>
    public void Through(int second)
    {
        if (family.Count == 2)
            Follow(1);
        else
            Take(1, second);
    }

    private void Take(int place, int candidate)
    {
        list[place] = candidate;
        nearest[place] = IsNearer(candidate, nearest[place - 1]) ? candidate : nearest[place - 1];
        for (int c = 0; c < cuts.Count; c++)
        {
            double sum = paid[((place - 1) * cuts.Count) + c] + cuts[c].Prices[candidate];
            paid[(place * cuts.Count) + c] = sum;
            if (sum + onward.Dearest(c, place, candidate) + LargestSurcharge(cuts[c], nearest[place], candidate) < cuts[c].Debt)
            {
                Discarded += onward.Ways(place, candidate);
                return;
            }
        }

        Follow(place + 1);
    }

    private void Follow(int place)
    {
        if (place == family.Count - 1)
        {
            if (families.Apart(list[place - 1], family.Last))
                visit(list);
            return;
        }

        for (int i = list[place - 1] + 1; i < family.Last; i++)
            if (onward.Ways(place, i) > 0 && families.Apart(list[place - 1], i))
                Take(place, i);
    }

    /// <summary>
    /// The largest surcharge that the list can still come to: that of the candidate nearest the reference temperature so far, or of one that
    /// follows and is nearer.
    /// </summary>
    private double LargestSurcharge(PriceCut cut, int near, int last)
    {
        double largest = cut.Surcharges[near];
        for (int i = last + 1; i < family.Last; i++)
            if (IsNearer(i, near))
                largest = Math.Max(largest, cut.Surcharges[i]);
            else if (candidates[i].Place.Tau > candidates[near].Place.Tau)
                break;
        return largest;
    }

    private bool IsNearer(int candidate, int other) => candidates[candidate].Distance < candidates[other].Distance
        || (candidates[candidate].Distance == candidates[other].Distance && candidate < other);
}
