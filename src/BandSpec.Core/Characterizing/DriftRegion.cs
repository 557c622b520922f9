using BandSpec.Core.Numerics;
using BandSpec.Core.Numerics.Dense;
using MathNet.Numerics.Distributions;

namespace BandSpec.Core.Characterizing;

/// <summary>
/// Confidence intervals and region of activation energy and time exponent from the likelihood itself: all values whose deviance lies less
/// than a quantile above the smallest (Venzon &amp; Moolgavkar 1988, Appl. Statist. 37, 87-94). The quantile is Fisher's with the units less
/// the figures instead of chi-square's, which a dozen units would make too narrow.
/// </summary>
internal sealed class DriftRegion(
    DriftLikelihood likelihood, DriftSupport support, DriftLaw law, Grid covariance, int units, double confidence)
{
    private const int Corners = 48;

    /// <summary>Where the search for an edge is given up, in standard errors: the readings set no limit there.</summary>
    private const double Farthest = 12;

    private readonly double lowest = likelihood.Deviance(law);
    private readonly double freedom = Math.Max(1, units - support.Free.Count - 2);

    /// <summary>The interval of one figure; the value alone when it was assumed.</summary>
    public Estimate Interval(DriftFigure figure)
    {
        double value = figure == DriftFigure.Energy ? law.Energy : law.Exponent;
        if (!support.Free.Contains(figure))
            return new Estimate(value, value, value);
        double error = Math.Sqrt(covariance[(int)figure, (int)figure]);
        double quantile = FisherSnedecor.InvCDF(1, freedom, confidence);
        double Excess(double errors) => Profile(figure, errors * error) - lowest - quantile;
        double below = -Math.Min(Farthest, value / error);
        return new Estimate(
            value, Excess(below) > 0 ? value + (error * Edge(Excess, below)) : 0,
            Excess(Farthest) > 0 ? value + (error * Edge(Excess, Farthest)) : double.PositiveInfinity);
    }

    /// <summary>The edge of the joint region, corner by corner.</summary>
    public IReadOnlyList<DriftFigures> Edge()
    {
        if (support.Free.Count < 2)
            return [];
        double quantile = 2 * FisherSnedecor.InvCDF(2, freedom, confidence);
        Grid root = Cholesky.Factor(covariance);
        return [.. Enumerable.Range(0, Corners).Select(corner => Corner(root, 2 * Math.PI * corner / Corners, quantile))];
    }

    /// <summary>The profile deviance with one figure moved; the other's guess is its regression on the first.</summary>
    private double Profile(DriftFigure figure, double shift)
    {
        int held = (int)figure, other = 1 - held;
        double slope = covariance[held, other] / covariance[held, held];
        double rest = Math.Sqrt(Math.Max(0, covariance[other, other] - (slope * covariance[held, other])));
        return likelihood.Profile(figure, likelihood.LawAt(
            Math.Clamp(law.Energy + (held == 0 ? shift : slope * shift), -1, 9),
            Math.Clamp(law.Exponent + (held == 1 ? shift : slope * shift), -0.5, 4)), rest);
    }

    private DriftFigures Corner(Grid root, double angle, double quantile)
    {
        double[] direction = root.Times([Math.Cos(angle), Math.Sin(angle)]);
        DriftFigures At(double errors) => new(law.Energy + (errors * direction[0]), law.Exponent + (errors * direction[1]));
        double Excess(double errors)
        {
            DriftFigures figures = At(errors);
            return likelihood.Deviance(likelihood.LawAt(figures.ActivationEnergy, figures.TimeExponent)) - lowest - quantile;
        }

        double farthest = Math.Min(Farthest, direction[1] < 0 ? 0.999 * law.Exponent / -direction[1] : Farthest);
        return At(Excess(farthest) > 0 ? Edge(Excess, farthest) : farthest);
    }

    /// <summary>The place where the excess changes sign, to a thousandth of a standard error; steps outward first, so that no nearer edge is missed.</summary>
    private static double Edge(Func<double, double> excess, double farthest)
    {
        double inner = 0;
        for (double outer = farthest / Farthest; Math.Abs(outer) < Math.Abs(farthest); outer += farthest / Farthest)
        {
            if (excess(outer) > 0)
                return Roots.Bracketed(excess, inner, outer, 1e-3);
            inner = outer;
        }

        return Roots.Bracketed(excess, inner, farthest, 1e-3);
    }
}
