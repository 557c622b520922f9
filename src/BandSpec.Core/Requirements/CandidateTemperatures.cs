using BandSpec.Core.Quantities;

namespace BandSpec.Core.Requirements;

/// <summary>The temperatures that a plan may use.</summary>
internal static class CandidateTemperatures
{
    /// <summary>Multiples of the candidate step in the operating range, its two ends and the reference temperature, rising, each once.</summary>
    public static IReadOnlyList<Temperature> Of(CompensationScope scope, OperatingTemperature range)
    {
        double step = scope.CandidateStep.Kelvin;
        int first = (int)Math.Ceiling(range.Lower.Celsius / step), last = (int)Math.Floor(range.Upper.Celsius / step);
        IEnumerable<Temperature> multiples = Enumerable.Range(first, Math.Max(0, last - first + 1)).Select(k => Temperature.FromCelsius(k * step));
        return [.. multiples.Append(range.Lower).Append(range.Upper).Append(range.Reference).Distinct().Order()];
    }
}
