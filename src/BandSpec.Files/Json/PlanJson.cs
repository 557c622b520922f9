using System.Text.Json;
using BandSpec.Core.Requirements;

namespace BandSpec.Files.Json;

/// <summary>The members that say which plan is meant.</summary>
internal static class PlanJson
{
    /// <summary>Writes <c>temperatures</c> in °C, <c>zero-degree</c> and <c>span-degree</c>.</summary>
    internal static void PlanMembers(this Utf8JsonWriter json, CompensationPlan plan)
    {
        json.Figures("temperatures", plan.Temperatures.Select(temperature => temperature.Celsius));
        json.WriteNumber("zero-degree", plan.ZeroDegree);
        json.WriteNumber("span-degree", plan.SpanDegree);
    }
}
