namespace BandSpec.Core.Numerics.RandomStreams;

/// <summary>
/// The upper tail of the standard normal law and its inverse, in numbers that do not depend on the machine's C library, relative error below
/// 1e-13 for arguments up to 37.
/// </summary>
internal static class NormalTail
{
    private const double InverseRootOfTwoPi = 0.39894228040143267794;

    /// <summary>
    /// <c>Q(z) = P(Z > z)</c>. Below 3 by the series <c>½ − φ(z)·Σ z^(2k+1)/(1·3·5…(2k+1))</c>, above by Laplace's continued fraction
    /// <c>φ(z)/(z + 1/(z + 2/(z + 3/…)))</c> (Abramowitz and Stegun 26.2.11 and 26.2.14).
    /// </summary>
    public static double Probability(double z)
    {
        if (z < 0)
            return 1 - Probability(-z);
        return z < 3 ? 0.5 - Series(z) : Fraction(z);
    }

    /// <summary>
    /// The <c>z</c> with <c>Q(z) = tail</c>, for <c>0 &lt; tail &lt; 1</c>: the starting value of Wichura's algorithm AS 241 (Applied Statistics
    /// 37, 1988), PPND16.
    /// </summary>
    public static double Quantile(double tail)
    {
        double q = 0.5 - tail;
        if (Math.Abs(q) <= 0.425)
            return q * NormalQuantileRationals.Central(0.180625 - (q * q));
        double r = Math.Sqrt(-PortableFunctions.Log(q > 0 ? tail : 1 - tail));
        double z = r <= 5 ? NormalQuantileRationals.Middle(r - 1.6) : NormalQuantileRationals.Far(r - 5);
        return q > 0 ? z : -z;
    }

    /// <summary>The density <c>φ(z) = e^(−z²/2)/√(2π)</c>.</summary>
    public static double Density(double z) => InverseRootOfTwoPi * PortableFunctions.Exp(-z * z / 2);

    private static double Series(double z)
    {
        double term = z;
        double sum = z;
        for (int k = 3; term > sum * 1e-17; k += 2)
            sum += term *= z * z / k;
        return Density(z) * sum;
    }

    private static double Fraction(double z)
    {
        const int Depth = 120;
        double below = z;
        for (int k = Depth; k >= 1; k--)
            below = z + (k / below);
        return Density(z) / below;
    }
}
