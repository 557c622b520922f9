using System.Globalization;
using System.Text;
using BandSpec.Core.Deciding;
using BandSpec.Core.Requirements;
using BandSpec.Core.Specifying;

namespace BandSpec.Cli.Printing;

/// <summary>The decision rules side by side on one screen, and what accepted units are worth.</summary>
internal static class DecisionScreen
{
    private static readonly CultureInfo Plain = CultureInfo.InvariantCulture;

    /// <summary>The screen.</summary>
    public static string Of(Specification specification, DecisionComparison decisions, Ink ink)
    {
        SpecificationIdentity identity = specification.Application.Requirement.Identity;
        StringBuilder screen = new();
        screen.Append(Plain, $"\n{ink.Bold(identity.FolderName)}  {identity.Title}\n\n");
        screen.Append(TableOf(decisions, ink)).Append('\n');
        screen.Append(ink.Faint("Risks in millionths of all units made (JCGM 106:2012), of the whole unit to about 2 %;\ncost of rejects spread over all units made.\n* the rule of the requirement")).Append("\n\n");
        foreach (RuleOutcome rule in decisions.Rules.Where(r => r.Impossible.Count > 0))
        {
            string needed = rule.UncertaintyNeeded is { } u
                ? string.Create(Plain, $"an expanded uncertainty of {Math.Floor(u.Percent * 1000) / 1000:0.000} %FS or less would do")
                : "no uncertainty of the test would do";
            screen.Append(Plain, $"{ink.Yellow($"{Name(rule.Rules)} cannot be met")}: it accepts nothing at {string.Join(", ", rule.Impossible)}; {needed}\n");
        }

        AppendField(screen, decisions.Field, ink);
        return screen.Append('\n').ToString();
    }

    private static string TableOf(DecisionComparison decisions, Ink ink)
    {
        StringBuilder table = new();
        string cost = $"cost, {decisions.Rules[0].RejectCostPerUnit.Currency}";
        table.Append(ink.Faint($"{"",-22}{"guard band",-16}{"worst point",21}{"whole unit",31}")).Append('\n');
        table.Append(ink.Faint($"{"  Rule",-22}{"%FS",-16}{"consumer",11}{"producer",10}{"consumer",11}{"producer",10}{"rejected",10}{cost,11}")).Append('\n');
        foreach (RuleOutcome rule in decisions.Rules)
        {
            double from = rule.Points.Min(p => p.GuardBand.Percent), to = rule.Points.Max(p => p.GuardBand.Percent);
            string guard = to - from < 0.0005 ? to.ToString("0.000", Plain) : string.Create(Plain, $"{from:0.000} to {to:0.000}");
            string name = (rule.IsChosen ? "* " : "  ") + Name(rule.Rules).PadRight(20);
            table.Append(Plain, $"{(rule.IsChosen ? ink.Bold(name) : name)}{guard,-16}{Parts(rule.LargestConsumer),11}{Parts(rule.LargestProducer),10}")
                .Append(Plain, $"{Parts(rule.Consumer.Value),11}{Parts(rule.Producer.Value),10}{Parts(rule.Rejected.Value),10}{rule.RejectCostPerUnit.Amount,11:0.000}\n");
        }

        return table.ToString();
    }

    private static void AppendField(StringBuilder screen, FieldWorth field, Ink ink)
    {
        static string chance(EstimatedProbability one) =>
            $"{LotFigures.Probability(one.Value),-12} {LotFigures.Probability(one.Lower)} to {LotFigures.Probability(one.Upper)}";
        screen.Append(Plain, $"{ink.Bold("Field")}     that a unit leaves the allowed error anywhere, 95 % interval of the integration\n");
        screen.Append(Plain, $"          any unit              {chance(field.AnyUnit)}\n");
        screen.Append(field.AtLimit is { } limit
            ? string.Create(
                Plain, $"          an accepted unit      {chance(field.AcceptedUnit)}\n          reading on its limit  {chance(limit.Leaving)}, worst at {limit.Point} with {limit.Reading:0.000} %FS\n")
            : "          no unit is accepted\n");
        screen.Append(Plain, $"          at one place at most  {LotFigures.Probability(field.LargestPointwise)}\n");
    }

    private static string Name(VerificationRules rules) => rules.Rule switch
    {
        DecisionRule.Simple => "simple",
        DecisionRule.SpecificRisk => string.Create(Plain, $"specific-risk {rules.Risk}"),
        DecisionRule.GlobalRisk => string.Create(Plain, $"global-risk {rules.Risk}"),
        _ => string.Create(Plain, $"guarded {rules.GuardBand} U"),
    };

    /// <summary>Two figures, rounded up: what is printed is not exceeded.</summary>
    private static string Parts(double probability)
    {
        double parts = probability * 1e6;
        if (parts < 0.001)
            return "< 0.001";
        double step = Math.Pow(10, Math.Floor(Math.Log10(parts)) - 1);
        return (Math.Ceiling((parts / step) - 1e-7) * step).ToString(parts < 10 ? "0.####" : "0", Plain);
    }
}
