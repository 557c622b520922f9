using BandSpec.Documents.Model;

namespace BandSpec.Documents.Pdf.Layout;

/// <summary>Stage one: every block becomes slabs, and the slabs go on pages.</summary>
internal static class DocumentLayout
{
    public static IReadOnlyList<IReadOnlyList<Mark>> Lay(Document document, PageGeometry page)
    {
        var slabs = new List<Slab>();
        var fresh = false;
        foreach (var block in document.Blocks)
        {
            if (block is PageBreak)
            {
                fresh = true;
                continue;
            }
            var first = slabs.Count;
            slabs.AddRange(Lay(block, page.TextWidth, document.Frame.Continued));
            if (fresh) slabs[first] = slabs[first] with { StartsPage = true };
            fresh = false;
        }
        return Pagination.Paginate(slabs, page);
    }

    private static IEnumerable<Slab> Lay(Block block, double width, string continued) => block switch
    {
        TitleBlock title => FactsLayout.Lay(title, width),
        Heading heading => TextLayout.Lay(heading, width),
        Paragraph paragraph => TextLayout.Lay(paragraph, width),
        Bullets bullets => TextLayout.Lay(bullets, width),
        Facts facts => FactsLayout.Lay(facts, width),
        Callout callout => [BoxLayout.Lay(callout, width)],
        Headline headline => [BoxLayout.Lay(headline, width)],
        Figure figure => BoxLayout.Lay(figure, width),
        Table table => TableLayout.Lay(table, width, continued),
        _ => throw new InvalidOperationException($"No layout is known for a {block.GetType().Name}."),
    };
}
