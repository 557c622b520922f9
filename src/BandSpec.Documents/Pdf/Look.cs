using BandSpec.Documents.Fonts;

namespace BandSpec.Documents.Pdf;

/// <summary>How letters are set: size and distance of the baselines in points.</summary>
internal sealed record TextStyle(double Size, double Leading, Face Face, Colour Ink);

/// <summary>The look of the pages, in one place: few sizes, one accent, fine rules, room around things. Lengths are in points.</summary>
internal static class Look
{
    public static readonly Colour Ink = new(0x1c, 0x22, 0x29);
    public static readonly Colour Soft = new(0x5b, 0x66, 0x70);
    public static readonly Colour Accent = new(0x1b, 0x3d, 0x66);
    public static readonly Colour Hairline = new(0xd5, 0xda, 0xdf);
    public static readonly Colour Rule = new(0x8a, 0x95, 0x9f);
    public static readonly Colour Wash = new(0xf3, 0xf5, 0xf7);
    public static readonly Colour White = new(0xff, 0xff, 0xff);
    public static readonly Colour Refusal = new(0x9c, 0x1c, 0x1c);
    public static readonly Colour Caution = new(0xb3, 0x5c, 0x00);
    public static readonly Colour Assurance = new(0x1e, 0x6b, 0x45);

    public static readonly TextStyle Body = new(9.6, 13.4, Face.Regular, Ink);
    public static readonly TextStyle Lead = new(13.2, 18, Face.Regular, Ink);
    public static readonly TextStyle Fine = new(8.2, 11, Face.Regular, Soft);
    public static readonly TextStyle Kind = new(9.6, 13, Face.SemiBold, Accent);
    public static readonly TextStyle Title = new(23, 27, Face.SemiBold, Ink);
    public static readonly TextStyle Subtitle = new(12, 16, Face.Regular, Soft);
    public static readonly TextStyle[] Headings =
    [
        new(14.5, 18, Face.SemiBold, Accent),
        new(11.2, 14.5, Face.SemiBold, Ink),
        new(9.6, 13, Face.SemiBold, Soft),
    ];
    public static readonly double[] SpaceBeforeHeadings = [22, 15, 11];
    public static readonly TextStyle Caption = new(8.8, 11.8, Face.Regular, Ink);
    public static readonly TextStyle Cell = new(8.8, 11.6, Face.Regular, Ink);
    public static readonly TextStyle HeadCell = new(8.5, 11, Face.SemiBold, Ink);
    public static readonly TextStyle UnitCell = new(8.2, 10.4, Face.Regular, Soft);
    public static readonly TextStyle FactName = new(8.8, 12.4, Face.Regular, Soft);
    public static readonly TextStyle FactValue = new(8.8, 12.4, Face.Regular, Ink);
    public static readonly TextStyle KeyName = new(8.2, 11, Face.SemiBold, Soft);
    public static readonly TextStyle KeyValue = new(18, 24, Face.SemiBold, Ink);
    public static readonly TextStyle Running = new(8.2, 10, Face.Regular, Soft);
    public static readonly TextStyle Stamp = new(8.8, 11, Face.SemiBold, White);

    public const double ParagraphGap = 6;
    public const double BlockGap = 11;
    public const double CellPad = 2.6;
    public const double ColumnGap = 9;
}

/// <summary>A sheet and the room for text on it, in points; whole millimetres in the margins.</summary>
internal sealed record PageGeometry(double Width, double Height)
{
    // A4 is 210 x 297 mm, Letter 8.5 x 11 in.
    public static readonly PageGeometry A4 = new(210 * Millimetre, 297 * Millimetre);
    public static readonly PageGeometry Letter = new(612, 792);

    private const double Millimetre = 72 / 25.4;

    public double Left { get; } = 22 * Millimetre;

    public double TextWidth => Width - 2 * Left;

    public double Right => Left + TextWidth;

    public double Top { get; } = 27 * Millimetre;

    public double Bottom => Height - 21 * Millimetre;

    public double Room => Bottom - Top;
}
