using BandSpec.Core.Requirements;

namespace BandSpec.Core.Residuals;

/// <summary>What one error source adds and scatters at one pressure, whatever the plan: plain %FS.</summary>
/// <param name="Term">The source.</param>
/// <param name="Added">Mean magnitude, not negative.</param>
/// <param name="Sigma">Standard deviation, the same within a lot and over lots.</param>
internal readonly record struct SteadyTerm(ErrorTerm Term, double Added, double Sigma);

/// <summary>The errors that no compensation plan can change: hysteresis, repeatability, resolution, ageing, further terms.</summary>
internal sealed class SteadyTerms
{
    private readonly Requirement requirement;
    private readonly Platform platform;

    public SteadyTerms(Application application)
    {
        (requirement, platform) = (application.Requirement, application.Platform);
        AgeFactor = AgeingLaw.AgeFactor(platform.Ageing, requirement.Profile);
    }

    /// <summary>Drift at the end of life as a multiple of the drift in the ageing test.</summary>
    public double AgeFactor { get; }

    /// <summary>Mean drift at the end of life, <c>f(z̄ + s̄x)</c>, signed.</summary>
    public double DriftMean(double x) =>
        AgeFactor * (platform.Ageing.Zero.Mean.Percent + (platform.Ageing.Span.Mean.Percent * x));

    /// <summary>Standard deviation of the drift, <c>f√(σ_z² + σ_s²x²)</c>.</summary>
    public double DriftSigma(double x)
    {
        double zero = platform.Ageing.Zero.Sigma.Percent, span = platform.Ageing.Span.Sigma.Percent * x;
        return AgeFactor * Math.Sqrt((zero * zero) + (span * span));
    }

    /// <summary>Every steady term at a pressure, in the order of <see cref="ErrorTerm.Usual"/>, then the further terms.</summary>
    public IEnumerable<SteadyTerm> At(double x)
    {
        double shape = PressureShapes.Hysteresis(x) / 2;
        yield return Of(ErrorTerm.PressureHysteresis, platform.PressureHysteresis, shape);
        yield return Of(ErrorTerm.ThermalHysteresis, platform.ThermalHysteresis, 1);
        yield return new SteadyTerm(ErrorTerm.Repeatability, 0, platform.Repeatability.Percent);
        yield return new SteadyTerm(ErrorTerm.Resolution, 0, requirement.Output.StepInPercent / Math.Sqrt(12));
        yield return new SteadyTerm(ErrorTerm.Ageing, Math.Abs(DriftMean(x)), DriftSigma(x));
        foreach (FurtherTerm further in requirement.FurtherTerms)
        {
            double along = further.Shape == FurtherTermShape.Constant ? 1 : x;
            yield return new SteadyTerm(ErrorTerm.Of(further), further.Bound.Percent * along, further.Sigma.Percent * along);
        }
    }

    private static SteadyTerm Of(ErrorTerm term, Spread spread, double shape) =>
        new(term, spread.Mean.Percent * shape, spread.Sigma.Percent * shape);
}
