namespace BandSpec.Core.Numerics;

/// <summary>
/// The three straight lines from which non-linearity is counted (ISA-51.1, IEC 61298-2). Points are given with x rising. None of them is
/// the least-squares line: "independent" and "zero-based" make the largest deviation smallest.
/// </summary>
internal static class StraightLines
{
    /// <summary>Through the first and the last point.</summary>
    public static Line Terminal(ReadOnlySpan<double> x, ReadOnlySpan<double> y)
    {
        double slope = (y[^1] - y[0]) / (x[^1] - x[0]);
        return new(y[0] - slope * x[0], slope);
    }

    /// <summary>The line whose largest deviation, up or down, is smallest.</summary>
    /// <remarks>
    /// The narrowest vertical strip around the points has an edge through two of them on one side of their convex hull; its middle is the line.
    /// </remarks>
    public static Line Independent(ReadOnlySpan<double> x, ReadOnlySpan<double> y)
    {
        Line best = Terminal(x, y);
        double narrowest = double.PositiveInfinity;
        foreach (int side in (ReadOnlySpan<int>)[1, -1])
        {
            List<int> hull = Hull(x, y, side);
            for (int k = 1; k < hull.Count; k++)
            {
                double slope = (y[hull[k]] - y[hull[k - 1]]) / (x[hull[k]] - x[hull[k - 1]]);
                (double lowest, double highest) = Intercepts(x, y, slope);
                if (highest - lowest < narrowest)
                    (narrowest, best) = (highest - lowest, new((lowest + highest) / 2, slope));
            }
        }
        return best;
    }

    /// <summary>The line through the first point whose largest deviation, up or down, is smallest.</summary>
    /// <remarks>As the slope grows the largest deviation upwards falls and the one downwards rises; the slope is where they meet.</remarks>
    public static Line ZeroBased(ReadOnlySpan<double> x, ReadOnlySpan<double> y)
    {
        double[] run = x[1..].ToArray(), rise = y[1..].ToArray();
        double steepest = double.NegativeInfinity, flattest = double.PositiveInfinity;
        for (int i = 0; i < run.Length; i++)
        {
            (run[i], rise[i]) = (run[i] - x[0], rise[i] - y[0]);
            (flattest, steepest) = (Math.Min(flattest, rise[i] / run[i]), Math.Max(steepest, rise[i] / run[i]));
        }
        double balance(double slope)
        {
            double above = double.NegativeInfinity, below = double.NegativeInfinity;
            for (int i = 0; i < run.Length; i++)
                (above, below) = (Math.Max(above, rise[i] - slope * run[i]), Math.Max(below, slope * run[i] - rise[i]));
            return below - above;
        }
        double found = flattest < steepest ? Roots.Bracketed(balance, flattest, steepest) : flattest;
        return new(y[0] - found * x[0], found);
    }

    /// <summary>The deviation of largest size from a line, with its sign: positive where the point lies above.</summary>
    public static double LargestDeviation(Line line, ReadOnlySpan<double> x, ReadOnlySpan<double> y)
    {
        double largest = 0;
        for (int i = 0; i < x.Length; i++)
        {
            double deviation = y[i] - line.At(x[i]);
            if (Math.Abs(deviation) > Math.Abs(largest))
                largest = deviation;
        }
        return largest;
    }

    private static (double Lowest, double Highest) Intercepts(ReadOnlySpan<double> x, ReadOnlySpan<double> y, double slope)
    {
        double lowest = double.PositiveInfinity, highest = double.NegativeInfinity;
        for (int i = 0; i < x.Length; i++)
            (lowest, highest) = (Math.Min(lowest, y[i] - slope * x[i]), Math.Max(highest, y[i] - slope * x[i]));
        return (lowest, highest);
    }

    /// <summary>Indices of the upper (side 1) or lower (side −1) convex hull, from left to right (Andrew's monotone chain).</summary>
    private static List<int> Hull(ReadOnlySpan<double> x, ReadOnlySpan<double> y, int side)
    {
        List<int> hull = [];
        for (int i = 0; i < x.Length; i++)
        {
            while (hull.Count > 1 && side * Turn(x, y, hull[^2], hull[^1], i) >= 0)
                hull.RemoveAt(hull.Count - 1);
            hull.Add(i);
        }
        return hull;
    }

    private static double Turn(ReadOnlySpan<double> x, ReadOnlySpan<double> y, int a, int b, int c) =>
        (x[b] - x[a]) * (y[c] - y[a]) - (y[b] - y[a]) * (x[c] - x[a]);
}
