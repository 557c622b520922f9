using BandSpec.Documents.Model;

namespace BandSpec.Documents.Pdf.Layout;

/// <summary>
/// Headings, paragraphs and lists as slabs: a line is a slab, and the first two and the last two lines of a text stay together.
/// </summary>
internal static class TextLayout
{
    private const double ListIndent = 15;

    public static IEnumerable<Slab> Lay(Heading heading, double width)
    {
        var style = Look.Headings[heading.Level - 1];
        var tag = new Tag((TagKind)((int)TagKind.H1 + heading.Level));
        var number = heading.Number.Length == 0 ? Phrase.Empty : (Phrase)(heading.Number + "\u00a0\u00a0");
        var title = (heading.Number + " " + heading.Text.Plain).Trim();
        var slabs = Lines(
            LineBreaker.Break(number + heading.Text, style, width), style, 0, tag).Select(s => s with { KeepWithNext = true }).ToList();
        slabs[0] = slabs[0] with
        {
            Before = Look.SpaceBeforeHeadings[heading.Level - 1],
            Marks = [new BookmarkMark(heading.Level, title, 0), .. slabs[0].Marks],
        };
        return [.. slabs, Slab.Gap(heading.Level == 1 ? 4 : 2) with { KeepWithNext = true }];
    }

    public static IEnumerable<Slab> Lay(Paragraph paragraph, double width)
    {
        var style = paragraph.Voice switch { Voice.Lead => Look.Lead, Voice.Fine => Look.Fine, _ => Look.Body };
        var lines = LineBreaker.Break(paragraph.Text, style, width);
        return Spaced(
            Kept(Lines(lines, style, 0, new Tag(TagKind.P))), paragraph.Voice == Voice.Lead ? Look.BlockGap + 3 : Look.ParagraphGap);
    }

    public static IEnumerable<Slab> Lay(Bullets bullets, double width)
    {
        var list = new Tag(TagKind.L);
        return bullets.Items.SelectMany((item, i) =>
        {
            var entry = list.Child(TagKind.LI);
            var label = bullets.Numbered ? $"{i + 1}." : "\u2013";
            var lines = Lines(
                LineBreaker.Break(item, Look.Body, width - ListIndent), Look.Body, ListIndent, entry.Child(TagKind.LBody)).ToList();
            var mark = LineBreaker.Break(label, Look.Body, width)[0].At(0, Baseline(Look.Body), Look.Soft, entry.Child(TagKind.Lbl));
            lines[0] = lines[0] with { Marks = [.. mark, .. lines[0].Marks] };
            return Spaced(Kept(lines), i == 0 ? Look.ParagraphGap : 3);
        });
    }

    /// <summary>One slab a line.</summary>
    public static IEnumerable<Slab> Lines(IEnumerable<Line> lines, TextStyle style, double x, Tag? tag) =>
        lines.Select(l => new Slab(style.Leading, [.. l.At(x, Baseline(style), style.Ink, tag)]));

    /// <summary>Where the baseline lies below the top of a line, so that capitals stand in the middle of it.</summary>
    public static double Baseline(TextStyle style) => (style.Leading + Fonts.Typeface.Of(style.Face).CapHeight * style.Size) / 2;

    private static List<Slab> Kept(IEnumerable<Slab> lines)
    {
        var slabs = lines.ToList();
        for (int i = 0; i + 1 < slabs.Count; i++)
            if (i == 0 || i == slabs.Count - 2)
                slabs[i] = slabs[i] with { KeepWithNext = true };
        return slabs;
    }

    private static List<Slab> Spaced(List<Slab> slabs, double before)
    {
        slabs[0] = slabs[0] with { Before = before };
        return slabs;
    }
}
