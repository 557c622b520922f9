using BandSpec.Documents.Fonts;
using BandSpec.Documents.Model;
using BandSpec.Documents.Pdf.Layout;

namespace BandSpec.Documents.Pdf;

/// <summary>
/// What stands on every page: the band with the document's standing, the running header, and the footer with the page number.
/// </summary>
internal static class Furniture
{
    private const double BandHeight = 17;

    public static IEnumerable<Mark> Around(Frame frame, PageGeometry page, int number, int count)
    {
        var header = page.Top - 24;
        var footer = page.Bottom + 17;
        var pageOf = frame.PageOf.Replace(
            "{page}", number.ToString(System.Globalization.CultureInfo.InvariantCulture), StringComparison.Ordinal)
            .Replace("{pages}", count.ToString(System.Globalization.CultureInfo.InvariantCulture), StringComparison.Ordinal);
        return
        [
            .. Band(frame.Stamp, page),
            .. Set(frame.Running, Look.Running with { Face = Face.SemiBold, Ink = Look.Ink }, page, header, page.TextWidth * 0.45),
            .. SetRight(frame.RunningRight, Look.Running, page, header),
            new RuleMark(page.Left, header + 6, page.Right, header + 6, 0.5, Look.Rule),
            new RuleMark(page.Left, footer - 12, page.Right, footer - 12, 0.35, Look.Hairline),
            .. Set(frame.Footer, Look.Running, page, footer, page.TextWidth * 0.75),
            .. SetRight(pageOf, Look.Running, page, footer),
        ];
    }

    // A band from edge to edge at the head of the sheet: a photocopy shows it, and so does a page pulled out of a file.
    private static IEnumerable<Mark> Band(Stamp stamp, PageGeometry page)
    {
        if (stamp.Standing == Standing.Plain) return [];
        var ink = stamp.Standing switch { Standing.Refused => Look.Refusal, Standing.Released => Look.Assurance, _ => Look.Soft };
        var baseline = 16 + TextLayout.Baseline(Look.Stamp) + (BandHeight - Look.Stamp.Leading) / 2;
        var word = LineBreaker.Break(stamp.Word, Look.Stamp, double.MaxValue)[0];
        var sentence = LineBreaker.Break(stamp.Sentence, Look.Stamp with { Face = Face.Regular }, double.MaxValue)[0];
        return
        [
            new FillMark(new Box(0, 16, page.Width, BandHeight), ink),
            .. word.At(page.Left, baseline, Look.White, null),
            .. sentence.At(page.Right - sentence.Width, baseline, Look.White, null),
        ];
    }

    // A long title is cut with an ellipsis rather than run into its neighbour; the whole of it stands on page one.
    private static IEnumerable<Mark> Set(string text, TextStyle style, PageGeometry page, double baseline, double room) =>
        Line(text, style, room).At(page.Left, baseline, style.Ink, null);

    private static IEnumerable<Mark> SetRight(string text, TextStyle style, PageGeometry page, double baseline)
    {
        var line = Line(text, style, page.TextWidth * 0.52);
        return line.At(page.Right - line.Width, baseline, style.Ink, null);
    }

    private static Line Line(string text, TextStyle style, double room)
    {
        var line = LineBreaker.Break(text, style, double.MaxValue)[0];
        for (int length = text.Length - 1; line.Width > room && length > 0; length--)
            line = LineBreaker.Break(text[..length].TrimEnd() + "\u2026", style, double.MaxValue)[0];
        return line;
    }
}
