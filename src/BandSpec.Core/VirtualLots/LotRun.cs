namespace BandSpec.Core.VirtualLots;

/// <summary>How far a run has come.</summary>
/// <param name="Made">Lots made so far.</param>
/// <param name="Ordered">Lots of the part.</param>
public readonly record struct LotProgress(long Made, long Ordered);

/// <summary>Makes the lots of an order on several threads.</summary>
public static class LotRun
{
    /// <summary>
    /// Makes the lots of an order's part, in the order of their numbers. The result depends on subject and order alone: not on the number of
    /// threads, not on the machine, and a run that was cancelled equals a run of the lots it got to.
    /// </summary>
    /// <param name="subject">What is made.</param>
    /// <param name="order">How many, from which chance, which part.</param>
    /// <param name="threads">At least 1.</param>
    /// <param name="progress">Told after each lot, from any thread; <see langword="null"/> for nobody.</param>
    /// <param name="cancellation">Ends the run after the lots at hand; the result holds those made, all numbered below those not made.</param>
    /// <exception cref="ArgumentException">The plan's points do not determine its correction.</exception>
    /// <exception cref="OverflowException">An error beyond 32,000 %FS, which no input that passed its rules leads to.</exception>
    public static LotResult Make(
        LotSubject subject, LotOrder order, int threads, IProgress<LotProgress>? progress = null, CancellationToken cancellation = default)
    {
        ArgumentNullException.ThrowIfNull(subject);
        ArgumentNullException.ThrowIfNull(order);
        ArgumentOutOfRangeException.ThrowIfLessThan(threads, 1);
        LotLaw law = new(subject);
        TallyPlan plan = law.TallyPlan;
        LotTally whole = new(plan);
        long next = order.FirstLot - 1;
        long made = 0;
        Lock merging = new();
        Parallel.For(0, threads, new ParallelOptions { MaxDegreeOfParallelism = threads }, _ =>
        {
            VirtualLot room = new(law, order, plan);
            LotTally own = new(plan);
            while (!cancellation.IsCancellationRequested && Interlocked.Increment(ref next) is long lot && lot < order.EndLot)
            {
                room.Make(lot, own);
                progress?.Report(new LotProgress(Interlocked.Increment(ref made), order.EndLot - order.FirstLot));
            }
            lock (merging)
                whole.Add(own);
        });
        return new LotResult(order, law.Fingerprint, [new LotRange(order.FirstLot, order.FirstLot + whole.Lots)], whole);
    }
}
