namespace BandSpec.Documents.Pdf.Layout;

/// <summary>Puts slabs on pages, one below the other, and keeps together what belongs together as long as a page can hold it.</summary>
internal sealed class Pagination
{
    private readonly PageGeometry _page;
    private readonly List<List<Mark>> _pages = [[]];
    private double _y;

    private Pagination(PageGeometry page) => (_page, _y) = (page, page.Top);

    public static IReadOnlyList<IReadOnlyList<Mark>> Paginate(IReadOnlyList<Slab> slabs, PageGeometry page)
    {
        var pagination = new Pagination(page);
        for (int first = 0; first < slabs.Count;)
        {
            var last = first;
            while (slabs[last].KeepWithNext && last + 1 < slabs.Count && !slabs[last + 1].StartsPage) last++;
            pagination.PlaceTogether(slabs.Skip(first).Take(last - first + 1).ToList());
            first = last + 1;
        }
        return pagination._pages;
    }

    private bool AtTop => _y <= _page.Top;

    private void PlaceTogether(List<Slab> chain)
    {
        if (chain[0].StartsPage && !AtTop) NewPage();
        // Half a page is the most that is left empty to keep a chain together; a higher one is broken where the page ends.
        var height = chain.Sum(s => s.Height + s.Before) - (AtTop ? chain[0].Before : 0);
        if (!AtTop && _y + height > _page.Bottom && (height < _page.Room || _page.Bottom - _y < _page.Room / 2)) NewPage();
        foreach (var slab in chain) Place(slab);
    }

    private void Place(Slab slab)
    {
        // Room after something is no room before the next thing once a page lies between.
        if (AtTop && slab.Marks.Count == 0) return;
        var before = AtTop ? 0 : slab.Before;
        if (_y + before + slab.Height > _page.Bottom)
        {
            if (PlacePartOf(slab, before)) return;
            if (!AtTop) NewPage();
            before = 0;
        }
        if (AtTop && slab.Repeat is { } heading) Draw(heading);
        if (_y + slab.Height > _page.Bottom && PlacePartOf(slab, 0)) return;
        _y += before;
        Draw(slab);
    }

    // Only a slab higher than a third of a page is worth cutting; others move to the next page whole.
    private bool PlacePartOf(Slab slab, double before)
    {
        if (slab.Split is null || slab.Height < _page.Room / 3) return false;
        if (AtTop && slab.Repeat is { } heading) Draw(heading);
        if (slab.Split(_page.Bottom - _y - before) is not var (part, rest)) return false;
        _y += before;
        Draw(part);
        NewPage();
        Place(rest with { Repeat = slab.Repeat });
        return true;
    }

    private void Draw(Slab slab)
    {
        _pages[^1].AddRange(slab.Marks.Select(m => m.Moved(_page.Left, _y)));
        _y += slab.Height;
    }

    private void NewPage()
    {
        _pages.Add([]);
        _y = _page.Top;
    }
}
