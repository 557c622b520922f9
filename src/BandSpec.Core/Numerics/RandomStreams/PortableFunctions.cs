using System.Runtime.Intrinsics;

namespace BandSpec.Core.Numerics.RandomStreams;

/// <summary>
/// Exponential, logarithm and power of single numbers in operations that IEEE 754 fixes to the last bit; <see cref="Math"/> leaves them to
/// the C library of the machine.
/// </summary>
internal static class PortableFunctions
{
    /// <summary>
    /// <c>e^x</c> for <c>x &lt; 700</c>: <c>2^k·e^r</c> with <c>|r| ≤ ½ ln 2</c> by its Taylor series of degree 13, relative error below
    /// 2e-15; fades to 0 below −745.
    /// </summary>
    public static double Exp(double x)
    {
        double k = Math.Floor((x * 1.44269504088896338700) + 0.5);
        double r = (x - (k * 6.93147180369123816490e-01)) - (k * 1.90821492927058770002e-10);
        double sum = 1;
        for (int n = 13; n >= 1; n--)
            sum = 1 + (r * sum / n);
        return Math.ScaleB(sum, (int)Math.Max(k, -2000));
    }

    /// <summary>Natural logarithm of a positive normal number, within one unit in the last place.</summary>
    public static double Log(double x) => LaneFunctions.Log(Vector512.Create(x)).ToScalar();

    /// <summary><c>x^n</c> for <c>x ≥ 0</c>; <c>0^n</c> is 0 unless <c>n</c> is 0.</summary>
    public static double Power(double x, double n)
    {
        if (n == 0)
            return 1;
        return x > 0 ? Exp(n * Log(x)) : 0;
    }
}
