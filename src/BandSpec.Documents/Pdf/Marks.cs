using BandSpec.Documents.Charts;
using BandSpec.Documents.Fonts;

namespace BandSpec.Documents.Pdf;

internal readonly record struct Colour(byte R, byte G, byte B);

internal readonly record struct Box(double X, double Y, double Width, double Height)
{
    public double Bottom => Y + Height;
}

/// <summary>
/// One thing to draw. Points count from the top left corner, downwards. A mark without a tag is decoration (an artifact).
/// </summary>
internal abstract record Mark(Tag? Tag)
{
    public abstract Mark Moved(double right, double down);
}

/// <summary>Text on a baseline.</summary>
internal sealed record TextMark(Tag? Tag, double X, double Y, string Text, Face Face, double Size, Colour Ink) : Mark(Tag)
{
    public override Mark Moved(double right, double down) => this with { X = X + right, Y = Y + down };
}

internal sealed record RuleMark(double X1, double Y1, double X2, double Y2, double Width, Colour Ink) : Mark((Tag?)null)
{
    public override Mark Moved(double right, double down) =>
        this with { X1 = X1 + right, X2 = X2 + right, Y1 = Y1 + down, Y2 = Y2 + down };
}

internal sealed record FillMark(Box Area, Colour Ink) : Mark((Tag?)null)
{
    public override Mark Moved(double right, double down) => this with { Area = Area with { X = Area.X + right, Y = Area.Y + down } };
}

internal sealed record ChartMark(Tag Figure, Box Area, Chart Chart) : Mark(Figure)
{
    public override Mark Moved(double right, double down) => this with { Area = Area with { X = Area.X + right, Y = Area.Y + down } };
}

/// <summary>A place the outline leads to.</summary>
internal sealed record BookmarkMark(int Level, string Title, double Y) : Mark((Tag?)null)
{
    public override Mark Moved(double right, double down) => this with { Y = Y + down };
}

/// <summary>Draws nothing, but gives an empty cell its place in the structure, so that rows keep their number of columns.</summary>
internal sealed record EmptyMark(Tag Cell) : Mark(Cell)
{
    public override Mark Moved(double right, double down) => this;
}
