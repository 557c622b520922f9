using BandSpec.Core.Numerics.Dense;

namespace BandSpec.Core.Numerics.Minimizing;

/// <summary>
/// Unconstrained minimisation by the BFGS method (Nocedal &amp; Wright, Numerical Optimization, 2nd ed. 2006, section 6.1) with a line search
/// that brackets a weak Wolfe point (Lewis &amp; Overton 2013, Math. Program. 141, 135-163, algorithm 4.6). The library's own minimiser
/// throws where a line search meets the edge of the domain; here an infinite value is an ordinary answer.
/// </summary>
/// <param name="function">The function with its slope.</param>
/// <param name="mostSteps">The most steps.</param>
/// <param name="worthwhile">A decrease, in the function's unit, below which no further step is wanted; 0 to go on until rounding ends it.</param>
internal sealed class QuasiNewton(Func<double[], SlopedPoint> function, int mostSteps, double worthwhile = 0)
{
    private const double SufficientDecrease = 1e-4;
    private const double SlopeLeft = 0.9;

    /// <summary>A further decrease of less than this part of the value is rounding; a quadratic's place is then known to about 1e-7.</summary>
    private const double RoundingPart = 4e-15;

    private const int MostHalvings = 40;
    private int evaluations;

    /// <summary>Minimises from a start; one outside the domain is returned as it is.</summary>
    /// <param name="start">The start.</param>
    /// <param name="curvature">A guess of the second derivative along each coordinate, above 0: sets the first step.</param>
    public Minimum From(double[] start, double[] curvature)
    {
        SlopedPoint here = Evaluate(start);
        if (!double.IsFinite(here.Value))
            return new Minimum(here, MinimizingEnd.NoFurtherDecrease, evaluations);
        Grid inverse = Grid.Diagonal(Array.ConvertAll(curvature, c => 1 / c));
        for (int step = 0; step < mostSteps; step++)
        {
            double[] direction = Array.ConvertAll(inverse.Times(here.Slope), d => -d);
            double slope = Vectors.Dot(here.Slope, direction);
            if (-slope / 2 < Math.Max(worthwhile, RoundingPart * Math.Max(1, Math.Abs(here.Value))))
                return new Minimum(here, MinimizingEnd.Converged, evaluations);
            SlopedPoint? next = Search(here, direction, slope);
            if (next is null)
                return new Minimum(here, MinimizingEnd.NoFurtherDecrease, evaluations);
            Update(inverse, here, next);
            here = next;
        }

        return new Minimum(here, MinimizingEnd.StepsUsedUp, evaluations);
    }

    private SlopedPoint Evaluate(double[] place)
    {
        evaluations++;
        return function(place);
    }

    /// <summary>A point along the direction that lowers the function enough and has little slope left; the lowest met when rounding stops the search.</summary>
    private SlopedPoint? Search(SlopedPoint here, double[] direction, double slope)
    {
        (double shortest, double longest, double length) = (0, double.PositiveInfinity, 1);
        SlopedPoint? lowest = null;
        for (int trial = 0; trial < MostHalvings; trial++)
        {
            SlopedPoint there = Evaluate(Along(here.Place, length, direction));
            if (there.Value < (lowest ?? here).Value)
                lowest = there;
            if (!(there.Value <= here.Value + (SufficientDecrease * length * slope)))
                longest = length;
            else if (Vectors.Dot(there.Slope, direction) < SlopeLeft * slope)
                shortest = length;
            else
                return there;
            length = double.IsPositiveInfinity(longest) ? 2 * length : (shortest + longest) / 2;
        }

        return lowest;
    }

    private static double[] Along(double[] place, double length, double[] direction)
    {
        double[] along = (double[])place.Clone();
        Products.AddTo(along, length, direction);
        return along;
    }

    /// <summary>The BFGS update of the inverse second derivative; left out where the slope did not rise along the step.</summary>
    private static void Update(Grid inverse, SlopedPoint from, SlopedPoint to)
    {
        double[] step = Along(to.Place, -1, from.Place);
        double[] change = Along(to.Slope, -1, from.Slope);
        double rise = Vectors.Dot(step, change);
        if (rise <= 1e-14 * Math.Sqrt(Vectors.Dot(step, step) * Vectors.Dot(change, change)))
            return;
        double[] turned = inverse.Times(change);
        double factor = (1 + (Vectors.Dot(change, turned) / rise)) / rise;
        for (int i = 0; i < step.Length; i++)
        {
            Products.AddTo(inverse.Row(i), factor * step[i], step);
            Products.AddTo(inverse.Row(i), -turned[i] / rise, step);
            Products.AddTo(inverse.Row(i), -step[i] / rise, turned);
        }
    }
}
