namespace BandSpec.Documents.Pdf.Layout;

/// <summary>
/// A piece of a page that is not broken without need: a line of a paragraph, a row of a table, a chart. Its marks count from its own
/// top left corner.
/// </summary>
internal sealed record Slab(double Height, IReadOnlyList<Mark> Marks)
{
    /// <summary>Room above it, dropped at the top of a page.</summary>
    public double Before { get; init; }

    /// <summary>It must not be the last thing on a page while the next one starts another.</summary>
    public bool KeepWithNext { get; init; }

    /// <summary>A new page starts with it.</summary>
    public bool StartsPage { get; init; }

    /// <summary>What is drawn again above it when it opens a page: the heading of its table.</summary>
    public Slab? Repeat { get; init; }

    /// <summary>Cuts off a part no higher than the given room, or says that not even one line of it fits.</summary>
    public Func<double, (Slab Part, Slab Remainder)?>? Split { get; init; }

    public static Slab Gap(double height) => new(height, []);
}
