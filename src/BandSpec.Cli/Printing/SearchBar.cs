using System.Globalization;
using BandSpec.Core.Planning;

namespace BandSpec.Cli.Printing;

/// <summary>
/// A bar on standard error while plans are searched, on one line that it takes away when it ends; nothing at all when nobody watches. It is told
/// from several threads at once.
/// </summary>
internal sealed class SearchBar : IProgress<SearchProgress>, IDisposable
{
    private const int Width = 30;

    /// <summary>A bar that is drawn more often is not seen more often.</summary>
    private static readonly TimeSpan Pause = TimeSpan.FromMilliseconds(80);

    private readonly Terminal terminal;
    private readonly string name;
    private readonly Lock drawing = new();
    private long drawn;
    private int longest;

    public SearchBar(Terminal terminal, string name) => (this.terminal, this.name, drawn) = (terminal, name, terminal.Clock.GetTimestamp());

    /// <inheritdoc/>
    public void Report(SearchProgress value)
    {
        if (!terminal.IsWatched || value.Total <= 0 || terminal.Clock.GetElapsedTime(Volatile.Read(ref drawn)) < Pause || !drawing.TryEnter())
            return;
        try
        {
            Volatile.Write(ref drawn, terminal.Clock.GetTimestamp());
            Draw(Math.Clamp((double)value.Done / value.Total, 0, 1), value.Total);
        }
        finally
        {
            drawing.Exit();
        }
    }

    /// <summary>Takes the bar away.</summary>
    public void Dispose()
    {
        if (longest > 0)
            terminal.Error.Write($"\r{new string(' ', longest)}\r");
    }

    private void Draw(double part, long total)
    {
        int full = (int)(part * Width);
        string bar = new string('\u2501', full) + new string('\u2500', Width - full);
        string line = string.Create(CultureInfo.InvariantCulture, $"{name}  {bar} {part:0 %} of {total:N0} plans");
        longest = Math.Max(longest, line.Length);
        terminal.Error.Write($"\r{line.PadRight(longest)}");
    }
}
