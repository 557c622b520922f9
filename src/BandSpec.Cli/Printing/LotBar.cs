using System.Globalization;
using BandSpec.Core.VirtualLots;

namespace BandSpec.Cli.Printing;

/// <summary>
/// A line on standard error while lots are made: how many units of how many, and the time that is left at the pace so far. It is told from
/// several threads at once, and takes itself away when it ends.
/// </summary>
internal sealed class LotBar : IProgress<LotProgress>, IDisposable
{
    private const int Width = 30;

    private static readonly TimeSpan Pause = TimeSpan.FromMilliseconds(100);

    private readonly Terminal terminal;
    private readonly int lotSize;
    private readonly Lock drawing = new();
    private readonly long begun;
    private long drawn;
    private int longest;

    public LotBar(Terminal terminal, int lotSize)
    {
        (this.terminal, this.lotSize) = (terminal, lotSize);
        begun = drawn = terminal.Clock.GetTimestamp();
    }

    /// <inheritdoc/>
    public void Report(LotProgress value)
    {
        if (!terminal.IsWatched || terminal.Clock.GetElapsedTime(Volatile.Read(ref drawn)) < Pause || !drawing.TryEnter())
            return;
        try
        {
            Volatile.Write(ref drawn, terminal.Clock.GetTimestamp());
            string line = LineOf(value, terminal.Clock.GetElapsedTime(begun));
            longest = Math.Max(longest, line.Length);
            terminal.Error.Write($"\r{line.PadRight(longest)}");
        }
        finally
        {
            drawing.Exit();
        }
    }

    /// <summary>Takes the line away.</summary>
    public void Dispose()
    {
        if (longest > 0)
            terminal.Error.Write($"\r{new string(' ', longest)}\r");
    }

    private string LineOf(LotProgress value, TimeSpan elapsed)
    {
        double part = Math.Clamp((double)value.Made / value.Ordered, 0, 1);
        int full = (int)(part * Width);
        string bar = new string('\u2501', full) + new string('\u2500', Width - full);
        return string.Create(
            CultureInfo.InvariantCulture,
            $"{bar} {value.Made * lotSize:N0} of {value.Ordered * lotSize:N0} units, {Left(elapsed, part)} left; Ctrl-C shows what is there so far");
    }

    private static string Left(TimeSpan elapsed, double part)
    {
        double seconds = part > 0 ? elapsed.TotalSeconds * (1 - part) / part : 0;
        return seconds switch
        {
            < 90 => string.Create(CultureInfo.InvariantCulture, $"{seconds:0} s"),
            < 5400 => string.Create(CultureInfo.InvariantCulture, $"{seconds / 60:0} min"),
            _ => string.Create(CultureInfo.InvariantCulture, $"{seconds / 3600:0.0} h"),
        };
    }
}
