using BandSpec.Core.Allocating;
using BandSpec.Core.Bands;
using BandSpec.Core.Requirements;
using BandSpec.Tests.Numerics;
using CsCheck;
using Xunit;

namespace BandSpec.Tests.Allocating;

/// <summary>The allocation is lexicographic max-min: checked by a naive filling, by disturbance, and against the margin.</summary>
public sealed class AllocationTests
{
    private static readonly CompensationPlan Plan = CompensationPlan.Of(
        [Given.C(-20), Given.C(25), Given.C(90), Given.C(150)], 3, 3, Given.C(25), Given.Station.PressurePoints);

    /// <summary>Keshav, An Engineering Approach to Computer Networking (1997), pp. 215-217: demands 2, 2.6, 4, 5 on a capacity of 10.</summary>
    [Fact]
    public void Fills_like_the_textbook_when_one_resource_is_shared()
    {
        // A demand is a budget of its own; the shared capacity counts squares, so demands and capacity are squared shares.
        double[] demands = [2, 2.6, 4, 5];
        List<Budget> budgets =
        [
            new Budget(10, 0, [.. demands.Select((_, i) => (i, 1.0))], []),
            .. demands.Select((d, i) => new Budget(d, 0, [(i, 1.0)], [])),
        ];
        double[] shares = [.. ProgressiveFilling.Fill(budgets, new double?[4]).Select(m => m * m)];
        Assert.Equal([2, 2.6, 2.7, 2.7], shares.Select(s => Math.Round(s, 12)));
    }

    /// <summary>
    /// Bertsekas and Gallagher, Data Networks (2nd ed.), section 6.5.2, five sessions on links of capacity 1: sessions 2, 3, 5 get 1/3, session 1
    /// gets 2/3, session 4 gets 1 (values from memory; recomputed by a sequential linear programme, check-values section 13).
    /// </summary>
    [Fact]
    public void Fills_like_the_textbook_on_a_network()
    {
        int[][] links = [[1, 2, 4], [0, 2], [3]];
        List<Budget> budgets = [.. links.Select(l => new Budget(1, 0, [.. l.Select(s => (s, 1.0))], []))];
        double[] shares = [.. ProgressiveFilling.Fill(budgets, new double?[5]).Select(m => m * m)];
        double[] expected = [2.0 / 3, 1.0 / 3, 1.0 / 3, 1, 1.0 / 3];
        for (int i = 0; i < 5; i++)
            Assert.Equal(expected[i], shares[i], 1e-12);
    }

    [Fact]
    public void Equals_a_naive_filling_in_small_steps() => RandomBudgets.Sample(
        budgets =>
        {
            double[] exact = ProgressiveFilling.Fill(budgets.List, budgets.Held), naive = NaiveFilling(budgets.List, budgets.Held);
            return exact.Zip(naive, (e, n) => Math.Abs(e - n) <= Allowed * Math.Max(1, e)).All(same => same);
        },
        iter: 200);

    [Fact]
    public void No_multiplier_can_grow_unless_one_that_is_no_larger_shrinks() => RandomBudgets.Sample(
        budgets =>
        {
            double[] m = ProgressiveFilling.Fill(budgets.List, budgets.Held);
            return Enumerable.Range(0, m.Length).Where(i => budgets.Held[i] is null).All(i => HasBottleneck(budgets.List, budgets.Held, m, i));
        },
        iter: 500);

    [Fact]
    public void The_first_level_is_the_margin_when_the_fixed_terms_are_scaled_too()
    {
        // No held terms, no covariance to be ignored, nothing fixed: no standard, no resolution.
        Platform platform = Given.Platform with { Correlations = [] };
        Station station = Given.Station with { StandardZero = Given.P(0), StandardProportional = Given.P(0) };
        Requirement requirement = Given.Requirement with { HeldTerms = [], Output = Given.Requirement.Output with { Step = null, Resolution = null } };
        Application application = Given.Application(requirement, platform, station);
        BandMap bands = BandMap.Of(application, Plan);
        double smallest = Allocation.Of(application, Plan, bands).Terms.Min(t => t.Multiplier);
        Close.Relative(bands.Margin, smallest, 1e-9, "first level");
    }

