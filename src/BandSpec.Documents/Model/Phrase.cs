namespace BandSpec.Documents.Model;

internal enum Lettering
{
    Plain,
    Bold,
    Italic,
    Code,
}

internal enum Shift
{
    None,
    Raised,
    Lowered,
}

/// <summary>Letters set alike.</summary>
internal readonly record struct Run(string Text, Lettering Lettering = Lettering.Plain, Shift Shift = Shift.None);

/// <summary>A line of text with its emphasis. A line end (<c>\n</c>) inside is a forced break.</summary>
internal sealed class Phrase
{
    public static readonly Phrase Empty = new([]);

    public Phrase(IReadOnlyList<Run> runs) => Runs = runs;

    public IReadOnlyList<Run> Runs { get; }

    public bool IsEmpty => Runs.All(r => r.Text.Length == 0);

    /// <summary>The letters alone, as a reader that knows no emphasis sees them.</summary>
    public string Plain => string.Concat(Runs.Select(r => r.Text));

    /// <summary>A text taken as it stands: nothing in it is markup.</summary>
    public static implicit operator Phrase(string text) => new([new Run(text)]);

    public Phrase In(Lettering lettering) =>
        new([.. Runs.Select(r => r.Lettering == Lettering.Plain ? r with { Lettering = lettering } : r)]);

    public static Phrase operator +(Phrase left, Phrase right) => new([.. left.Runs, .. right.Runs]);

    public override string ToString() => Plain;
}
