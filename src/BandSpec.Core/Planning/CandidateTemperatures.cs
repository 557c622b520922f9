using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.Planning;

/// <summary>The temperatures that a plan may use.</summary>
internal static class CandidateTemperatures
{
    /// <summary>Multiples of the candidate step in the operating range, its two ends and the reference temperature, rising, each once.</summary>
    public static IReadOnlyList<Temperature> Of(Requirement requirement)
    {
        OperatingTemperature range = requirement.Temperature;
        double step = requirement.Compensation.CandidateStep.Kelvin;
        int first = (int)Math.Ceiling(range.Lower.Celsius / step), last = (int)Math.Floor(range.Upper.Celsius / step);
        IEnumerable<Temperature> multiples = Enumerable.Range(first, Math.Max(0, last - first + 1)).Select(k => Temperature.FromCelsius(k * step));
        return [.. multiples.Append(range.Lower).Append(range.Upper).Append(range.Reference).Distinct().Order()];
    }
}
