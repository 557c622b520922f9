using BandSpec.Core.Numerics;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.Bands;

/// <summary>What a unit does over the customer's temperature profile.</summary>
/// <param name="RmsError">Dwell-weighted root of the mean of <c>M² + σ_t²</c>.</param>
/// <param name="OutsideProbability">Dwell-weighted probability that the error is larger than allowed, 0 … 1.</param>
/// <param name="EquivalentTime">The service life expressed as time at the ageing test's temperature.</param>
/// <param name="AgeFactor">Drift at the end of life as a multiple of the drift in the ageing test.</param>
public sealed record ProfileFigures(PercentOfSpan RmsError, double OutsideProbability, Duration EquivalentTime, double AgeFactor)
{
    /// <summary>The figures of a plan over the application's profile.</summary>
    /// <param name="application">The application.</param>
    /// <param name="plan">The compensation plan.</param>
    public static ProfileFigures Of(Application application, CompensationPlan plan)
    {
        ArgumentNullException.ThrowIfNull(application);
        BandFormulas formulas = BandFormulas.Of(application, plan);
        double square = 0, outside = 0;
        foreach (ProfilePoint point in ProfilePoints.Of(application.Requirement))
        {
            BandNode node = formulas.At(point.Fraction, point.Temperature, point.Region);
            double added = node.Added.Percent, sigma = node.SigmaLongRun.Percent;
            square += point.Weight * ((added * added) + (sigma * sigma));
            outside += point.Weight * Outside(node.Allowed.Percent, added, sigma);
        }

        Ageing ageing = application.Platform.Ageing;
        return new ProfileFigures(
            PercentOfSpan.FromPercent(Math.Sqrt(square)), outside,
            AgeingLaw.EquivalentTime(ageing, application.Requirement.Profile),
            AgeingLaw.AgeFactor(ageing, application.Requirement.Profile));
    }

    /// <summary>Probability that <c>|M + σz| &gt; A</c>, the mean shifted to the nearer side.</summary>
    private static double Outside(double allowed, double added, double sigma) => sigma > 0
        ? NormalDistribution.UpperTail((allowed - added) / sigma) + NormalDistribution.UpperTail((allowed + added) / sigma)
        : added > allowed ? 1 : 0;
}
