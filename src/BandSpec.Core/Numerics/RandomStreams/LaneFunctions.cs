using System.Runtime.CompilerServices;
using System.Runtime.Intrinsics;
using Lanes = System.Runtime.Intrinsics.Vector512<double>;

namespace BandSpec.Core.Numerics.RandomStreams;

/// <summary>
/// Elementary functions of eight numbers at once, made of additions, products, fused products, quotients and square roots only, which
/// IEEE 754 fixes to the last bit. The C library's logarithm and sine differ from machine to machine; these do not, so that a simulated lot
/// is the same everywhere.
/// </summary>
internal static class LaneFunctions
{
    private const long SquareRootOfHalf = 0x3FE6_A09E_667F_3BCD;
    private const double LogOfTwoUpper = 6.93147180369123816490e-01;
    private const double LogOfTwoLower = 1.90821492927058770002e-10;

    /// <summary>
    /// Natural logarithm of positive normal numbers, within one unit in the last place: <c>x = 2^k·z</c>, <c>z</c> in [√½, √2), and with
    /// <c>s = (z − 1)/(z + 1)</c> the even series of <c>2·artanh s</c>. Method and coefficients: e_log.c of the freely distributable libm
    /// (Sun Microsystems, 1993).
    /// </summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static Lanes Log(Lanes x)
    {
        Vector512<long> bits = x.AsInt64();
        Vector512<long> above = bits - Vector512.Create(SquareRootOfHalf);
        Vector512<long> power = above >> 52;
        Lanes k = Vector512.ConvertToDouble(power);
        Lanes f = (bits - (power << 52)).AsDouble() - Lanes.One;
        Lanes s = f / (f + Vector512.Create(2.0));
        Lanes z = s * s;
        Lanes w = z * z;
        Lanes even = w * Chain(w, 1.531383769920937332e-01, 2.222219843214978396e-01, 3.999999999940941908e-01);
        Lanes odd = z * Vector512.FusedMultiplyAdd(
            w, Chain(w, 1.479819860511658591e-01, 1.818357216161805012e-01, 2.857142874366239149e-01), Vector512.Create(6.666666666666735130e-01));
        Lanes halfSquare = Vector512.Create(0.5) * f * f;
        Lanes tail = Vector512.FusedMultiplyAdd(k, Vector512.Create(LogOfTwoLower), s * (halfSquare + (even + odd)));
        return (k * Vector512.Create(LogOfTwoUpper)) - ((halfSquare - tail) - f);
    }

    /// <summary>
    /// Sine and cosine of a part of a turn, <c>sin 2πt</c> and <c>cos 2πt</c> for <c>0 ≤ t ≤ 1</c>, absolute error below 2e-16. The quarter
    /// turn is split off exactly; what remains lies in ±π/4, where the polynomials are those of k_sin.c and k_cos.c of the freely
    /// distributable libm (Sun Microsystems, 1993).
    /// </summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    public static (Lanes Sine, Lanes Cosine) SineAndCosineOfTurns(Lanes t)
    {
        Lanes quarters = t * Vector512.Create(4.0);
        Lanes shifted = quarters + Vector512.Create(RoundingShift);
        Lanes r = (quarters - (shifted - Vector512.Create(RoundingShift))) * Vector512.Create(Math.PI / 2);
        Vector512<long> quadrant = shifted.AsInt64();
        Lanes z = r * r;
        Lanes sine = Vector512.FusedMultiplyAdd(r * z, SineSeries(z), r);
        Lanes cosine = Vector512.FusedMultiplyAdd(z * z, CosineSeries(z), Vector512.FusedMultiplyAdd(z, Vector512.Create(-0.5), Lanes.One));
        Lanes swap = Vector512.Equals(quadrant & Vector512<long>.One, Vector512<long>.One).AsDouble();
        Vector512<long> sineSign = (quadrant & Vector512.Create(2L)) << 62;
        Vector512<long> cosineSign = ((quadrant + Vector512<long>.One) & Vector512.Create(2L)) << 62;
        Lanes s = Vector512.ConditionalSelect(swap, cosine, sine);
        Lanes c = Vector512.ConditionalSelect(swap, sine, cosine);
        return ((s.AsInt64() ^ sineSign).AsDouble(), (c.AsInt64() ^ cosineSign).AsDouble());
    }

    /// <summary>One and a half times 2^52: adding it rounds to an integer, which then stands in the lowest bits.</summary>
    private const double RoundingShift = 6755399441055744.0;

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static Lanes SineSeries(Lanes z)
    {
        Lanes upper = Chain(z, 1.58969099521155010221e-10, -2.50507602534068634195e-08, 2.75573137070700676789e-06);
        return Vector512.FusedMultiplyAdd(
            z,
            Vector512.FusedMultiplyAdd(
                z, Vector512.FusedMultiplyAdd(z, upper, Vector512.Create(-1.98412698298579493134e-04)),
                Vector512.Create(8.33333333332248946124e-03)),
            Vector512.Create(-1.66666666666666324348e-01));
    }

    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static Lanes CosineSeries(Lanes z)
    {
        Lanes upper = Chain(z, -1.13596475577881948265e-11, 2.08757232129817482790e-09, -2.75573143513906633035e-07);
        return Vector512.FusedMultiplyAdd(
            z,
            Vector512.FusedMultiplyAdd(
                z, Vector512.FusedMultiplyAdd(z, upper, Vector512.Create(2.48015872894767294178e-05)),
                Vector512.Create(-1.38888888888741095749e-03)),
            Vector512.Create(4.16666666666666019037e-02));
    }

    /// <summary><c>(a·x + b)·x + c</c>.</summary>
    [MethodImpl(MethodImplOptions.AggressiveInlining)]
    private static Lanes Chain(Lanes x, double a, double b, double c) =>
        Vector512.FusedMultiplyAdd(x, Vector512.FusedMultiplyAdd(x, Vector512.Create(a), Vector512.Create(b)), Vector512.Create(c));
}
