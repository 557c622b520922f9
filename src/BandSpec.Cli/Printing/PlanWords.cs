using System.Globalization;
using BandSpec.Core.Requirements;

namespace BandSpec.Cli.Printing;

/// <summary>A compensation plan in words.</summary>
internal static class PlanWords
{
    /// <summary>Its temperatures, such as <c>-15, 60, 145</c>.</summary>
    public static string Temperatures(CompensationPlan plan) =>
        string.Join(", ", plan.Temperatures.Select(temperature => temperature.Celsius.ToString(CultureInfo.InvariantCulture)));

    /// <summary>As a requirement pins it.</summary>
    public static string AsKeys(CompensationPlan plan) =>
        $"`plan: [{string.Join(", ", plan.Temperatures)}], zero-degree: {plan.ZeroDegree}, span-degree: {plan.SpanDegree}`";
}
