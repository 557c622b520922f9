using BandSpec.Documents.Model;

namespace BandSpec.Documents.Pdf.Layout;

/// <summary>Blocks that are one piece of a page: figures, callouts, and the headline of key figures.</summary>
internal static class BoxLayout
{
    private const double Inset = 11;

    public static IEnumerable<Slab> Lay(Figure figure, double width)
    {
        var group = new Tag(TagKind.Div);
        var tag = new Tag(TagKind.Figure, group) { Alternative = figure.Alternative };
        var scale = Math.Min(1, width / figure.Chart.Width);
        var height = figure.Chart.Height * scale;
        var left = (width - figure.Chart.Width * scale) / 2;
        var place = new Box(left, 0, figure.Chart.Width * scale, height);
        yield return new Slab(height, [new ChartMark(tag, place, figure.Chart)]) { Before = Look.BlockGap, KeepWithNext = true };
        yield return Slab.Gap(3) with { KeepWithNext = true };
        var caption = group.Child(TagKind.Caption).Child(TagKind.P);
        var lines = LineBreaker.Break(TableLayout.Labelled(figure.Label, figure.Caption), Look.Caption, width);
        foreach (var slab in TextLayout.Lines(lines, Look.Caption, 0, caption).SkipLast(1)) yield return slab with { KeepWithNext = true };
        yield return TextLayout.Lines(lines, Look.Caption, 0, caption).Last();
        yield return Slab.Gap(Look.BlockGap - Look.ParagraphGap);
    }

    public static Slab Lay(Callout callout, double width)
    {
        var (ink, bar) = Tones(callout.Tone);
        var group = new Tag(TagKind.Div);
        var title = Look.HeadCell with { Size = Look.Body.Size, Leading = Look.Body.Leading, Ink = ink };
        List<Slab> pieces = [Slab.Gap(7), .. Text(callout.Title, title, width, group)];
        foreach (var paragraph in callout.Paragraphs) pieces.AddRange([Slab.Gap(2), .. Text(paragraph, Look.Body, width, group)]);
        var text = Stack(pieces);
        var height = text.Height + 7;
        var ground = new FillMark(new Box(0, 0, width, height), Look.Wash);
        return new Slab(height, [ground, new FillMark(new Box(0, 0, bar, height), ink), .. text.Marks]) { Before = Look.BlockGap };
    }

    public static Slab Lay(Headline headline, double width)
    {
        var share = width / headline.Figures.Count;
        double Room(int i) => i == 0 ? share - Inset : share - 2 * Inset;
        // Where one figure is too long for its place, all are set smaller rather than one broken: they are read at a glance.
        var fit = headline.Figures.Select((f, i) => Math.Min(1, Room(i) / LineBreaker.NaturalWidth(f.Value, Look.KeyValue))).Min();
        var cells = headline.Figures.Select((f, i) => Cell(f, i == 0 ? 0 : Inset, Room(i), fit)).ToList();
        var height = cells.Max(c => c.Height) + 12;
        var marks = new List<Mark> { new RuleMark(0, 0, width, 0, 0.9, Look.Ink), new RuleMark(0, height, width, height, 0.5, Look.Rule) };
        for (int i = 0; i < cells.Count; i++)
        {
            marks.AddRange(cells[i].Marks.Select(m => m.Moved(i * share, 6)));
            if (i > 0) marks.Add(new RuleMark(i * share, 7, i * share, height - 7, 0.4, Look.Hairline));
        }
        return new Slab(height, marks) { Before = Look.BlockGap };
    }

    /// <summary>Pieces one below the other as one.</summary>
    public static Slab Stack(IEnumerable<Slab> pieces)
    {
        double y = 0;
        var marks = new List<Mark>();
        foreach (var piece in pieces)
        {
            y += piece.Before;
            marks.AddRange(piece.Marks.Select(m => m.Moved(0, y)));
            y += piece.Height;
        }
        return new Slab(y, marks);
    }

    private static Slab Cell(KeyFigure figure, double left, double width, double fit)
    {
        var group = new Tag(TagKind.Div);
        var value = Look.KeyValue with { Size = Look.KeyValue.Size * fit };
        IEnumerable<Slab> Set(Phrase text, TextStyle style) =>
            TextLayout.Lines(LineBreaker.Break(text, style, width), style, left, group.Child(TagKind.P));
        return Stack([.. Set(figure.Name, Look.KeyName), .. Set(figure.Value, value), .. Set(figure.Remark, Look.Fine)]);
    }

    private static IEnumerable<Slab> Text(Phrase text, TextStyle style, double width, Tag group) =>
        text.IsEmpty ? [] : TextLayout.Lines(LineBreaker.Break(text, style, width - 2 * Inset), style, Inset, group.Child(TagKind.P));

    // The bar's width tells the tones apart where colour does not.
    private static (Colour Ink, double Bar) Tones(Tone tone) => tone switch
    {
        Tone.Caution => (Look.Caution, 3),
        Tone.Assurance => (Look.Assurance, 2),
        Tone.Refusal => (Look.Refusal, 5),
        _ => (Look.Accent, 1.2),
    };
}
