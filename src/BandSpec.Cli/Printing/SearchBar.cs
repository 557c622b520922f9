using System.Globalization;
using BandSpec.Core.Planning;
using Spectre.Console;

namespace BandSpec.Cli.Printing;

/// <summary>
/// A bar on standard error while plans are searched, taken away when the search ends; nothing at all when nobody watches. It is told from several
/// threads at once.
/// </summary>
internal sealed class SearchBar : IProgress<SearchProgress>
{
    private readonly ProgressTask task;

    private SearchBar(ProgressTask task) => this.task = task;

    /// <summary>Runs a search under a bar.</summary>
    /// <param name="terminal">Where the bar is shown.</param>
    /// <param name="name">What is searched for.</param>
    /// <param name="search">The search, told whom to keep informed.</param>
    public static T Over<T>(Terminal terminal, string name, Func<IProgress<SearchProgress>?, T> search)
    {
        if (!terminal.IsWatched)
            return search(null);
        IAnsiConsole console = AnsiConsole.Create(new AnsiConsoleSettings
        {
            Ansi = AnsiSupport.Yes, Interactive = InteractionSupport.Yes, Out = new AnsiConsoleOutput(terminal.Error),
        });
        return console.Progress().AutoClear(true)
            .Columns(new TaskDescriptionColumn(), new ProgressBarColumn(), new PercentageColumn())
            .Start(context => search(new SearchBar(context.AddTask(Markup.Escape(name)))));
    }

    /// <inheritdoc/>
    public void Report(SearchProgress value)
    {
        task.MaxValue = Math.Max(1, value.Total);
        task.Value = value.Done;
        task.Description = string.Create(CultureInfo.InvariantCulture, $"{value.Done:N0} of {value.Total:N0} plans");
    }
}
