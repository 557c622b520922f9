
namespace BandSpec.Core.Bands;

/// <summary>
/// Finds the least margin over a region by branch and bound. A rectangle is done with when Bernstein coefficients prove that all of it keeps
/// the least margin met so far; otherwise it is halved, and the corners of its halves may lower that margin: from a corner that does, the way
/// leads downhill to the least margin near it. The margin is at least
/// <c>m &gt; 0</c> where <c>room ≥ 0</c> and <c>room² − m²·(3Cσ)² ≥ 0</c>; at least <c>m ≤ 0</c> where <c>room ≥ 0</c> or
/// <c>m²·(3Cσ)² − room² ≥ 0</c>: polynomials, all of them.
/// </summary>
internal sealed class LeastMarginSearch
{
    /// <summary>How far below the least margin met, relative, a place may stay unseen.</summary>
    private const double Gap = 1e-9;

    /// <summary>Margins beyond this count as unlimited: a band without scatter.</summary>
    private const double Unlimited = 1e6;

    /// <summary>A rectangle halved this often has sides of 10⁻⁹ or so; what is left of it is rounding.</summary>
    private const int DeepestHalving = 60;

    private readonly Stack<MarginPatch> open = new();
    private (double Margin, double Fraction, double Along) least = (Unlimited, 0, 0);

    public LeastMarginSearch(IEnumerable<RegionPiece> pieces)
    {
        foreach (RegionPiece piece in pieces)
            open.Push(MarginPatch.Of(piece));
        foreach (MarginPatch patch in open)
            LookAtCorners(patch);
    }

    /// <summary>The least margin and where it is taken: the pressure fraction and the place between the region's ends, 0 … 1.</summary>
    public (double Margin, double Fraction, double Along) Run()
    {
        while (open.TryPop(out MarginPatch? patch))
        {
            if (patch.Depth >= DeepestHalving || patch.Keeps(least.Margin - (Gap * Math.Abs(least.Margin))))
                continue;
            (MarginPatch lower, MarginPatch upper) = patch.Halve();
            LookAtCorners(lower);
            LookAtCorners(upper);
            open.Push(upper);
            open.Push(lower);
        }

        return least;
    }

    private void LookAtCorners(MarginPatch patch)
    {
        for (int corner = 0; corner < 4; corner++)
        {
            bool upperU = corner % 2 == 1, upperV = corner >= 2;
            double margin = patch.MarginAt(upperU, upperV), before = least.Margin;
            if (margin >= before)
                continue;
            (double u, double v) = patch.Corner(upperU, upperV);
            Keep(patch.Piece, margin, u, v);
            if (margin < before - (Gap * Math.Abs(before)))
                GoDownhill(patch.Piece, u, v);
        }
    }

    private void GoDownhill(RegionPiece piece, double u, double v)
    {
        (double margin, u, v) = new MarginDescent(piece).From(u, v);
        if (margin < least.Margin)
            Keep(piece, margin, u, v);
    }

    private void Keep(RegionPiece piece, double margin, double u, double v)
    {
        (double fraction, double along) = piece.PlaceOf(u, v);
        least = (margin, fraction, along);
    }
}
