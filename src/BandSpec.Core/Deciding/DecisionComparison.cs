using BandSpec.Core.Allocating;
using BandSpec.Core.Bands;
using BandSpec.Core.Requirements;
using BandSpec.Core.TestLimits;

namespace BandSpec.Core.Deciding;

/// <summary>Every decision rule held beside the others for one specification, and what accepted units are worth under the chosen one.</summary>
/// <param name="Rules">The rules in the order simple, guarded, specific risk, global risk; the chosen one with the requirement's parameter.</param>
/// <param name="Field">What units are worth in the field.</param>
public sealed record DecisionComparison(IReadOnlyList<RuleOutcome> Rules, FieldWorth Field)
{
    /// <summary>
    /// The parameters of rules that were not chosen: one U (ISO 14253-1, ILAC-G8), the specific risk of 2.5 % that ILAC-G8:09/2019 names for it, and 2 % of
    /// false acceptance (ANSI/NCSL Z540.3).
    /// </summary>
    private static readonly VerificationRules[] Usual =
    [
        new(0, null) { Rule = DecisionRule.Simple }, new(1, null), new(0, null) { Rule = DecisionRule.SpecificRisk, Risk = 0.025 },
        new(0, null) { Rule = DecisionRule.GlobalRisk, Risk = 0.02 },
    ];

    /// <summary>The outcome of the requirement's rule.</summary>
    public RuleOutcome Chosen => Rules.Single(rule => rule.IsChosen);

    /// <summary>Compares the rules for a plan.</summary>
    /// <param name="application">The application.</param>
    /// <param name="plan">The compensation plan.</param>
    /// <param name="bands">The plan's band.</param>
    /// <param name="allocation">How the allowed error was shared out.</param>
    /// <param name="cancellation">Ends the work within a fraction of a second.</param>
    /// <exception cref="OperationCanceledException">It was ended before every rule was judged.</exception>
    public static DecisionComparison Of(
        Application application, CompensationPlan plan, BandMap bands, Allocation allocation, CancellationToken cancellation = default)
    {
        ArgumentNullException.ThrowIfNull(application);
        ArgumentNullException.ThrowIfNull(bands);
        VerificationRules chosen = application.Requirement.Test;
        DecisionRule kind = chosen is { Rule: DecisionRule.Guarded, GuardBand: 0 } ? DecisionRule.Simple : chosen.Rule;
        IReadOnlyList<VerificationPoint> points = VerificationPoint.AllOf(application, plan, bands, allocation);
        UnitLaw law = new(application, plan, [.. points.Select(TestPlace.Of)], bands.Nodes);
        RuleJudging judging = new(application, law, points, cancellation);
        RuleOutcome[] rules = [.. Usual.Select(usual => usual.Rule == kind
            ? judging.Judge(chosen, true, points)
            : judging.Judge(usual, false, VerificationPoint.AllOf(application, plan, bands, allocation, usual with { Temperatures = chosen.Temperatures, Promise = chosen.Promise })))];
        double[] allowed = [.. bands.Nodes.Select(n => n.Allowed.Percent)];
        return new(rules, FieldWorth.Of(application, law, rules.Single(rule => rule.IsChosen), allowed, cancellation));
    }
}
