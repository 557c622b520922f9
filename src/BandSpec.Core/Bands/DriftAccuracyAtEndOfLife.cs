using BandSpec.Core.Requirements;

namespace BandSpec.Core.Bands;

/// <summary>
/// How uncertain the drift at the end of life is: the drift in the test, and the age factor <c>f</c>, whose logarithm
/// <c>n·ln(H/t_test)</c> carries the errors of time exponent and activation energy.
/// </summary>
internal sealed class DriftAccuracyAtEndOfLife
{
    private readonly Ageing ageing;
    private readonly AgeingAccuracy? accuracy;
    private readonly double factor;
    private readonly double logVariance;

    public DriftAccuracyAtEndOfLife(Application application, AgeingAccuracy? accuracy)
    {
        ageing = application.Platform.Ageing;
        this.accuracy = accuracy;
        if (accuracy is null)
            return;
        IReadOnlyList<DwellBin> profile = application.Requirement.Profile;
        factor = AgeingLaw.AgeFactor(ageing, profile);
        double byExponent = Math.Log(AgeingLaw.EquivalentTime(ageing, profile).Hours / ageing.TestDuration.Hours);
        logVariance = Square(byExponent * accuracy.TimeExponentError) + Square(ByEnergy(profile) * accuracy.ActivationEnergyError);
    }

    /// <summary>Variance of the mean drift's estimate, when it counts, and of the estimate of its variance.</summary>
    /// <param name="x">Pressure fraction.</param>
    /// <param name="counts">Whether the mean drift adds to the band; otherwise a fresh unit is the worse one.</param>
    public (double Mean, double Variance) At(double x, bool counts)
    {
        if (accuracy is null)
            return (0, 0);
        double mean = factor * (ageing.Zero.Mean.Percent + (ageing.Span.Mean.Percent * x));
        double square = factor * factor;
        double variance = square * (Square(ageing.Zero.Sigma.Percent) + Square(ageing.Span.Sigma.Percent * x));
        double meanVariance = (square * (Square(accuracy.Zero.MeanError.Percent) + Square(accuracy.Span.MeanError.Percent * x)))
            + (mean * mean * logVariance);
        double varianceOfVariance = Square(square * accuracy.Zero.VarianceError) + Square(square * x * x * accuracy.Span.VarianceError)
            + (Square(2 * variance) * logVariance);
        return (counts ? meanVariance : 0, varianceOfVariance);
    }

    /// <summary><c>∂ln f/∂Ea</c> by a central difference of a thousandth of an electronvolt.</summary>
    private double ByEnergy(IReadOnlyList<DwellBin> profile)
    {
        const double Step = 1e-3;
        double At(double step) => Math.Log(AgeingLaw.AgeFactor(ageing with { ActivationEnergy = ageing.ActivationEnergy + step }, profile));
        return (At(Step) - At(-Step)) / (2 * Step);
    }

    private static double Square(double value) => value * value;
}
