using System.Globalization;
using BandSpec.Core.Planning;

namespace BandSpec.Cli.Printing;

/// <summary>
/// While plans are searched: how many of how many are decided or discarded, and the time that the rest would take at the pace so far. A search
/// may end sooner, with a proof that it needs no more; and it begins anew when its choice falls short between the nodes.
/// </summary>
internal sealed class SearchBar : IProgress<SearchProgress>, IDisposable
{
    /// <summary>A search that is over by then shows nothing.</summary>
    private static readonly TimeSpan Patience = TimeSpan.FromMilliseconds(500);

    private readonly Terminal terminal;
    private readonly string name;
    private readonly StatusLine line;
    private readonly long begun;
    private readonly Pace pace;

    private SearchBar(Terminal terminal, string name)
    {
        (this.terminal, this.name) = (terminal, name);
        line = new StatusLine(terminal, TimeSpan.FromMilliseconds(100));
        begun = terminal.Clock.GetTimestamp();
        pace = new Pace(terminal.Clock);
    }

    /// <summary>Runs a search under a bar.</summary>
    /// <param name="terminal">Where the bar is shown.</param>
    /// <param name="name">What is searched for.</param>
    /// <param name="search">The search, told whom to keep informed.</param>
    public static T Over<T>(Terminal terminal, string name, Func<IProgress<SearchProgress>, T> search)
    {
        using SearchBar bar = new(terminal, name);
        return search(bar);
    }

    /// <inheritdoc/>
    public void Report(SearchProgress value)
    {
        if (terminal.Clock.GetElapsedTime(begun) >= Patience)
            line.Show(() => LineOf(value));
    }

    /// <inheritdoc/>
    public void Dispose() => line.Dispose();

    /// <summary>Called one at a time.</summary>
    private string LineOf(SearchProgress value)
    {
        double part = Math.Clamp((double)value.Done / Math.Max(1, value.Total), 0, 1);
        if (value.OfChanges)
            return $"{name} {StatusLine.Bar(part)} no plan fits; {value.Done} of {value.Total} kinds of change looked at that would make one fit";
        string left = pace.Left(value.Done, value.Total) is { } time ? $"{StatusLine.Written(time)} left at this pace, " : "";
        return string.Create(
            CultureInfo.InvariantCulture,
            $"{name} {StatusLine.Bar(part)} {left}{value.Done:N0} of {value.Total:N0} plans; Ctrl-C keeps the best so far");
    }
}
