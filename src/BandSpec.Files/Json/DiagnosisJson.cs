using System.Text.Json;
using BandSpec.Core.Bands;
using BandSpec.Core.Planning;
using BandSpec.Core.Specifying;

namespace BandSpec.Files.Json;

/// <summary>The part of <c>result.json</c> that says why the answer is what it is, and what would change it.</summary>
internal static class DiagnosisJson
{
    /// <summary>Writes what was worked out; nothing when nothing was.</summary>
    internal static void Diagnosis(this Utf8JsonWriter json, Specification specification)
    {
        if (specification.Diagnosis is { } diagnosis)
        {
            json.Object("held-by", held =>
            {
                held.Object("perfect-correction", floor => WriteNode(floor, diagnosis.Floor.Worst, diagnosis.FloorTerms));
                held.Object("plan", plan => WriteNode(plan, diagnosis.Binding, diagnosis.BindingTerms));
            });
            json.WriteBoolean("diagnosis-complete", diagnosis.IsComplete);
            json.Objects("diagnosis", diagnosis.Changes, WriteChange);
        }
        if (specification.Gains is { } gains)
            json.Objects("gains", gains, WriteGain);
    }

    private static void WriteNode(Utf8JsonWriter json, BandNode node, IReadOnlyList<TermPart> parts)
    {
        json.Figure("pressure-fraction", node.PressureFraction);
        json.Figure("temperature", node.Temperature.Celsius);
        json.WriteNumber("region", node.Region);
        json.Figure("margin", node.Margin);
        json.Objects("terms", parts, (item, part) =>
        {
            item.WriteString("term", part.Term.Key);
            item.Figure("part", part.Part);
            item.Figure("share", part.Share);
        });
    }

    private static void WriteChange(Utf8JsonWriter json, SingleChange change)
    {
        json.WriteString("change", change.Key);
        if (change.Region is { } region)
            json.WriteNumber("region", region);
        json.WriteBoolean("suffices", change.Suffices);
        json.Figure("before", change.Before);
        json.Figure("after", change.After ?? double.NaN);
        json.Figure("furthest", change.Furthest);
        json.Figure("step", change.Step);
        json.WriteString("unit", change.Unit);
        if (change.Plan is { } plan)
            json.Figures("temperatures", plan.Temperatures.Select(temperature => temperature.Celsius));
    }

    private static void WriteGain(Utf8JsonWriter json, MarginGain gain)
    {
        json.WriteString("input", gain.Key);
        json.Figure("gain", gain.Gain);
        json.Figure("step", gain.Step);
        json.WriteString("unit", gain.Unit);
    }
}
