using System.Text.Json;
using BandSpec.Core.Deciding;
using BandSpec.Core.TestLimits;

namespace BandSpec.Files.Json;

/// <summary>Writes what every decision rule would mean for a specification, and what accepted units are worth; errors in %FS.</summary>
public static class DecisionJson
{
    /// <summary>The bytes of a document of its own, for programs.</summary>
    public static ReadOnlyMemory<byte> Write(DecisionComparison decisions)
    {
        ArgumentNullException.ThrowIfNull(decisions);
        return JsonFile.Of(json => Members(json, decisions));
    }

    /// <summary>The members <c>decision-rules</c> and <c>field</c>.</summary>
    internal static void Members(Utf8JsonWriter json, DecisionComparison decisions)
    {
        json.Objects("decision-rules", decisions.Rules, Rule);
        json.Object("field", field =>
        {
            field.Object("any-unit", one => Probability(one, decisions.Field.AnyUnit));
            field.Object("accepted-unit", one => Probability(one, decisions.Field.AcceptedUnit));
            field.Figure("largest-pointwise", decisions.Field.LargestPointwise);
            if (decisions.Field.AtLimit is { } limit)
            {
                field.Object("at-limit", one =>
                {
                    one.WriteString("point", limit.Point);
                    one.Figure("reading", limit.Reading);
                    Probability(one, limit.Leaving);
                });
            }
        });
    }

    private static void Rule(Utf8JsonWriter json, RuleOutcome outcome)
    {
        json.WriteString("rule", JudgementJson.Word(outcome.Rules.Rule));
        json.WriteBoolean("chosen", outcome.IsChosen);
        if (outcome.Rules.Rule == Core.Requirements.DecisionRule.Guarded)
            json.Figure("guard-band", outcome.Rules.GuardBand);
        if (outcome.Rules.Risk is { } risk)
            json.Figure("risk", risk);
        json.Object("consumer-risk", one => Probability(one, outcome.Consumer));
        json.Object("producer-risk", one => Probability(one, outcome.Producer));
        json.Object("rejected", one => Probability(one, outcome.Rejected));
        json.Figure("reject-cost-per-unit", outcome.RejectCostPerUnit.Amount);
        json.WriteString("currency", outcome.RejectCostPerUnit.Currency);
        json.Strings("impossible", outcome.Impossible);
        if (outcome.UncertaintyNeeded is { } needed)
            json.Figure("uncertainty-needed", needed.Percent);
        json.Objects("points", outcome.Points, Point);
    }

    private static void Point(Utf8JsonWriter json, VerificationPoint point)
    {
        json.WriteString("id", point.Id);
        json.Figure("guard-band", point.GuardBand.Percent);
        json.Figure("lower", point.Lower);
        json.Figure("upper", point.Upper);
        json.Figure("consumer-risk", point.ConsumerRisk);
        json.Figure("producer-risk", point.ProducerRisk);
    }

    private static void Probability(Utf8JsonWriter json, EstimatedProbability probability)
    {
        json.Figure("probability", probability.Value);
        json.Figure("standard-error", probability.StandardError);
    }
}