    [Fact]
    public void A_held_term_keeps_the_customers_limit_and_the_others_what_is_left()
    {
        Application application = Given.Application();
        Allocation held = Allocation.Of(application, Plan, BandMap.Of(application, Plan));
        TermAllocation hysteresis = held.Terms.Single(t => t.Term.Key == "pressure-hysteresis");
        Assert.True(hysteresis.Held);
        Assert.Equal(0.15, hysteresis.Limit.Percent, 1e-12);
        // 0.15 = 0.05 + m·5.01·0.012, full width, sample criterion 3·1.67.
        Assert.Equal((0.15 - 0.05) / (3 * 1.67 * 0.012), hysteresis.Multiplier, 1e-12);
    }

    [Fact]
    public void What_was_allocated_fits_every_node()
    {
        Application application = Given.Application();
        BandMap bands = BandMap.Of(application, Plan);
        Multipliers multipliers = Multipliers.Of(Allocation.Of(application, Plan, bands));
        foreach (BandNode node in bands.Nodes)
        {
            double variance = node.Terms.Sum(t => Math.Pow(multipliers.Of(t.Term, node.Region) * t.SigmaSample.Percent, 2));
            Assert.True(node.Added.Percent + (3 * 1.67 * Math.Sqrt(variance)) <= node.Design.Percent * (1 + 1e-9));
        }
    }

    private const double Step = 2e-4;

    /// <summary>
    /// The naive filling stops each slot up to a step early, and what it left over lets later ones rise further: by up to
    /// (m·s²) early over (m·s²) late, at most ten for each of five others with the variances drawn here.
    /// </summary>
    private const double Allowed = 5 * 10 * Step;

    /// <summary>Raises all free multipliers together by small steps and stops each when one of its budgets would overflow.</summary>
    private static double[] NaiveFilling(IReadOnlyList<Budget> budgets, IReadOnlyList<double?> held)
    {
        double[] m = [.. held.Select(h => h ?? 0)];
        HashSet<int> rising = [.. Enumerable.Range(0, m.Length).Where(i => held[i] is null)];
        while (rising.Count > 0)
        {
            foreach (int i in rising)
                m[i] += Step;
            foreach (Budget full in budgets.Where(b => UseOf(b, m) > b.Room))
                foreach ((int slot, _) in full.Variances)
                    if (rising.Remove(slot))
                        m[slot] -= Step;
        }

        return m;
    }

    /// <summary>
    /// Bertsekas and Gallagher's certificate: an allocation is max-min exactly when every free slot has a full budget in which no rising slot
    /// has more than it.
    /// </summary>
    private static bool HasBottleneck(IReadOnlyList<Budget> budgets, IReadOnlyList<double?> held, double[] m, int slot) => budgets.Any(b =>
        b.Variances.Any(v => v.Slot == slot)
        && UseOf(b, m) >= b.Room * (1 - 1e-9)
        && b.Variances.Where(v => held[v.Slot] is null).All(v => m[v.Slot] <= m[slot] * (1 + 1e-9)));

    private static double UseOf(Budget b, double[] m) => b.Fixed
        + b.Variances.Sum(v => m[v.Slot] * m[v.Slot] * v.Variance)
        + b.Covariances.Sum(c => 2 * m[c.First] * m[c.Second] * c.Covariance);

    private static readonly Gen<(List<Budget> List, double?[] Held)> RandomBudgets =
        from slots in Gen.Int[2, 6]
        from budgets in Gen.Select(
            Gen.Double[0.5, 4], Gen.Double[0, 0.2], Gen.Double[0.1, 1].Array[slots], Gen.Bool.Array[slots], Gen.Double[-0.3, 0.3]).Array[1, 6]
        from heldFirst in Gen.Bool
        select (Build(slots, budgets), Enumerable.Range(0, slots).Select(i => heldFirst && i == 0 ? 0.3 : (double?)null).ToArray());

    /// <summary>Random budgets, and one over all slots so that none is without limit.</summary>
    private static List<Budget> Build(int slots, (double Room, double Fixed, double[] Variances, bool[] Acts, double Covariance)[] drawn) =>
    [
        .. drawn.Select(d =>
        {
            int[] acting = [.. Enumerable.Range(0, slots).Where(i => d.Acts[i])];
            bool pair = acting.Length >= 2 && d.Covariance > 0;
            double covariance = pair ? d.Covariance * Math.Sqrt(d.Variances[acting[0]] * d.Variances[acting[1]]) : 0;
            return new Budget(
                d.Room, d.Fixed, [.. acting.Select(i => (i, d.Variances[i]))], pair ? [(acting[0], acting[1], covariance)] : []);
        }),
        new Budget(30, 0, [.. Enumerable.Range(0, slots).Select(i => (i, 1.0))], []),
    ];
}
