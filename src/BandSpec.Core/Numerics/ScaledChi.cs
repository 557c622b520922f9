namespace BandSpec.Core.Numerics;

/// <summary>
/// The law of <c>x = s/σ</c>, a sample standard deviation over the true one, with ν ≥ 1 degrees of freedom: <c>ν·x²</c> is chi-square. Its
/// argument is <c>d = x − origin</c>, so that large samples, whose x hardly differs from 1, keep the digits of the difference.
/// </summary>
/// <remarks>
/// Density <c>2·(ν/2)^(ν/2)·e^(−ν/2)/Γ(ν/2) · x^(ν−1)·e^(−ν(x²−1)/2)</c>. With Stirling's remainder μ the factor in front is <c>√(ν/π)·e^(−μ(ν/2))</c>, and
/// near x = 1 the exponent is <c>ν·((ln(1+d) − d) − d²/2)</c>: neither has large terms that cancel.
/// </remarks>
internal readonly struct ScaledChi
{
    private readonly double nu;
    private readonly double logFactor;

    /// <summary>The law for <paramref name="degreesOfFreedom"/> ≥ 1.</summary>
    public ScaledChi(double degreesOfFreedom)
    {
        nu = degreesOfFreedom;
        logFactor = Math.Log(nu / Math.PI) / 2 - StirlingRemainder(nu / 2);
        Origin = nu < 100 ? 0 : 1;
    }

    /// <summary>Where d is counted from: 0 below 100 degrees of freedom, where small x matter, else 1.</summary>
    public double Origin { get; }

    /// <summary>The range of d outside which the density underflows.</summary>
    public Interval Range => new(Math.Max(0, 1 - Math.Sqrt(760 / nu)) - Origin, 1 + Math.Sqrt(2 * 760 / nu) - Origin);

    /// <summary>Density at <c>x = origin + d</c>; 0 at x = 0 unless ν = 1.</summary>
    public double Density(double d) => Math.Exp(LogDensity(d));

    /// <summary>Logarithm of <see cref="Density"/>.</summary>
    public double LogDensity(double d)
    {
        if (Origin == 1)
            return logFactor + nu * (Elementary.LogOnePlusMinus(d) - d * d / 2) - Elementary.LogOnePlus(d);
        double power = nu == 1 ? 0 : (nu - 1) * Math.Log(d);
        return logFactor + power - nu * (d - 1) * (d + 1) / 2;
    }

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
