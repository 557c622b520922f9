namespace BandSpec.Core.LotJudging;

/// <summary>One reading on its way to its point's tally.</summary>
/// <param name="Point">Index of the point.</param>
/// <param name="Unit">Index of the unit; −1 for one that is not followed.</param>
/// <param name="Lot">Index of the lot.</param>
/// <param name="Error">The error, %FS.</param>
internal readonly record struct Tallied(int Point, int Unit, int Lot, double Error);

/// <summary>
/// Tallies readings beside the thread that reads them: one batch is filled while the one before is worked off, which takes about as long, so
/// that two processors are busy. Batches are worked off one at a time and in order; the tallies are the same as without.
/// </summary>
internal sealed class TallyBench(Tally[] tallies)
{
    private const int BatchSize = 16_384;

    private Tallied[] filling = new Tallied[BatchSize];
    private Tallied[] working = new Tallied[BatchSize];
    private int count;
    private Task work = Task.CompletedTask;

    /// <summary>Takes one reading.</summary>
    public void Add(Tallied reading)
    {
        filling[count++] = reading;
        if (count == BatchSize)
            HandOver();
    }

    /// <summary>The tallies, once all readings taken so far are in them.</summary>
    public IReadOnlyList<Tally> Finish()
    {
        HandOver();
        work.Wait();
        return tallies;
    }

    private void HandOver()
    {
        work.Wait();
        (filling, working) = (working, filling);
        (Tallied[] batch, int full) = (working, count);
        count = 0;
        work = Task.Run(() =>
        {
            foreach (ref readonly Tallied reading in batch.AsSpan(0, full))
                tallies[reading.Point].Add(reading.Error, reading.Lot, reading.Unit);
        });
    }
}
