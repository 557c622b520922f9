using BandSpec.Core.Numerics;

namespace BandSpec.Core.Bands;

/// <summary>
/// Finds the least margin over a region by branch and bound. A rectangle is done with when Bernstein coefficients prove that all of it keeps
/// the least margin met so far; otherwise it is halved, and the corners of its halves may lower that margin. The margin is at least
/// <c>m &gt; 0</c> where <c>room ≥ 0</c> and <c>room² − m²·(3Cσ)² ≥ 0</c>; at least <c>m ≤ 0</c> where <c>room ≥ 0</c> or
/// <c>m²·(3Cσ)² − room² ≥ 0</c>: polynomials, all of them.
/// </summary>
internal sealed class LeastMarginSearch
{
    /// <summary>How far below the least margin met, relative, a place may stay unseen.</summary>
    private const double Gap = 1e-9;

    /// <summary>Margins beyond this count as unlimited: a band without scatter.</summary>
    private const double Unlimited = 1e6;

    /// <summary>A rectangle halved this often has sides below 10⁻⁹; what is left of it is rounding.</summary>
    private const int DeepestHalving = 60;

    private readonly Stack<Patch> open = new();
    private (double Margin, double X, double V) least = (Unlimited, 0, 0);

    public LeastMarginSearch(RegionSurfaces surfaces) => open.Push(Patch.Of(surfaces));

    /// <summary>The least margin and a place where it is taken, both coordinates 0 … 1.</summary>
    public (double Margin, double X, double V) Run()
    {
        LookAtCorners(open.Peek());
        while (open.TryPop(out Patch? patch))
        {
            if (patch.Depth >= DeepestHalving || patch.Keeps(least.Margin - (Gap * Math.Abs(least.Margin))))
                continue;
            (Patch lower, Patch upper) = patch.Halve();
            LookAtCorners(lower);
            LookAtCorners(upper);
            open.Push(upper);
            open.Push(lower);
        }

        return least;
    }

    private void LookAtCorners(Patch patch)
    {
        for (int corner = 0; corner < 4; corner++)
        {
            bool upperX = corner % 2 == 1, upperV = corner >= 2;
            double margin = patch.MarginAt(upperX, upperV);
            if (margin < least.Margin)
                least = (margin, upperX ? patch.X.Upper : patch.X.Lower, upperV ? patch.V.Upper : patch.V.Lower);
        }
    }

    /// <summary>A rectangle with the nets of all branches of the room, their squares, and the needs.</summary>
    private sealed record Patch(
        Interval X, Interval V, int Depth, BernsteinNet[][] Rooms, BernsteinNet[][] Squares, BernsteinNet[] Needs)
    {
        public static Patch Of(RegionSurfaces surfaces)
        {
            Surface[] all = [.. surfaces.Needs, .. surfaces.Rooms.SelectMany(r => r).Select(r => r.Square())];
            int x = Math.Max(1, all.Max(s => s.DegreeInX)), v = Math.Max(1, all.Max(s => s.DegreeInT));
            BernsteinNet Net(Surface s) => BernsteinNet.Of(s, x, v);
            return new Patch(
                new Interval(0, 1), new Interval(0, 1), 0,
                [.. surfaces.Rooms.Select(b => b.Select(Net).ToArray())],
                [.. surfaces.Rooms.Select(b => b.Select(r => Net(r.Square())).ToArray())],
                [.. surfaces.Needs.Select(Net)]);
        }

        /// <summary>Whether the whole rectangle is proven to keep a margin, for one branch of the allowance at least.</summary>
        public bool Keeps(double margin)
        {
            for (int a = 0; a < Rooms.Length; a++)
            {
                bool keeps = true;
                for (int b = 0; keeps && b < Rooms[a].Length; b++)
                    keeps = margin > 0
                        ? IsNowhereNegative(Rooms[a][b]) && Needs.All(n => IsNowhereAbove(n, Squares[a][b], margin * margin))
                        : IsNowhereNegative(Rooms[a][b]) || Needs.All(n => IsNowhereBelow(n, Squares[a][b], margin * margin));
                if (keeps)
                    return true;
            }

            return false;
        }

        /// <summary>The margin at a corner.</summary>
        public double MarginAt(bool upperX, bool upperV)
        {
            double room = Rooms.Max(branches => branches.Min(r => r.Corner(upperX, upperV)));
            double margin = double.PositiveInfinity;
            foreach (BernsteinNet need in Needs)
                margin = Math.Min(margin, Ratio(room, Math.Sqrt(Math.Max(0, need.Corner(upperX, upperV)))));
            return margin;
        }

        public (Patch Lower, Patch Upper) Halve()
        {
            bool alongX = Depth % 2 == 0;
            (BernsteinNet Lower, BernsteinNet Upper)[][] rooms = [.. Rooms.Select(b => b.Select(n => n.Halve(alongX)).ToArray())];
            (BernsteinNet Lower, BernsteinNet Upper)[][] squares = [.. Squares.Select(b => b.Select(n => n.Halve(alongX)).ToArray())];
            (BernsteinNet Lower, BernsteinNet Upper)[] needs = [.. Needs.Select(n => n.Halve(alongX))];
            Interval cut = alongX ? X : V;
            double middle = (cut.Lower + cut.Upper) / 2;
            Interval low = new(cut.Lower, middle), high = new(middle, cut.Upper);
            return (
                new Patch(alongX ? low : X, alongX ? V : low, Depth + 1, Lowers(rooms), Lowers(squares), [.. needs.Select(n => n.Lower)]),
                new Patch(alongX ? high : X, alongX ? V : high, Depth + 1, Uppers(rooms), Uppers(squares), [.. needs.Select(n => n.Upper)]));
        }

        private static BernsteinNet[][] Lowers((BernsteinNet Lower, BernsteinNet Upper)[][] halves) =>
            [.. halves.Select(b => b.Select(h => h.Lower).ToArray())];

        private static BernsteinNet[][] Uppers((BernsteinNet Lower, BernsteinNet Upper)[][] halves) =>
            [.. halves.Select(b => b.Select(h => h.Upper).ToArray())];

        private static double Ratio(double room, double need) =>
            need > 0 ? room / need : room >= 0 ? double.PositiveInfinity : double.NegativeInfinity;

        private static bool IsNowhereNegative(BernsteinNet net)
        {
            foreach (double c in net.Coefficients)
                if (c < 0)
                    return false;
            return true;
        }

        private static bool IsNowhereAbove(BernsteinNet need, BernsteinNet square, double factor)
        {
            for (int i = 0; i < need.Coefficients.Length; i++)
                if (factor * need.Coefficients[i] > square.Coefficients[i])
                    return false;
            return true;
        }

        private static bool IsNowhereBelow(BernsteinNet need, BernsteinNet square, double factor)
        {
            for (int i = 0; i < need.Coefficients.Length; i++)
                if (factor * need.Coefficients[i] < square.Coefficients[i])
                    return false;
            return true;
        }
    }
}
