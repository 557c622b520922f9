namespace BandSpec.Core.LotJudging;

/// <summary>
/// Values in the order they came, condensed: when all stretches are taken, neighbours join and each then holds twice as many values, so
/// that a chart of any length fits in constant memory.
/// </summary>
internal sealed class RunChart
{
    /// <summary>Stretches at most; a chart shows at least half as many once this is passed.</summary>
    public const int MostStretches = 240;

    private readonly List<RunStretch> done = [];
    private long valuesEach = 1;
    private long count;
    private double sum;
    private double smallest = double.PositiveInfinity;
    private double largest = double.NegativeInfinity;

    /// <summary>The stretches in order; all but the last hold equally many values.</summary>
    public IReadOnlyList<RunStretch> Stretches => count == 0 ? done : [.. done, Open];

    private RunStretch Open => new(count, sum / count, smallest, largest);

    /// <summary>Takes the next value.</summary>
    public void Add(double value)
    {
        if (count == valuesEach)
            Close();
        count++;
        sum += value;
        smallest = Math.Min(smallest, value);
        largest = Math.Max(largest, value);
    }

    private void Close()
    {
        done.Add(Open);
        (count, sum, smallest, largest) = (0, 0, double.PositiveInfinity, double.NegativeInfinity);
        if (done.Count < MostStretches)
            return;
        for (int k = 0; k < MostStretches / 2; k++)
            done[k] = done[2 * k].With(done[2 * k + 1]);
        done.RemoveRange(MostStretches / 2, MostStretches / 2);
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
