namespace BandSpec.Core.LotJudging;

/// <summary>
/// Values kept for what needs them sorted: normality and percentiles. All of them up to a bound, beyond it a random sample of that size in
/// which every value is equally likely (Vitter 1985, ACM Trans. Math. Softw. 11, 37, algorithm R). The choice depends on nothing but the count.
/// </summary>
/// <param name="bound">How many values are kept at most.</param>
internal sealed class KeptValues(int bound = KeptValues.Bound)
{
    /// <summary>The usual bound: 0.135 % of it is 27 values, enough for the outer percentiles.</summary>
    public const int Bound = 20_000;

    private readonly List<double> values = [];
    private readonly List<int> lots = [];

    /// <summary>How many values were met.</summary>
    public long Met { get; private set; }

    /// <summary>Whether every value met is kept.</summary>
    public bool IsComplete => Met == values.Count;

    /// <summary>The kept values, in no order that means anything.</summary>
    public IReadOnlyList<double> Values => values;

    /// <summary>The lot of each kept value.</summary>
    public IReadOnlyList<int> Lots => lots;

    /// <summary>Takes one value of a lot.</summary>
    public void Add(double value, int lot)
    {
        Met++;
        if (values.Count < bound)
        {
            values.Add(value);
            lots.Add(lot);
            return;
        }

        ulong place = Math.BigMul(Scrambled((ulong)Met), (ulong)Met, out _);
        if (place < (ulong)bound)
            (values[(int)place], lots[(int)place]) = (value, lot);
    }

    /// <summary>A 64-bit number that looks random (the finalizer of SplitMix64, Steele, Lea and Flood 2014).</summary>
    private static ulong Scrambled(ulong x)
    {
        x *= 0x9E3779B97F4A7C15;
        x = (x ^ (x >> 30)) * 0xBF58476D1CE4E5B9;
        x = (x ^ (x >> 27)) * 0x94D049BB133111EB;
        return x ^ (x >> 31);
    }
}
