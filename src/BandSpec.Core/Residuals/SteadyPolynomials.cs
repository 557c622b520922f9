using BandSpec.Core.Numerics;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.Residuals;

/// <summary>
/// The terms that no plan can change, and the pressure standard, by powers of the pressure fraction: the same formulas as
/// <see cref="SteadyTerms"/>, for use where a band is judged at every place.
/// </summary>
internal sealed class SteadyPolynomials
{
    private static readonly double[] Hysteresis = [0, 4, -4];

    public SteadyPolynomials(Application application)
    {
        (Requirement requirement, Platform platform, Station station) = (application.Requirement, application.Platform, application.Station);
        double factor = new SteadyTerms(application).AgeFactor;
        Ageing ageing = platform.Ageing;
        Drift = [factor * ageing.Zero.Mean.Percent, factor * ageing.Span.Mean.Percent];
        Added = Scaled(Hysteresis, platform.PressureHysteresis.Mean.Percent / 2);
        Added = Polynomials.Add(Added, [platform.ThermalHysteresis.Mean.Percent]);
        Variance = Square(Scaled(Hysteresis, platform.PressureHysteresis.Sigma.Percent / 2));
        AddVariance([platform.ThermalHysteresis.Sigma.Percent], [platform.Repeatability.Percent]);
        AddVariance([requirement.Output.StepInPercent / Math.Sqrt(12)]);
        AddVariance([factor * ageing.Zero.Sigma.Percent], [0, factor * ageing.Span.Sigma.Percent]);
        AddVariance([station.StandardZero.Percent], [0, station.StandardProportional.Percent]);
        foreach (FurtherTerm further in requirement.FurtherTerms)
        {
            double[] along = further.Shape == FurtherTermShape.Constant ? [1] : [0, 1];
            Added = Polynomials.Add(Added, along, further.Bound.Percent);
            AddVariance(Scaled(along, further.Sigma.Percent));
        }
    }

    /// <summary>What adds: hysteresis means and further bounds, %FS; the drift is apart.</summary>
    public double[] Added { get; }

    /// <summary>Mean drift at the end of life, signed, %FS.</summary>
    public double[] Drift { get; }

    /// <summary>Variance of the steady terms and of the pressure standard, (%FS)².</summary>
    public double[] Variance { get; private set; }

    private void AddVariance(params ReadOnlySpan<double[]> sigmas)
    {
        foreach (double[] sigma in sigmas)
            Variance = Polynomials.Add(Variance, Square(sigma));
    }

    private static double[] Scaled(double[] p, double factor) => Polynomials.Multiply([factor], p);

    private static double[] Square(double[] p) => Polynomials.Multiply(p, p);
}
