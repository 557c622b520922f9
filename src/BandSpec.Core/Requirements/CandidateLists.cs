using BandSpec.Core.Quantities;

namespace BandSpec.Core.Requirements;

/// <summary>Counts the lists of candidate temperatures that a requirement lets be considered, without making them.</summary>
internal sealed class CandidateLists
{
    private readonly IReadOnlyList<Temperature> candidates;
    private readonly CompensationScope scope;
    private readonly OperatingTemperature range;

    public CandidateLists(CompensationScope scope, OperatingTemperature range)
    {
        (this.scope, this.range) = (scope, range);
        candidates = CandidateTemperatures.Of(scope, range);
        Longest = FindLongest();
    }

    /// <summary>
    /// The most temperatures that a list can have. The two ends of the range are always candidates and within reach, so that the longest list
    /// begins at one, goes on by the nearest candidate far enough away, and can end at the other.
    /// </summary>
    public int Longest { get; }

    /// <summary>How many lists there are of the numbers of temperatures asked for; a floating number, since there may be very many.</summary>
    public double Count()
    {
        double sum = 0;
        double[] ways = [.. candidates.Select(c => (c - range.Lower).Kelvin <= Reach ? 1.0 : 0.0)];
        for (int length = 1; length <= scope.MostTemperatures; length++)
        {
            if (length >= scope.FewestTemperatures)
                sum += ways.Where((_, i) => (range.Upper - candidates[i]).Kelvin <= Reach).Sum();
            ways = Extend(ways);
        }
        return sum;
    }

    private double Reach => scope.Reach.Kelvin + 1e-9;

    private double[] Extend(double[] ways)
    {
        double[] next = new double[ways.Length];
        double sum = 0;
        for (int hotter = 0, colder = 0; hotter < ways.Length; hotter++)
        {
            while (colder < hotter && IsApart(colder, hotter))
                sum += ways[colder++];
            next[hotter] = sum;
        }
        return next;
    }

    private int FindLongest()
    {
        int longest = 1;
        for (int next = 0, last = 0; next < candidates.Count; next++)
        {
            if (!IsApart(last, next))
                continue;
            (last, longest) = (next, longest + 1);
        }
        return longest;
    }

    private bool IsApart(int colder, int hotter) =>
        hotter > colder && (candidates[hotter] - candidates[colder]).Kelvin >= scope.Separation.Kelvin - 1e-9;
}
