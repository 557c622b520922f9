using BandSpec.Core.Numerics;

namespace BandSpec.Core.Bands;

/// <summary>A rectangle of a <see cref="RegionPiece"/> with the nets of all branches of the room, of their squares, and of the needs.</summary>
internal sealed class MarginPatch
{
    private readonly Interval u;
    private readonly Interval v;
    private readonly BernsteinNet[] rooms;
    private readonly BernsteinNet[] squares;
    private readonly BernsteinNet[] needs;

    private MarginPatch(
        RegionPiece piece, Interval u, Interval v, int depth, BernsteinNet[] rooms, BernsteinNet[] squares, BernsteinNet[] needs)
    {
        (Piece, this.u, this.v, Depth) = (piece, u, v, depth);
        (this.rooms, this.squares, this.needs) = (rooms, squares, needs);
    }

    /// <summary>The piece.</summary>
    public RegionPiece Piece { get; }

    /// <summary>How often the piece was halved to come here.</summary>
    public int Depth { get; }

    /// <summary>The whole of a piece.</summary>
    public static MarginPatch Of(RegionPiece piece)
    {
        Surface[] squares = [.. piece.Rooms.Select(r => Surface.Multiply(r, r))];
        int inU = Math.Max(1, squares.Concat(piece.Needs).Max(s => s.DegreeInX)), inV = Math.Max(1, squares.Concat(piece.Needs).Max(s => s.DegreeInT));
        BernsteinNet[] NetsOf(IEnumerable<Surface> surfaces) => [.. surfaces.Select(s => BernsteinNet.Of(s, inU, inV))];
        return new MarginPatch(piece, new Interval(0, 1), new Interval(0, 1), 0, NetsOf(piece.Rooms), NetsOf(squares), NetsOf(piece.Needs));
    }

    /// <summary>Whether the whole rectangle is proven to keep a margin.</summary>
    public bool Keeps(double margin)
    {
        double factor = margin * margin;
        for (int b = 0; b < rooms.Length; b++)
            if (margin > 0
                ? !(IsNowhereNegative(rooms[b]) && needs.All(n => IsNowhereNegative(squares[b], n, factor)))
                : !(IsNowhereNegative(rooms[b]) || needs.All(n => IsNowhereNegative(n, squares[b], 1 / factor))))
                return false;
        return true;
    }

    /// <summary>The margin at a corner.</summary>
    public double MarginAt(bool upperU, bool upperV)
    {
        double room = rooms.Min(r => r.Corner(upperU, upperV));
        return needs.Min(n => Ratio(room, Math.Sqrt(Math.Max(0, n.Corner(upperU, upperV)))));
    }

    /// <summary>Where in the piece a corner lies.</summary>
    public (double U, double V) Corner(bool upperU, bool upperV) => (upperU ? u.Upper : u.Lower, upperV ? v.Upper : v.Lower);

    /// <summary>Two halves, cut across the direction in which room and need change more: a valley is not cut along its floor.</summary>
    public (MarginPatch Lower, MarginPatch Upper) Halve()
    {
        bool alongU = squares.Concat(needs).Sum(n => n.LargestStep(true)) >= squares.Concat(needs).Sum(n => n.LargestStep(false));
        Interval cut = alongU ? u : v;
        double middle = (cut.Lower + cut.Upper) / 2;
        Interval low = new(cut.Lower, middle), high = new(middle, cut.Upper);
        (BernsteinNet Lower, BernsteinNet Upper)[] r = Halves(rooms, alongU), s = Halves(squares, alongU), n = Halves(needs, alongU);
        return (
            new MarginPatch(Piece, alongU ? low : u, alongU ? v : low, Depth + 1, Lowers(r), Lowers(s), Lowers(n)),
            new MarginPatch(Piece, alongU ? high : u, alongU ? v : high, Depth + 1, Uppers(r), Uppers(s), Uppers(n)));
    }

    private static (BernsteinNet Lower, BernsteinNet Upper)[] Halves(BernsteinNet[] nets, bool alongU) => [.. nets.Select(n => n.Halve(alongU))];

    private static BernsteinNet[] Lowers((BernsteinNet Lower, BernsteinNet Upper)[] halves) => [.. halves.Select(h => h.Lower)];

    private static BernsteinNet[] Uppers((BernsteinNet Lower, BernsteinNet Upper)[] halves) => [.. halves.Select(h => h.Upper)];

    private static double Ratio(double room, double need) =>
        need > 0 ? room / need : room >= 0 ? double.PositiveInfinity : double.NegativeInfinity;

    private static bool IsNowhereNegative(BernsteinNet net)
    {
        foreach (double c in net.Coefficients)
            if (c < 0)
                return false;
        return true;
    }

    /// <summary>Whether <c>a − factor·b</c> is proven not to be negative.</summary>
    private static bool IsNowhereNegative(BernsteinNet a, BernsteinNet b, double factor)
    {
        ReadOnlySpan<double> ofA = a.Coefficients, ofB = b.Coefficients;
        for (int i = 0; i < ofA.Length; i++)
            if (factor * ofB[i] > ofA[i])
                return false;
        return true;
    }
}
