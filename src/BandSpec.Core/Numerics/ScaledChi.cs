namespace BandSpec.Core.Numerics;

/// <summary>
/// The law of <c>d = s/σ − 1</c>, how far a sample standard deviation s with ν degrees of freedom lies from the true σ, relatively:
/// <c>ν·(1 + d)²</c> is chi-square. Counting from 1 keeps the digits of large samples, whose s hardly differs from σ. ν ≥ 1.
/// </summary>
internal static class ScaledChi
{
    /// <summary>
    /// Density <c>2·(ν/2)^(ν/2)·e^(−ν/2)/Γ(ν/2) · x^(ν−1)·e^(−ν(x²−1)/2)</c> at x = 1 + d; 0 for d ≤ −1.
    /// </summary>
    public static double Density(double d, double degreesOfFreedom) => Math.Exp(LogDensity(d, degreesOfFreedom));

    /// <summary>Logarithm of <see cref="Density"/>.</summary>
    /// <remarks>
    /// <c>a^a·e^(−a)/Γ(a) = √(a/2π)·e^(−μ(a))</c> with Stirling's remainder μ, and <c>ln x − (x²−1)/2 = (ln(1+d) − d) − d²/2</c>: neither
    /// has large terms that cancel.
    /// </remarks>
    public static double LogDensity(double d, double degreesOfFreedom)
    {
        if (d <= -1)
            return double.NegativeInfinity;
        double nu = degreesOfFreedom, exponent = Elementary.LogOnePlusMinus(d) - d * d / 2;
        return Math.Log(nu / Math.PI) / 2 - StirlingRemainder(nu / 2) + nu * exponent - Elementary.LogOnePlus(d);
    }

    /// <summary>The range of d outside which the density underflows.</summary>
    public static Interval Range(double degreesOfFreedom) =>
        new(Math.Max(-1, -Math.Sqrt(760 / degreesOfFreedom)), Math.Sqrt(2 * 760 / degreesOfFreedom));

    /// <summary>
    /// Stirling's remainder <c>μ(a) = ln Γ(a) − (a − ½)·ln a + a − ½·ln 2π</c> for a ≥ ½; absolute error below 3e-16.
    /// </summary>
    /// <remarks>Its asymptotic series (Abramowitz and Stegun 6.1.41) above 16; below, <c>μ(a) = μ(a+1) + (a+½)·ln(1+1/a) − 1</c>.</remarks>
    internal static double StirlingRemainder(double a)
    {
        double shifted = 0;
        for (; a < 16; a++)
            shifted += (a + 0.5) * Elementary.LogOnePlus(1 / a) - 1;
        double inverse = 1 / (a * a);
        double series = 1.0 / 1188 * inverse;
        series = (1.0 / 1680 - series) * inverse;
        series = (1.0 / 1260 - series) * inverse;
        series = (1.0 / 360 - series) * inverse;
        return shifted + (1.0 / 12 - series) / a;
    }
}
