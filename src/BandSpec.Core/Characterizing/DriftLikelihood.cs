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

    /// <summary>Deviance that nobody misses: intervals end where it has risen by about 4.</summary>
    private const double Worthwhile = 1e-7;

    /// <summary>From a guess by the information matrix two or three steps reach the profile to 1e-6 of the deviance's rise at the interval's end.</summary>
    private const int ProfileSteps = 3;

    /// <summary>Spreads at the law that the search begins with, relative to that of a reading: the place where every later search begins.</summary>
    private readonly Lazy<double[]> rough = new(() => NestedEstimation.RoughSpreads(
        new NestedLikelihood(Sample(units, new DriftLaw(scope, support.StartEnergy, support.StartExponent)), restricted: false),
        [true, true], [false, false]).Within);

    /// <summary>The drift law that the readings make most likely.</summary>
    public DriftLaw MostLikely()
    {
        if (support.Free.Count == 0)
            return LawAt([]);
        Minimum minimum = new QuasiNewton(Sloped, 100, Worthwhile).From([.. support.Free.Select(_ => 0.0)], [.. support.Free.Select(_ => 100.0)]);
        return LawAt(minimum.Point.Place);
    }

    /// <summary>The law at given energy and exponent, each kept at its assumption when not free.</summary>
    public DriftLaw LawAt(double energy, double exponent) => new(
        scope,
        support.Free.Contains(DriftFigure.Energy) ? energy : support.StartEnergy,
        support.Free.Contains(DriftFigure.Exponent) ? exponent : support.StartExponent);

    /// <summary>
    /// Minus twice the logarithm of the likelihood; infinite far outside what is thinkable. Somewhat below zero it goes on smoothly, so that
    /// an interval's end at zero is an ordinary place.
    /// </summary>
    public double Deviance(DriftLaw law) => law.Energy is >= -2 and <= 10 && law.Exponent is >= -1 and <= 5
        ? Fit(law, restricted: false).Fit.Deviance
        : double.PositiveInfinity;

    /// <summary>The most likely spreads of drift in zero and span.</summary>
    public (NestedLikelihood Likelihood, NestedFit Fit) Fit(DriftLaw law, bool restricted)
    {
        NestedLikelihood likelihood = new(Sample(units, law), restricted);
        return (likelihood, NestedEstimation.Fit(likelihood, new SharedCorrelationLaw(rough.Value, [0, 0], [], [])));
    }

    private static NestedSample Sample(IReadOnlyList<StoredUnit> units, DriftLaw law) =>
        new(2, [units.Select(unit => unit.Summary(law)).ToList()]);

    /// <summary>The smallest deviance with one figure held and the other, when it is free, at its best.</summary>
    /// <param name="held">The figure that is held.</param>
    /// <param name="law">The law with the held figure's value and a guess of the other's, from which its search begins.</param>
    /// <param name="error">About the other's standard error with the first one known.</param>
    public double Profile(DriftFigure held, DriftLaw law, double error)
    {
        if (support.Free.Count == 1)
            return Deviance(law);
        DriftLaw Shifted(double[] errors) => held == DriftFigure.Energy
            ? new DriftLaw(scope, law.Energy, law.Exponent + (errors[0] * error))
            : new DriftLaw(scope, law.Energy + (errors[0] * error), law.Exponent);
        return new QuasiNewton(place => SlopedBy(place, p => Deviance(Shifted(p))), ProfileSteps, Worthwhile).From([0.0], [2.0]).Point.Value;
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

        double value = function(place);
        return double.IsFinite(value) && slope.All(double.IsFinite) ? new SlopedPoint(place, value, slope) : SlopedPoint.Outside(place);
    }
}
