using BandSpec.Core.Numerics;

namespace BandSpec.Core.Bands;

/// <summary>
/// Goes downhill from a place of a piece to the least margin near it, by damped Newton steps held inside the piece (Nocedal &amp; Wright 2006,
/// sections 3.3 and 16.7). The proof of a least margin does not rest on it: it only says early how low the margin comes, and a rectangle is
/// then discarded when it is still large.
/// </summary>
/// <param name="piece">The piece.</param>
internal sealed class MarginDescent(RegionPiece piece)
{
    private const int MostSteps = 40;
    private const int MostHalvings = 30;

    /// <summary>The margin at the end of the way, and where that is; <c>u</c> and <c>v</c> in 0 … 1.</summary>
    /// <param name="u">Place to start from.</param>
    /// <param name="v">Place to start from.</param>
    public (double Margin, double U, double V) From(double u, double v)
    {
        double margin = MarginAt(u, v);
        for (int step = 0; step < MostSteps && double.IsFinite(margin); step++)
        {
            (double du, double dv) = Step(u, v);
            double share = 1;
            for (int halving = 0; ; halving++, share /= 2)
            {
                double nextU = Math.Clamp(u + (share * du), 0, 1), nextV = Math.Clamp(v + (share * dv), 0, 1), next = MarginAt(nextU, nextV);
                if (next < margin)
                {
                    (margin, u, v) = (next, nextU, nextV);
                    break;
                }

                if (halving == MostHalvings || (nextU == u && nextV == v))
                    return (margin, u, v);
            }
        }

        return (margin, u, v);
    }

    private double MarginAt(double u, double v)
    {
        (_, _, double room, double need) = Active(u, v);
        return need > 0 ? room / Math.Sqrt(need) : double.PositiveInfinity;
    }

    /// <summary>The branch of the room and the criterion that make the margin.</summary>
    private (Surface Room, Surface Need, double RoomValue, double NeedValue) Active(double u, double v)
    {
        (Surface room, double least) = Extreme(piece.Rooms, 1, u, v);
        (Surface need, double value) = Extreme(piece.Needs, least >= 0 ? -1 : 1, u, v);
        return (room, need, least, value);
    }

    private static (Surface Surface, double Value) Extreme(IReadOnlyList<Surface> surfaces, int sign, double u, double v)
    {
        (Surface best, double value) = (surfaces[0], surfaces[0].ValueAt(u, v));
        for (int i = 1; i < surfaces.Count; i++)
            if (surfaces[i].ValueAt(u, v) is var other && sign * other < sign * value)
                (best, value) = (surfaces[i], other);
        return (best, value);
    }

    /// <summary>A Newton step for <c>room/√need</c>; along the slope where it does not curve upwards. A way that leads outside is left alone.</summary>
    private (double U, double V) Step(double u, double v)
    {
        (Surface roomSurface, Surface needSurface, _, _) = Active(u, v);
        SurfaceJet room = roomSurface.At(u, v), need = needSurface.At(u, v);
        (double gu, double gv) = (Slope(room.Value, need.Value, room.X, need.X), Slope(room.Value, need.Value, room.T, need.T));
        double uu = Curvature(room.Value, need.Value, (room.X, need.X), (room.X, need.X), room.XX, need.XX);
        double vv = Curvature(room.Value, need.Value, (room.T, need.T), (room.T, need.T), room.TT, need.TT);
        double uv = Curvature(room.Value, need.Value, (room.X, need.X), (room.T, need.T), room.XT, need.XT);
        bool isUHeld = IsHeld(u, gu), isVHeld = IsHeld(v, gv);
        if (isUHeld || isVHeld)
            return (isUHeld ? 0 : Along(gu, uu), isVHeld ? 0 : Along(gv, vv));
        double determinant = (uu * vv) - (uv * uv);
        return uu > 0 && determinant > 0
            ? (((uv * gv) - (vv * gu)) / determinant, ((uv * gu) - (uu * gv)) / determinant)
            : (Along(gu, uu), Along(gv, vv));
    }

    private static bool IsHeld(double at, double slope) => (at <= 0 && slope >= 0) || (at >= 1 && slope <= 0);

    private static double Along(double slope, double curvature) => curvature > 0 ? -slope / curvature : -Math.Sign(slope);

    /// <summary>The derivative of <c>r·n^(−1/2)</c>, times <c>√n</c>.</summary>
    private static double Slope(double r, double n, double dr, double dn) => dr - (r * dn / (2 * n));

    /// <summary>The second derivative of <c>r·n^(−1/2)</c> by two variables, times <c>√n</c>.</summary>
    private static double Curvature(double r, double n, (double R, double N) a, (double R, double N) b, double rab, double nab) =>
        rab - (((a.R * b.N) + (b.R * a.N) + (r * nab)) / (2 * n)) + (0.75 * r * a.N * b.N / (n * n));
}
