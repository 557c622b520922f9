namespace BandSpec.Core.Numerics;

/// <summary>
/// Integrals of log-concave functions, which nearly all laws here lead to: a normal or chi density times the probability of an
/// interval whose ends move linearly is log-concave (Prékopa 1973), so it has one peak and falls off on both sides.
/// </summary>
/// <remarks>
/// The peak is found first, then the stretch that matters, and only that is integrated: a tail of 1e-200 keeps as many digits as the
/// middle, because nothing is subtracted and every node lies where the integrand counts.
/// </remarks>
internal static class LogConcave
{
    /// <summary>How far below its peak, in natural logarithm, the integrand is followed: e^−42 is 6e-19.</summary>
    private const double Depth = 42;

    /// <summary>Halvings that lead from the widest range to the narrowest peak a double can hold apart.</summary>
    private const int StepLimit = 200;

    /// <summary>
    /// <c>∫ f dx</c> over a finite range, given f and its logarithm (which may be less exact, and negative infinity where f is 0).
    /// Eight equal pieces, and around each step of f further cuts two step widths apart, with 16 nodes on every piece.
    /// </summary>
    public static double Integrate(Func<double, double> logarithm, Func<double, double> f, Interval range, ReadOnlySpan<SmoothStep> steps)
    {
        if (!(range.Width > 0))
            return 0;
        Interval support = Support(logarithm, range);
        return GaussLegendre.IntegrateBetween(f, Cuts(support, steps), order: 16);
    }

    /// <summary>The part of the range where a concave function stays within <see cref="Depth"/> of its maximum there.</summary>
    private static Interval Support(Func<double, double> concave, Interval range)
    {
        double peak = Peak(concave, range), level = concave(peak) - Depth;
        return new(Edge(concave, level, peak, range.Lower), Edge(concave, level, peak, range.Upper));
    }

    /// <summary>Where the function falls through the level, rounded outward by at most a tenth of the distance from the peak.</summary>
    private static double Edge(Func<double, double> concave, double level, double peak, double outside)
    {
        if (concave(outside) >= level)
            return outside;
        double inside = peak;
        for (int step = 0; step < StepLimit && Math.Abs(outside - inside) > 0.1 * Math.Abs(outside - peak); step++)
        {
            double middle = (inside + outside) / 2;
            if (concave(middle) >= level)
                inside = middle;
            else
                outside = middle;
        }

        return outside;
    }

    /// <summary>
    /// Golden-section search. It ends when all four places differ by less than 2 in logarithm: the peak, being concave, then is at most a few
    /// above them, which is all that the depth asks for.
    /// </summary>
    private static double Peak(Func<double, double> concave, Interval range)
    {
        const double Golden = 0.6180339887498949;
        (double low, double high) = range;
        double left = high - Golden * (high - low), right = low + Golden * (high - low);
        (double atLow, double atLeft, double atRight, double atHigh) = (concave(low), concave(left), concave(right), concave(high));
        for (int step = 0; step < StepLimit && !(Math.Max(atLeft, atRight) - Math.Min(atLow, atHigh) < 2); step++)
        {
            if (atLeft < atRight)
            {
                (low, atLow, left, atLeft) = (left, atLeft, right, atRight);
                atRight = concave(right = low + Golden * (high - low));
            }
            else
            {
                (high, atHigh, right, atRight) = (right, atRight, left, atLeft);
                atLeft = concave(left = high - Golden * (high - low));
            }
        }

        return new[] { (atLow, low), (atLeft, left), (atRight, right), (atHigh, high) }.Max().Item2;
    }

    private static List<double> Cuts(Interval support, ReadOnlySpan<SmoothStep> steps)
    {
        List<double> cuts = [support.Upper];
        for (int k = 0; k < 8; k++)
            cuts.Add(support.Lower + k * support.Width / 8);
        foreach (SmoothStep step in steps)
        {
            for (int k = -8; k <= 8; k += 2)
            {
                double cut = step.Place + k * step.Width;
                if (support.Contains(cut))
                    cuts.Add(cut);
            }
        }

        cuts.Sort();
        return cuts;
    }
}

/// <summary>A place where an integrand steps like a normal distribution function, and the standard deviation of that step.</summary>
/// <param name="Place">The middle of the step; an infinite or undefined place is passed over.</param>
/// <param name="Width">Its standard deviation, in the unit of the place.</param>
internal readonly record struct SmoothStep(double Place, double Width);
