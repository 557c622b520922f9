namespace BandSpec.Core.Allocating;

/// <summary>
/// Lexicographic max-min by progressive filling (Bertsekas &amp; Gallagher, Data Networks, section 6.5.2): all multipliers rise together until
/// a budget is full, those that act in it stay where they are, the others go on.
/// </summary>
internal static class ProgressiveFilling
{
    /// <summary>Budgets that fill at levels this close, relative, count as full together.</summary>
    private const double SameLevel = 1e-12;

    /// <summary>The multipliers.</summary>
    /// <param name="budgets">Every inequality that has to hold.</param>
    /// <param name="held">For each slot its multiplier if it is held, otherwise <see langword="null"/>.</param>
    /// <returns>One multiplier a slot, at least 0.</returns>
    public static double[] Fill(IReadOnlyList<Budget> budgets, IReadOnlyList<double?> held)
    {
        double?[] multipliers = [.. held];
        while (multipliers.Any(m => m is null))
        {
            double[] levels = [.. budgets.Select(b => LevelOf(b, multipliers))];
            double level = levels.Min();
            double full = level * (1 + SameLevel);
            for (int b = 0; b < budgets.Count; b++)
                if (levels[b] <= full)
                    Freeze(budgets[b], multipliers, level);
        }

        return [.. multipliers.Select(m => m!.Value)];
    }

    private static void Freeze(Budget budget, double?[] multipliers, double level)
    {
        foreach ((int slot, _) in budget.Variances)
            multipliers[slot] ??= level;
    }

    /// <summary>
    /// The level at which a budget is full: the root of <c>aλ² + bλ + c = 0</c>, <c>a</c> from the rising slots, <c>b</c> from pairs of a rising
    /// and a settled one, <c>c</c> from the settled ones, the fixed terms and the room. Infinite when no rising slot acts.
    /// </summary>
    private static double LevelOf(Budget budget, double?[] multipliers)
    {
        double a = 0, b = 0, c = budget.Fixed - budget.Room;
        foreach ((int slot, double variance) in budget.Variances)
            if (multipliers[slot] is { } m)
                c += m * m * variance;
            else
                a += variance;
        foreach ((int first, int second, double covariance) in budget.Covariances)
            switch (multipliers[first], multipliers[second])
            {
                case ({ } m, { } n):
                    c += 2 * m * n * covariance;
                    break;
                case (null, null):
                    a += 2 * covariance;
                    break;
                case (var m, var n):
                    b += 2 * (m ?? n)!.Value * covariance;
                    break;
            }

        if (a == 0)
            return double.PositiveInfinity;
        return budget.Room < 0 || c >= 0 ? 0 : 2 * -c / (b + Math.Sqrt((b * b) - (4 * a * c)));
    }
}
