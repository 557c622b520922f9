namespace BandSpec.Core.Numerics;

/// <summary>Roots of functions of one variable, found inside a bracket and never outside it.</summary>
internal static class Roots
{
    private const int StepLimit = 200;

    /// <summary>
    /// The x between <paramref name="a"/> and <paramref name="b"/> with <c>f(x) = 0</c>, for a continuous f of opposite signs at the ends,
    /// to within <paramref name="tolerance"/> or the spacing of doubles, whichever is larger.
    /// </summary>
    /// <exception cref="ArgumentException">The function has the same sign at both ends.</exception>
    /// <remarks>
    /// Chandrupatla, Adv. Eng. Softw. 28 (1997) 145-149: inverse quadratic interpolation when the three points allow it, else bisection.
    /// Own code because the library's Brent method also stops on a small function value, which a risk of 1e-12 always is.
    /// </remarks>
    public static double Bracketed(Func<double, double> f, double a, double b, double tolerance = 0)
    {
        double fa = f(a), fb = f(b);
        if (fa == 0 || fb == 0)
            return fa == 0 ? a : b;
        if (!(fa * fb < 0) && Math.Sign(fa) == Math.Sign(fb))
            throw new ArgumentException($"No change of sign between {a:R} ({fa:R}) and {b:R} ({fb:R}).", nameof(f));
        double c = a, fc = fa, fraction = 0.5;
        for (int step = 0; step < StepLimit; step++)
        {
            double x = a + fraction * (b - a), fx = f(x);
            if (Math.Sign(fx) == Math.Sign(fa))
                (c, fc) = (a, fa);
            else
                (c, b, fc, fb) = (b, a, fb, fa);
            (a, fa) = (x, fx);
            double best = Math.Abs(fa) < Math.Abs(fb) ? a : b;
            double smallest = (2 * Math.BitIncrement(Math.Abs(best)) - 2 * Math.Abs(best) + tolerance / 2) / Math.Abs(b - a);
            if (fa == 0 || smallest > 0.5)
                return best;
            fraction = Math.Clamp(NextFraction(a, b, c, fa, fb, fc), smallest, 1 - smallest);
        }
        return a;
    }

    /// <summary>
    /// The root of a rising function, its bracket found by steps that double from <paramref name="step"/> on away from
    /// <paramref name="start"/>. The function may be negative or positive infinity far out.
    /// </summary>
    /// <exception cref="ArgumentException">No change of sign within 200 doublings, or the function is not a number at the start.</exception>
    public static double Rising(Func<double, double> f, double start, double step)
    {
        double value = f(start), from = start;
        if (value == 0)
            return start;
        double towards = value < 0 ? step : -step;
        for (int doubling = 0; doubling < StepLimit; doubling++)
        {
            double to = from + towards;
            if (Math.Sign(f(to)) != Math.Sign(value))
                return Bracketed(f, from, to);
            (from, towards) = (to, 2 * towards);
        }
        throw new ArgumentException($"No root found from {start:R}.", nameof(f));
    }

    private static double NextFraction(double a, double b, double c, double fa, double fb, double fc)
    {
        double place = (a - b) / (c - b), value = (fa - fb) / (fc - fb);
        bool interpolates = value * value < place && (1 - value) * (1 - value) < 1 - place;
        return interpolates ? fa / (fb - fa) * fc / (fb - fc) + (c - a) / (b - a) * fa / (fc - fa) * fb / (fc - fb) : 0.5;
    }
}
