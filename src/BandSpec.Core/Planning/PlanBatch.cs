namespace BandSpec.Core.Planning;

/// <summary>
/// Up to eight temperature lists of the same length whose reference temperature stands at the same place, so that they read alike: they are
/// fitted together, one to a lane.
/// </summary>
internal sealed class PlanBatch(int temperatures, int nearest)
{
    /// <summary>How many lists a full batch holds.</summary>
    public const int Lanes = 8;

    private readonly int[] lists = new int[Lanes * temperatures];

    /// <summary>How many temperatures each list has.</summary>
    public int Temperatures { get; } = temperatures;

    /// <summary>The place in each list that is read at the reference pressures.</summary>
    public int Nearest { get; } = nearest;

    /// <summary>How many lists are in it.</summary>
    public int Count { get; private set; }

    /// <summary>Whether there is no room for another list.</summary>
    public bool IsFull => Count == Lanes;

    /// <summary>The list in a lane; empty lanes repeat the last list.</summary>
    public ReadOnlySpan<int> this[int lane] => lists.AsSpan(Math.Min(lane, Count - 1) * Temperatures, Temperatures);

    /// <summary>Adds a list.</summary>
    public void Add(ReadOnlySpan<int> list) => list.CopyTo(lists.AsSpan(Count++ * Temperatures, Temperatures));

    /// <summary>Takes all lists out.</summary>
    public void Clear() => Count = 0;
}
