using System.Text.Json;
using BandSpec.Core.Planning;
using BandSpec.Core.Specifying;

namespace BandSpec.Files.Json;

/// <summary>
/// Writes the alternatives of a requirement for programs. Temperatures are in °C, errors in %FS, costs in the currency that is named, for one
/// unit.
/// </summary>
public static class TradeoffJson
{
    /// <summary>The format's name; it changes when a member is renamed or removed.</summary>
    public const string Format = "bandspec/tradeoff/1";

    /// <summary>The bytes of the document.</summary>
    public static ReadOnlyMemory<byte> Write(PlanAlternatives found)
    {
        ArgumentNullException.ThrowIfNull(found);
        return JsonFile.Of(json =>
        {
            json.WriteString("format", Format);
            json.Identity(found.Application.Requirement.Identity);
            json.WriteString("currency", found.Application.Station.Chamber.HourlyRate.Currency);
            json.WriteNumber("plans-considered", found.Fronts.PlansConsidered);
            json.WriteBoolean("proven", found.Proven);
            Cost(json, "margin-complete-to", found.Fronts.MarginCompleteTo);
            Cost(json, "rms-error-complete-to", found.Fronts.RmsErrorCompleteTo);
            json.Object("optimum", one => WriteChoice(one, found.Optimum));
            if (found.Pinned is { } pinned)
                json.Object("pinned", one => WriteChoice(one, pinned));
            json.Objects("by-margin", found.ByMargin, WriteAlternative);
            json.Objects("by-rms-error", found.ByRmsError, WriteAlternative);
        });
    }

    private static void Cost(Utf8JsonWriter json, string name, double? cost) => json.Figure(name, cost ?? double.NaN);

    private static void WriteChoice(Utf8JsonWriter json, PlanChoice choice)
    {
        json.PlanMembers(choice.Plan);
        json.Figure("cost-per-unit", choice.Run.CostPerUnit);
        json.Figure("margin", choice.ContinuousMargin);
        json.WriteBoolean("proven", choice.Proven);
    }

    private static void WriteAlternative(Utf8JsonWriter json, PlanAlternative one)
    {
        json.WriteNumber("number", one.Number);
        json.Figure("cost-per-unit", one.Point.CostPerUnit);
        json.Figure("margin", one.Point.Margin);
        json.Figure("rms-error", one.Point.RmsError);
        json.PlanMembers(one.Point.Plan);
        json.WriteBoolean("proven", one.Point.Proven);
        json.WriteBoolean("optimum", one.IsOptimum);
        json.WriteBoolean("pinned", one.IsPinned);
        if (one.Bound is { } bound)
            json.Object("claim", claim =>
            {
                claim.Figure("margin", bound.Lower);
                claim.Figure("confidence", bound.Confidence);
                claim.Figure("further-units", one.FurtherUnits ?? double.NaN);
            });
    }
}
