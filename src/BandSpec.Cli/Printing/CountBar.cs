using System.Globalization;

namespace BandSpec.Cli.Printing;

/// <summary>
/// How many of several files are done, on one line of standard error that it takes away when it ends; nothing for a single file, and nothing
/// when nobody watches. It is told from several threads at once.
/// </summary>
internal sealed class CountBar(Terminal terminal, int total) : IDisposable
{
    private readonly Lock drawing = new();
    private int done;
    private int longest;

    /// <summary>One more is done.</summary>
    public void Advance()
    {
        int now = Interlocked.Increment(ref done);
        if (!terminal.IsWatched || total < 2)
            return;
        lock (drawing)
        {
            string line = string.Create(CultureInfo.InvariantCulture, $"{now} of {total} requirements");
            longest = Math.Max(longest, line.Length);
            terminal.Error.Write($"\r{line.PadRight(longest)}");
        }
    }

    /// <summary>Takes the line away.</summary>
    public void Dispose()
    {
        if (longest > 0)
            terminal.Error.Write($"\r{new string(' ', longest)}\r");
    }
}
