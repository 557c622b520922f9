using Spectre.Console;
using Spectre.Console.Rendering;

namespace BandSpec.Cli.Printing;

/// <summary>Sets tables as text, of the same width whether a terminal or a file takes them.</summary>
internal static class Tables
{
    /// <summary>As wide as the lines of findings and the rest of a screen; a narrower terminal wraps, a file never does.</summary>
    private const int Width = 110;

    /// <summary>A table's lines, each ended, without blanks at their ends.</summary>
    public static string Of(Table table, Ink ink)
    {
        using StringWriter text = new() { NewLine = "\n" };
        IAnsiConsole console = AnsiConsole.Create(new AnsiConsoleSettings
        {
            Ansi = ink.IsColoured ? AnsiSupport.Yes : AnsiSupport.No,
            ColorSystem = ink.IsColoured ? ColorSystemSupport.Standard : ColorSystemSupport.NoColors,
            Interactive = InteractionSupport.No,
            Out = new AnsiConsoleOutput(text),
        });
        console.Profile.Width = Width;
        console.Write((IRenderable)table);
        // Borders that are drawn as blanks make blank lines at both ends.
        return string.Concat(text.ToString().Split('\n').Select(line => line.TrimEnd()).Where(line => line.Length > 0).Select(line => line + "\n"));
    }

    /// <summary>A cell that stands at the right, as figures do.</summary>
    public static Text Figure(string figure, Style? style = null) => new Text(figure, style).RightJustified();
}
