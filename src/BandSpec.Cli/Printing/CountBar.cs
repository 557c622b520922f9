using System.Globalization;

namespace BandSpec.Cli.Printing;

/// <summary>How many of several files are done; nothing for a single file. It is told from several threads at once.</summary>
internal sealed class CountBar(Terminal terminal, int total) : IDisposable
{
    private readonly StatusLine line = new(terminal, TimeSpan.Zero);
    private int done;

    /// <summary>One more is done.</summary>
    public void Advance()
    {
        int now = Interlocked.Increment(ref done);
        if (total > 1)
            line.Show(() => string.Create(CultureInfo.InvariantCulture, $"{now} of {total} requirements"));
    }

    /// <summary>Takes the line away.</summary>
    public void Dispose() => line.Dispose();
}
