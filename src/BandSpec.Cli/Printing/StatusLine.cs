using System.Globalization;

namespace BandSpec.Cli.Printing;

/// <summary>
/// One line on standard error that tells how far something has come, and takes itself away when it ends; nothing when nobody watches. It is told
/// from several threads at once.
/// </summary>
/// <param name="terminal">Where the line is shown.</param>
/// <param name="pause">The least time between two drawings, and before the first.</param>
internal sealed class StatusLine(Terminal terminal, TimeSpan pause) : IDisposable
{
    private const int Width = 30;

    private readonly Lock drawing = new();
    private long drawn = terminal.Clock.GetTimestamp();
    private int longest;

    /// <summary>Shows a text, unless the last one is too fresh.</summary>
    public void Show(Func<string> text)
    {
        if (!terminal.IsWatched || terminal.Clock.GetElapsedTime(Volatile.Read(ref drawn)) < pause || !drawing.TryEnter())
            return;
        try
        {
            Volatile.Write(ref drawn, terminal.Clock.GetTimestamp());
            string line = Cut(text());
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

    /// <summary>A line that ran on to the next could not be taken away.</summary>
    private string Cut(string line) => terminal.Width() is var width and > 1 && line.Length >= width ? line[..(width - 1)] : line;

    /// <summary>A part of a whole as a bar.</summary>
    public static string Bar(double part)
    {
        int full = (int)(Math.Clamp(part, 0, 1) * Width);
        return new string('\u2501', full) + new string('\u2500', Width - full);
    }

    /// <summary>The time that the rest takes at the pace so far, such as <c>12 s</c>.</summary>
    public static string Left(TimeSpan elapsed, double part) => Written(part > 0 ? elapsed * ((1 - part) / part) : TimeSpan.Zero);

    /// <summary>A time in the unit that suits it.</summary>
    public static string Written(TimeSpan time) => time.TotalSeconds switch
    {
        < 90 => string.Create(CultureInfo.InvariantCulture, $"{time.TotalSeconds:0} s"),
        < 5400 => string.Create(CultureInfo.InvariantCulture, $"{time.TotalMinutes:0} min"),
        _ => string.Create(CultureInfo.InvariantCulture, $"{time.TotalHours:0.0} h"),
    };
}
