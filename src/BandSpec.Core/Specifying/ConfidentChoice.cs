using BandSpec.Core.Bands;
using BandSpec.Core.Planning;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.Specifying;

/// <summary>
/// The plan to take when the capability has to be reached with a stated confidence. The search knows margins, not bounds; so it is asked for a
/// capability raised by what the sample takes away, until the bound of its plan reaches 1. The plan is proven best for the raised capability;
/// a cheaper one whose bound also reaches 1 would have to lose less to the sample than this one.
/// </summary>
internal static class ConfidentChoice
{
    private const int MostRounds = 6;

    /// <summary>More than this a sample does not take away from a margin that is worth having.</summary>
    private const double MostRaise = 3;

    /// <summary>The plan; the one of largest margin when none can be claimed.</summary>
    /// <param name="application">The application.</param>
    /// <param name="search">Searches for the best plan of an application.</param>
    public static PlanChoice Of(Application application, Func<Application, PlanChoice> search)
    {
        PlanChoice choice = search(application);
        if (application.Requirement.Capability.Confidence is not { } confidence || application.Platform.Sample is null)
            return choice;
        double raise = 1;
        for (int round = 0; round < MostRounds; round++)
        {
            double lower = MarginBound.Of(application, choice.Plan, Bands(application, choice), confidence)!.Lower;
            if (lower >= 1 || lower * MostRaise <= raise)
                return choice;
            raise *= (1 + 1e-6) / lower;
            Application raised = application.With(application.Requirement with
            {
                Capability = application.Requirement.Capability.Raised(raise),
            });
            choice = search(raised);
            bool fits = Bands(raised, choice).Margin >= 1;
            choice = choice with { Everywhere = ContinuousMargin.AllOf(application, choice.Plan) };
            if (!fits)
                return choice;
        }

        return choice;
    }

    private static BandMap Bands(Application application, PlanChoice choice) => BandMap.Of(application, choice.Plan, choice.AddedNodes);
}
