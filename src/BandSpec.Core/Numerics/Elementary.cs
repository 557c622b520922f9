namespace BandSpec.Core.Numerics;

/// <summary>
/// Elementary functions near the points where the plain spelling loses digits. <c>double.LogP1</c> and <c>double.ExpM1</c> of
/// .NET 10 are the plain spelling (<c>Log(x + 1)</c>, <c>Exp(x) − 1</c>), so they do not help.
/// </summary>
internal static class Elementary
{
    /// <summary><c>ln(1 + x)</c>, to a few units in the last place also for tiny <paramref name="x"/>; x ≥ −1.</summary>
    /// <remarks>Kahan's correction: the rounding of <c>1 + x</c> enters logarithm and difference alike and cancels in their ratio.</remarks>
    public static double LogOnePlus(double x)
    {
        double sum = 1 + x;
        if (sum == 1)
            return x;
        return sum == 0 || double.IsInfinity(sum) ? Math.Log(sum) : Math.Log(sum) * (x / (sum - 1));
    }

    /// <summary><c>ln(1 + x) − x</c> for x &gt; −1, which is near −x²/2: no digits lost as x goes to 0.</summary>
    /// <remarks>
    /// With <c>r = x/(2 + x)</c>, <c>ln(1 + x) = 2·artanh r</c> and <c>2r − x = −x·r</c>, so the difference starts at second order;
    /// nine terms in r² are enough for |x| ≤ 0.3.
    /// </remarks>
    public static double LogOnePlusMinus(double x)
    {
        if (Math.Abs(x) > 0.3)
            return LogOnePlus(x) - x;
        double r = x / (2 + x), square = r * r, series = 0;
        for (int k = 19; k >= 3; k -= 2)
            series = series * square + 1.0 / k;
        return r * (2 * square * series - x);
    }

    /// <summary><c>e^x − 1</c>, to a few units in the last place also for tiny <paramref name="x"/>.</summary>
    /// <remarks>Kahan's correction, as above, with the roles exchanged.</remarks>
    public static double ExpMinusOne(double x)
    {
        double power = Math.Exp(x);
        if (power == 1)
            return x;
        double difference = power - 1;
        return difference == -1 || double.IsInfinity(power) ? difference : difference * (x / Math.Log(power));
    }

    /// <summary><c>e^(−z²/2)</c> to about one unit in the last place.</summary>
    /// <remarks>Rounding z² alone would cost z²/2 such units: 7e-14 at z = 38. The fused product returns what the rounding lost.</remarks>
    public static double ExpMinusHalfSquare(double z)
    {
        double square = z * z;
        if (square > 1600)
            return 0;
        double lost = Math.FusedMultiplyAdd(z, z, -square);
        return Math.Exp(-square / 2) * (1 - lost / 2);
    }
}
