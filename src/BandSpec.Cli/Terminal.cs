using System.Text;
using BandSpec.Cli.Printing;

namespace BandSpec.Cli;

/// <summary>Everything around the program that a command may touch besides files: handed in by name, so that a test can stand in for it.</summary>
internal sealed record Terminal
{
    /// <summary>Standard output.</summary>
    public required TextWriter Out { get; init; }

    /// <summary>Standard error: progress and faults, never an answer.</summary>
    public required TextWriter Error { get; init; }

    /// <summary>Colours for standard output.</summary>
    public required Ink Ink { get; init; }

    /// <summary>Whether a person watches standard error, so that progress is worth showing.</summary>
    public required bool IsWatched { get; init; }

    /// <summary>How many letters a line of standard error holds; 0 where that is not known.</summary>
    public Func<int> Width { get; init; } = static () => 0;

    /// <summary>The folder that relative paths are counted from.</summary>
    public required string Folder { get; init; }

    /// <summary>The clock.</summary>
    public required TimeProvider Clock { get; init; }

    /// <summary>Called by a command that can be stopped half-way; the token tells it when.</summary>
    public Func<CancellationToken> Interruption { get; init; } = static () => CancellationToken.None;

    /// <summary>The terminal of this process; colour follows NO_COLOR (any text in it means none), TERM=dumb and redirection.</summary>
    public static Terminal OfProcess()
    {
        bool mayColour = string.IsNullOrEmpty(Environment.GetEnvironmentVariable("NO_COLOR"))
            && Environment.GetEnvironmentVariable("TERM") != "dumb";
        return new Terminal
        {
            Out = Writer(Console.OpenStandardOutput()),
            Error = Writer(Console.OpenStandardError()),
            Ink = new Ink(mayColour && !Console.IsOutputRedirected),
            IsWatched = mayColour && !Console.IsErrorRedirected,
            Width = WidthOfWindow,
            Folder = Directory.GetCurrentDirectory(),
            Clock = TimeProvider.System,
            Interruption = Cli.Interruption.Listen,
        };
    }

    private static int WidthOfWindow()
    {
        try
        {
            return Console.WindowWidth;
        }
        catch (IOException)
        {
            return 0; // no window
        }
    }

    /// <summary>The output of every machine is UTF-8 with line feeds: what it is piped into should not depend on where it was made.</summary>
    private static StreamWriter Writer(Stream stream) => new(stream, new UTF8Encoding(encoderShouldEmitUTF8Identifier: false)) { NewLine = "\n", AutoFlush = true };
}
