namespace BandSpec.Core.Numerics.RareEvents;

/// <summary>
/// Events <c>a_jᵀx + o_j·ξ_g(j) ≥ t_j</c> about independent standard normal numbers: <c>x</c>, which all events share, and <c>ξ</c>, of which
/// each group of events has one of its own. Their union is the event that something happens anywhere.
/// </summary>
/// <param name="dimensions">Length of <c>x</c>, at least 1.</param>
/// <param name="groups">How many groups there are; may be 0.</param>
internal sealed class HalfSpaces(int dimensions, int groups)
{
    private readonly List<double> weights = [];
    private readonly List<double> owns = [];
    private readonly List<int> groupsOf = [];
    private readonly List<double> thresholds = [];

    /// <summary>Length of <c>x</c>.</summary>
    public int Dimensions => dimensions;

    /// <summary>How many numbers <c>ξ</c> there are.</summary>
    public int Groups => groups;

    /// <summary>How many events there are.</summary>
    public int Count => thresholds.Count;

    /// <summary>Adds an event.</summary>
    /// <param name="weight"><c>a</c>, as long as <c>x</c>.</param>
    /// <param name="threshold"><c>t</c>.</param>
    /// <param name="own"><c>o</c>; 0 for an event without a number of its own.</param>
    /// <param name="group">The group, where <paramref name="own"/> is not 0.</param>
    public void Add(ReadOnlySpan<double> weight, double threshold, double own = 0, int group = -1)
    {
        if (weight.Length != dimensions)
            throw new ArgumentException($"an event about {dimensions} numbers has as many weights, not {weight.Length}", nameof(weight));
        weights.AddRange(weight);
        owns.Add(own);
        groupsOf.Add(group);
        thresholds.Add(threshold);
    }

    /// <summary><c>a</c> of an event.</summary>
    public ReadOnlySpan<double> Weight(int j) => System.Runtime.InteropServices.CollectionsMarshal.AsSpan(weights).Slice(j * dimensions, dimensions);

    /// <summary><c>o</c> of an event.</summary>
    public double Own(int j) => owns[j];

    /// <summary>The group of an event; −1 for none.</summary>
    public int GroupOf(int j) => groupsOf[j];

    /// <summary><c>t</c> of an event.</summary>
    public double Threshold(int j) => thresholds[j];

    /// <summary>The events of a selection, with only the groups that they need.</summary>
    public HalfSpaces Only(IReadOnlyList<int> selection)
    {
        int[] needed = [.. selection.Select(GroupOf).Where(g => g >= 0).Distinct().Order()];
        HalfSpaces kept = new(dimensions, needed.Length);
        foreach (int j in selection)
            kept.Add(Weight(j), thresholds[j], owns[j], groupsOf[j] < 0 ? -1 : Array.BinarySearch(needed, groupsOf[j]));
        return kept;
    }
}
