namespace BandSpec.Core.Planning;

/// <summary>A plan that is still in the running, with its scores.</summary>
/// <param name="List">Indices of its candidate temperatures.</param>
/// <param name="Zero">Degree of the zero correction.</param>
/// <param name="Span">Degree of the span correction.</param>
/// <param name="Margin">Its score by <see cref="MarginScore"/>.</param>
/// <param name="Rms">Its score by <see cref="RmsScore"/>.</param>
internal sealed record Contender(int[] List, int Zero, int Span, double Margin, double Rms);

/// <summary>
/// Decides between plans: largest margin or smallest rms first, and on a tie within 10⁻⁹ relative the larger margin, then the smaller rms,
/// then the smaller temperature list, then the smaller degrees. A tie within a tolerance is not transitive, so plans are not compared in
/// pairs: each stage finds the best value of all that are left and keeps all within the tolerance of it. That does not depend on the order
/// in which plans come.
/// </summary>
internal static class Contest
{
    private const double Tie = 1e-9;

    /// <summary>The lowest margin that ties with <paramref name="best"/>.</summary>
    public static double TieBelow(double best) => Below(best, Tie);

    /// <summary>The highest rms that ties with <paramref name="best"/>.</summary>
    public static double TieAbove(double best) => Above(best, Tie);

    /// <summary>Less than <paramref name="best"/> by a fraction of it.</summary>
    public static double Below(double best, double fraction) => double.IsInfinity(best) ? best : best - (fraction * Math.Abs(best));

    /// <summary>More than <paramref name="best"/> by a fraction of it.</summary>
    public static double Above(double best, double fraction) => double.IsInfinity(best) ? best : best + (fraction * Math.Abs(best));

    /// <summary>The winner, or nothing when there is no contender.</summary>
    /// <param name="contenders">All plans in the running.</param>
    /// <param name="rmsFirst">Whether the smallest rms comes before the largest margin.</param>
    public static Contender? Winner(IEnumerable<Contender> contenders, bool rmsFirst)
    {
        List<Contender> left = [.. contenders];
        if (left.Count == 0)
            return null;
        if (rmsFirst)
            KeepSmallestRms(left);
        KeepLargestMargin(left);
        KeepSmallestRms(left);
        left.Sort(ByListThenDegrees);
        return left[0];
    }

    /// <summary>Leaves only those that tie with the largest margin.</summary>
    public static void KeepLargestMargin(List<Contender> left)
    {
        double least = TieBelow(left.Max(c => c.Margin));
        left.RemoveAll(c => c.Margin < least);
    }

    /// <summary>Leaves only those that tie with the smallest rms.</summary>
    public static void KeepSmallestRms(List<Contender> left)
    {
        double most = TieAbove(left.Min(c => c.Rms));
        left.RemoveAll(c => c.Rms > most);
    }

    private static int ByListThenDegrees(Contender a, Contender b)
    {
        int order = a.List.AsSpan().SequenceCompareTo(b.List);
        if (order == 0)
            order = a.Zero.CompareTo(b.Zero);
        return order != 0 ? order : a.Span.CompareTo(b.Span);
    }
}
