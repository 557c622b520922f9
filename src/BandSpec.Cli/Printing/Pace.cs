namespace BandSpec.Cli.Printing;

/// <summary>
/// How fast something goes on, told by the last seconds: the beginning of a search prepares and its end may be quicker, so that the pace since the
/// beginning would mislead. Asked by one thread at a time.
/// </summary>
/// <param name="clock">The clock.</param>
internal sealed class Pace(TimeProvider clock)
{
    private static readonly TimeSpan Window = TimeSpan.FromSeconds(3), Shortest = TimeSpan.FromSeconds(0.5);

    private (long At, long Done)? older;
    private (long At, long Done) newer;
    private (long Done, long Total) last;

    /// <summary>The time that the rest takes at the pace of the last seconds; null as long as that cannot be told.</summary>
    /// <param name="done">How much is done.</param>
    /// <param name="total">How much there is; when it changes, or less is done than before, something else has begun.</param>
    public TimeSpan? Left(long done, long total)
    {
        long now = clock.GetTimestamp();
        if (older is null || total != last.Total || done < last.Done)
            older = newer = (now, done);
        last = (done, total);
        if (clock.GetElapsedTime(newer.At, now) > Window)
            (older, newer) = (newer, (now, done));
        TimeSpan elapsed = clock.GetElapsedTime(older.Value.At, now);
        long more = done - older.Value.Done;
        return elapsed < Shortest || more <= 0 ? null : elapsed * ((double)(total - done) / more);
    }
}
