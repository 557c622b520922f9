using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.Bands;

/// <summary>The places at which a band is designed: eleven pressures at each design temperature of each region.</summary>
internal static class DesignNodes
{
    private const double LargestStep = 5;

    /// <summary>The pressure fractions <c>0, 0.1 … 1</c>.</summary>
    public static IReadOnlyList<double> Fractions { get; } = [.. Enumerable.Range(0, 11).Select(i => i / 10.0)];

    /// <summary>A region's ends and equal steps of at most 5 K between them, cold to hot; both ends belong to the region.</summary>
    public static IEnumerable<Temperature> TemperaturesOf(AllowedErrorRegion region)
    {
        double from = region.From.Celsius, to = region.To.Celsius;
        int steps = StepsBetween(from, to);
        return Enumerable.Range(0, steps + 1).Select(i => Temperature.FromCelsius(Along(from, to, i, steps)));
    }

    /// <summary>How many equal steps of at most 5 K there are between two temperatures; at least one.</summary>
    public static int StepsBetween(double from, double to) => Math.Max(1, (int)Math.Ceiling((to - from) / LargestStep));

    /// <summary>The end of a step, the last one met exactly.</summary>
    public static double Along(double from, double to, int step, int steps) => from + ((to - from) * step / steps);
}
