using BandSpec.Core.Numerics;

namespace BandSpec.Core.LotJudging;

/// <summary>Whether values look normal (Anderson-Darling, 1986 form).</summary>
/// <param name="Statistic">A² adjusted for the number of values, to hold against 1.035.</param>
/// <param name="Probability">Chance of such a value or a larger one if the values are normal.</param>
/// <param name="Values">How many values were tested: all, or the bounded random sample.</param>
public sealed record Normality(double Statistic, double Probability, int Values)
{
    /// <summary>
    /// Below this probability values are called non-normal. Not 5 %: a specification has some thirty characteristics, each tested within and over
    /// lots, and at 5 % three of sixty normal ones would lose their proof.
    /// </summary>
    public const double Level = 0.01;

    /// <summary>Whether the normal formulas may be used.</summary>
    public bool IsPlausible => Probability >= Level;

    /// <summary>The test; null for fewer than eight values or values that are all equal.</summary>
    internal static Normality? Of(ReadOnlySpan<double> sorted) =>
        AndersonDarling.Of(Untied(sorted)) is { } test ? new(test.Adjusted, test.Probability, sorted.Length) : null;

    /// <summary>
    /// Values that are equal only because the output has steps are spread evenly over their step, the smallest gap between different values.
    /// Otherwise a thousand readings in steps of a fifth of their standard deviation would be called non-normal for the steps alone.
    /// </summary>
    internal static double[] Untied(ReadOnlySpan<double> sorted)
    {
        double step = double.PositiveInfinity;
        for (int i = 1; i < sorted.Length; i++)
            if (sorted[i] > sorted[i - 1])
                step = Math.Min(step, sorted[i] - sorted[i - 1]);
        double[] spread = sorted.ToArray();
        for (int first = 0, next; first < spread.Length; first = next)
        {
            for (next = first + 1; next < spread.Length && sorted[next] == sorted[first];)
                next++;
            for (int i = first; next - first > 1 && i < next && double.IsFinite(step); i++)
                spread[i] += step * ((i - first + 0.5) / (next - first) - 0.5);
        }

        return spread;
    }
}
