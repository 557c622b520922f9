namespace BandSpec.Core.LotJudging;

/// <summary>
/// Values in the order they came, condensed: when all stretches are taken, neighbours join and each then holds twice as many values, so
/// that a chart of any length fits in constant memory.
/// </summary>
internal sealed class RunChart
{
    /// <summary>Stretches at most; a chart shows at least half as many once this is passed.</summary>
    public const int MostStretches = 240;

    private readonly List<RunStretch> stretches = [];
    private long valuesEach = 1;

    /// <summary>The stretches in order; all but the last hold equally many values.</summary>
    public IReadOnlyList<RunStretch> Stretches => stretches;

    /// <summary>Takes the next value.</summary>
    public void Add(double value)
    {
        if (stretches.Count == 0 || stretches[^1].Count == valuesEach)
        {
            if (stretches.Count == MostStretches)
                Condense();
            stretches.Add(new(0, 0, double.PositiveInfinity, double.NegativeInfinity));
        }

        stretches[^1] = stretches[^1].With(new(1, value, value, value));
    }

    private void Condense()
    {
        for (int k = 0; k < MostStretches / 2; k++)
            stretches[k] = stretches[2 * k].With(stretches[2 * k + 1]);
        stretches.RemoveRange(MostStretches / 2, MostStretches / 2);
        valuesEach *= 2;
    }
}

/// <summary>Consecutive values of a run chart.</summary>
/// <param name="Count">How many.</param>
/// <param name="Mean">Their mean, %FS.</param>
/// <param name="Smallest">The smallest, %FS.</param>
/// <param name="Largest">The largest, %FS.</param>
public readonly record struct RunStretch(long Count, double Mean, double Smallest, double Largest)
{
    internal RunStretch With(RunStretch next) => new(
        Count + next.Count, Mean + (next.Mean - Mean) * next.Count / (Count + next.Count),
        Math.Min(Smallest, next.Smallest), Math.Max(Largest, next.Largest));
}
