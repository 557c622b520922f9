using BandSpec.Core.Deciding;
using BandSpec.Core.Requirements;

namespace BandSpec.Documents.Printing;

/// <summary>
/// The decision rules side by side, and what accepted units are worth, as it is shown: probabilities with unit and 95 % interval. That of an accepted unit
/// is empty when none is.
/// </summary>
internal sealed record DecisionView(
    IReadOnlyList<RuleView> Rules, string AnyUnit, string AcceptedUnit, LimitWorthView? AtLimit, string AtOnePlace, string Currency);

/// <summary>
/// A rule: its key, its parameter (a multiple of U, or a risk in percent; may be empty), guard bands in %FS from the narrowest to the widest, risks of the
/// worst point and of the whole unit, units rejected, cost of rejects per unit made; the points at which it can accept nothing, and the expanded uncertainty
/// in %FS that would do (empty when none would).
/// </summary>
internal sealed record RuleView(
    string Key, string Parameter, bool Chosen, string GuardFrom, string GuardTo, string PointConsumer, string PointProducer, string Consumer, string Producer,
    string Rejected, string Cost, string Impossible, string Needed);

/// <summary>A unit that reads exactly on a limit: the point, the reading as an error in %FS, and how probable it is that it leaves the allowed error.</summary>
internal sealed record LimitWorthView(string Point, string Reading, string Leaving);

/// <summary>Rounds the comparison of decision rules for print.</summary>
internal sealed class DecisionViewMaker(DecisionComparison decisions, string sign)
{
    /// <summary>A page says that a chance is less than this; files have the figure.</summary>
    private const double Negligible = 1e-12;

    public DecisionView Make() => new(
        [.. decisions.Rules.Select(Of)], Chance(decisions.Field.AnyUnit), decisions.Field.AtLimit is null ? "" : Chance(decisions.Field.AcceptedUnit),
        decisions.Field.AtLimit is { } limit
            ? new LimitWorthView(limit.Point, Rounded.Nearest(limit.Reading, 3).Shown(sign), Chance(limit.Leaving))
            : null,
        Chance(new EstimatedProbability(decisions.Field.LargestPointwise, 0)),
        decisions.Rules[0].RejectCostPerUnit.Currency);

    private RuleView Of(RuleOutcome rule) => new(
        Key(rule.Rules.Rule), Parameter(rule.Rules), rule.IsChosen,
        Shown(rule.Points.Min(p => p.GuardBand.Percent)), Shown(rule.Points.Max(p => p.GuardBand.Percent)),
        Parts(rule.LargestConsumer), Parts(rule.LargestProducer), Parts(rule.Consumer.Value), Parts(rule.Producer.Value), Parts(rule.Rejected.Value),
        Rounded.Nearest(rule.RejectCostPerUnit.Amount, 3).Shown(sign), string.Join(", ", rule.Impossible),
        rule.UncertaintyNeeded is { } needed ? Rounded.Down(needed.Percent, 0.001).Shown(sign) : "");

    private string Parameter(VerificationRules rules) => rules.Rule switch
    {
        DecisionRule.Guarded => Rounded.Given(rules.GuardBand).Shown(sign),
        DecisionRule.SpecificRisk or DecisionRule.GlobalRisk => Rounded.Given(100 * rules.Risk!.Value).Shown(sign),
        _ => "",
    };

    /// <summary>The rule's word in files.</summary>
    internal static string Key(DecisionRule rule) => rule switch
    {
        DecisionRule.Simple => "simple",
        DecisionRule.SpecificRisk => "specific-risk",
        DecisionRule.GlobalRisk => "global-risk",
        _ => "guarded",
    };

    private string Shown(double percent) => Rounded.Nearest(percent, 3).Shown(sign);

    /// <summary>A probability in the unit that suits its size, with its interval if it has one.</summary>
    private string Chance(EstimatedProbability probability)
    {
        (double scale, string unit) = probability.Value switch
        {
            >= 0.01 => (1e2, "%"),
            >= 1e-7 => (1e6, "ppm"),
            _ => (1e9, "ppb"),
        };
        if (probability.Value < Negligible)
            return $"<\u00a0{Rounded.Nearest(scale * Negligible, 3).Shown(sign)}\u00a0{unit}";
        string shown(double value) => Rounded.Significant(scale * value).Shown(sign);
        return probability.StandardError > 0
            ? $"{shown(probability.Value)}\u00a0{unit} ({shown(probability.Lower)}\u00a0–\u00a0{shown(probability.Upper)})"
            : $"{shown(probability.Value)}\u00a0{unit}";
    }

    private string Parts(double probability) => Rounded.PerMillion(probability).Shown(sign);
}
