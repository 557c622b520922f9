using BandSpec.Core.Numerics.Minimizing;
using BandSpec.Core.Numerics.NestedModels;

namespace BandSpec.Core.Characterizing;

/// <summary>
/// The likelihood of activation energy and time exponent, all else profiled out: the full likelihood, since restricted likelihoods of
/// different mean curves cannot be compared. Where the readings cannot tell one of the two, it stays at what was assumed.
/// </summary>
internal sealed class DriftLikelihood(IReadOnlyList<StoredUnit> units, AgeingScope scope, DriftSupport support)
{
    private const double Step = 1e-4;
    private const double EnergyScale = 0.1;
    private const double ExponentScale = 0.1;

    /// <summary>Spreads at the law that the search begins with, relative to that of a reading: the place where every later search begins.</summary>
    private readonly Lazy<double[]> rough = new(() => NestedEstimation.RoughSpreads(
        new NestedLikelihood(Sample(units, new DriftLaw(scope, support.StartEnergy, support.StartExponent)), restricted: false),
        [true, true], [false, false]).Within);

    /// <summary>The drift law that the readings make most likely.</summary>
    public DriftLaw MostLikely()
    {
        if (support.Free.Count == 0)
            return LawAt([]);
        Minimum minimum = new QuasiNewton(Sloped, 200).From([.. support.Free.Select(_ => 0.0)], [.. support.Free.Select(_ => 100.0)]);
        return LawAt(minimum.Point.Place);
    }

    /// <summary>The law at given energy and exponent, each kept at its assumption when not free.</summary>
    public DriftLaw LawAt(double energy, double exponent) => new(
        scope,
        support.Free.Contains(DriftFigure.Energy) ? energy : support.StartEnergy,
        support.Free.Contains(DriftFigure.Exponent) ? exponent : support.StartExponent);

    /// <summary>Minus twice the logarithm of the likelihood.</summary>
    public double Deviance(DriftLaw law) => Fit(law, restricted: false).Fit.Deviance;

    /// <summary>The most likely spreads of drift in zero and span.</summary>
    public (NestedLikelihood Likelihood, NestedFit Fit) Fit(DriftLaw law, bool restricted)
    {
        NestedLikelihood likelihood = new(Sample(units, law), restricted);
        return (likelihood, NestedEstimation.Fit(likelihood, new SharedCorrelationLaw(rough.Value, [0, 0], [], [])));
    }

    private static NestedSample Sample(IReadOnlyList<StoredUnit> units, DriftLaw law) =>
        new(2, [units.Select(unit => unit.Summary(law)).ToList()]);

    /// <summary>The smallest deviance with one figure held.</summary>
    public double Profile(DriftFigure held, double value)
    {
        DriftFigure[] others = [.. support.Free.Where(figure => figure != held)];
        DriftLaw Law(double[] place)
        {
            DriftLaw free = LawAt(place.Length == 0 ? [0.0] : [.. support.Free.Select(f => f == held ? 0 : place[0])]);
            return held == DriftFigure.Energy ? new DriftLaw(scope, value, free.Exponent) : new DriftLaw(scope, free.Energy, value);
        }

        if (others.Length == 0)
            return Deviance(Law([]));
        return new QuasiNewton(place => SlopedBy(place, p => Deviance(Law(p))), 60).From([0.0], [100.0]).Point.Value;
    }

    private SlopedPoint Sloped(double[] place) => SlopedBy(place, p => Deviance(LawAt(p)));

    /// <summary>Energy and exponent grow exponentially with the search's parameters, so that both stay above zero.</summary>
    private DriftLaw LawAt(double[] place)
    {
        (double energy, double exponent) = (support.StartEnergy, support.StartExponent);
        for (int i = 0; i < support.Free.Count && i < place.Length; i++)
            if (support.Free[i] == DriftFigure.Energy)
                energy *= Math.Exp(EnergyScale * place[i]);
            else
                exponent *= Math.Exp(ExponentScale * place[i]);
        return new DriftLaw(scope, energy, exponent);
    }

    /// <summary>A slope by central differences: the deviance is smooth and its rounding, about 1e-11, far below the step's effect.</summary>
    private static SlopedPoint SlopedBy(double[] place, Func<double[], double> function)
    {
        double[] slope = new double[place.Length];
        for (int i = 0; i < place.Length; i++)
        {
            double[] above = (double[])place.Clone(), below = (double[])place.Clone();
            (above[i], below[i]) = (place[i] + Step, place[i] - Step);
            slope[i] = (function(above) - function(below)) / (2 * Step);
        }

        return new SlopedPoint(place, function(place), slope);
    }
}
