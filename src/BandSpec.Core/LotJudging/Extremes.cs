namespace BandSpec.Core.LotJudging;

/// <summary>The few smallest and largest values of a stream with the units they belong to, kept in one pass.</summary>
internal sealed class Extremes
{
    /// <summary>How many are kept on each side: as many outliers as the test looks for.</summary>
    public const int Kept = 10;

    private readonly List<(double Value, int Unit)> smallest = new(Kept + 1);
    private readonly List<(double Value, int Unit)> largest = new(Kept + 1);

    /// <summary>From the smallest upwards.</summary>
    public IReadOnlyList<(double Value, int Unit)> Smallest => smallest;

    /// <summary>From the largest downwards.</summary>
    public IReadOnlyList<(double Value, int Unit)> Largest => largest;

    /// <summary>Takes one value; among equal ones the first met is kept.</summary>
    public void Add(double value, int unit)
    {
        if (smallest.Count < Kept || value < smallest[^1].Value)
            Insert(smallest, value, unit, 1);
        if (largest.Count < Kept || value > largest[^1].Value)
            Insert(largest, value, unit, -1);
    }

    private static void Insert(List<(double Value, int Unit)> list, double value, int unit, int sign)
    {
        int place = list.Count;
        while (place > 0 && sign * value < sign * list[place - 1].Value)
            place--;
        list.Insert(place, (value, unit));
        if (list.Count > Kept)
            list.RemoveAt(Kept);
    }
}
