using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using BandSpec.Files.Forms;

namespace BandSpec.Files.Inputs;

/// <summary>The form of what a requirement says about the verification test.</summary>
internal static class TestForm
{
    private static readonly (string Word, DecisionRule Rule)[] Rules =
    [
        ("simple", DecisionRule.Simple), ("guarded", DecisionRule.Guarded), ("specific-risk", DecisionRule.SpecificRisk),
        ("global-risk", DecisionRule.GlobalRisk),
    ];

    private static readonly Key<DecisionRule> Rule = Key.Optional<DecisionRule>(
        "decision-rule", new ChoiceForm<DecisionRule>(Rules),
        "How acceptance limits are drawn. simple: the tolerance itself. guarded: inside it by guard-band times U (ISO 14253-1, ILAC-G8). specific-risk: "
        + "a unit that reads exactly on a limit is beyond the tolerance with the probability risk. global-risk: of all units made at most the fraction risk "
        + "is accepted at a point although beyond the tolerance there (JCGM 106:2012). guarded when left out.");

    private static readonly Key<double> GuardBand = Key.Optional<double>(
        "guard-band", new NumberForm(AcceptedRanges.GuardBand),
        "Guard band of the rule guarded, in multiples of the expanded uncertainty U (k = 2); 0 is simple acceptance.");

    private static readonly Key<double> Risk = Key.Optional<double>(
        "risk", new NumberForm(AcceptedRanges.Risk), "The risk that specific-risk or global-risk keeps, such as 0.025.");

    private static readonly Key<Promise> Promised = Key.Optional<Promise>(
        "promise", new ChoiceForm<Promise>(("population", Promise.Population), ("every-unit", Promise.EveryUnit)),
        "Of whom the band is promised with the stated capability. population: limits follow from what the process does. every-unit: no acceptance limit lies "
        + "so far out that a unit which reads exactly on it would have less than the long-run capability anywhere in use. population when left out.");

    private static readonly Key<WordOrList<Temperature>> Temperatures = Key.Optional(
        "temperatures",
        new WordOrListForm<Temperature>("auto", new ListForm<Temperature>("verification temperatures", QuantityForms.Temperature, 1, 20)),
        new WordOrList<Temperature>(null), "Verification temperatures, or auto to have them chosen.");

    /// <summary>The form of <c>test</c>.</summary>
    internal static MapForm<VerificationRules> Form { get; } = new("the verification test", [Rule, GuardBand, Risk, Promised, Temperatures], Of);

    /// <summary>Each rule has its own parameter: the one it needs has to be there, one that it would not look at may not.</summary>
    private static VerificationRules Of(MapValues v)
    {
        DecisionRule rule = v.FindValue(Rule) ?? DecisionRule.Guarded;
        string name = Rules.First(known => known.Rule == rule).Word;
        Judge(v, GuardBand, rule == DecisionRule.Guarded, name);
        Judge(v, Risk, rule is DecisionRule.SpecificRisk or DecisionRule.GlobalRisk, name);
        return new VerificationRules(v.FindValue(GuardBand) ?? 0, v.Of(Temperatures).Items) 
        {
            Rule = rule, Risk = v.FindValue(Risk), Promise = v.FindValue(Promised) ?? Promise.Population,
        };
    }

    private static void Judge(MapValues v, Key<double> parameter, bool isNeeded, string rule)
    {
        if (isNeeded && !v.Has(parameter))
            v.Complain(parameter, "missing-key", $"no key `{parameter.Name}` for the decision rule `{rule}`", $"`{parameter.Name}`: {parameter.Form.Accepted}");
        else if (!isNeeded && v.Has(parameter))
            v.Complain(parameter, "decision-rule", $"`{parameter.Name}` beside the decision rule `{rule}`, which does not look at it", $"no `{parameter.Name}`, or another decision rule");
    }
}
