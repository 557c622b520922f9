namespace BandSpec.Cli.Printing;

/// <summary>Colours text for a terminal, or leaves it as it is.</summary>
/// <param name="isColoured">Whether escape sequences are wanted.</param>
internal sealed class Ink(bool isColoured)
{
    /// <summary>No colour at all, for files and pipes.</summary>
    public static Ink None { get; } = new(false);

    /// <summary>Whether escape sequences are wanted.</summary>
    public bool IsColoured => isColoured;

    /// <summary>Something that is wrong.</summary>
    public string Red(string text) => Wrap("31;1", text);

    /// <summary>Something that is well.</summary>
    public string Green(string text) => Wrap("32;1", text);

    /// <summary>Something to look at.</summary>
    public string Yellow(string text) => Wrap("33;1", text);

    /// <summary>A place, or something that can be copied.</summary>
    public string Blue(string text) => Wrap("36", text);

    /// <summary>A heading.</summary>
    public string Bold(string text) => Wrap("1", text);

    /// <summary>What only frames the rest.</summary>
    public string Faint(string text) => Wrap("2", text);

    private string Wrap(string code, string text) => isColoured ? $"\u001b[{code}m{text}\u001b[0m" : text;
}
