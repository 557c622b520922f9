using BandSpec.Core.Numerics.RareEvents;
using Xunit;

namespace BandSpec.Tests.Numerics.RareEvents;

/// <summary>
/// The estimator of Owen, Maximov and Chertkov (2019). Exact values: polygon family, μ = (J/π)∫₀^{π/J} exp(−τ²/(2cos²θ))dθ, and two
/// correlated events by the bivariate normal law; recomputed with mpmath and SciPy. The form of the estimator is from memory of the paper, its
/// variance bounds were found in its abstract. Estimates have to lie within 4 standard errors, seeds are fixed.
/// </summary>
public sealed class UnionProbabilityTests
{
    [Theory]
    [InlineData(4, 2, 0.088930253778079)]
    [InlineData(4, 3, 0.0053923032277372)]
    [InlineData(4, 4, 0.00012668095506224)]
    [InlineData(100, 3, 0.011092565743074)]
    [InlineData(360, 6, 1.5223023418061e-8)]
    public void The_polygon_family_has_its_exact_probability(int sides, double distance, double exact)
    {
        Estimate found = Plain(Polygon(sides, distance), 0.002);
        Assert.InRange((found.Value - exact) / found.StandardError, -4, 4);
        Assert.InRange(found.RelativeError, 0, 0.002);
    }

    // CV·√n ≤ √(μ̄/μ − 1) and ≤ √(J + 1/J − 2)/2 (abstract of the paper; found). The empirical value has its own scatter, a few percent here.
    [Theory]
    [InlineData(4, 2, 0.15257703, 0.75)]
    [InlineData(100, 3, 3.3420643, 4.95)]
    [InlineData(360, 6, 4.7255909, 9.4604807)]
    public void The_variance_stays_within_both_bounds(int sides, double distance, double byTotal, double byCount)
    {
        Estimate found = Plain(Polygon(sides, distance), 0.002);
        double scatter = found.RelativeError * Math.Sqrt(found.Draws);
        Assert.InRange(scatter, 0, Math.Min(byTotal, byCount));
    }

    [Theory]
    [InlineData(3, 3, 0.5, 0.002617906401428, 1.038368e-7)]
    [InlineData(4, 4, 0.9, 5.27982265422868e-5, 2.227684e-10)]
    [InlineData(4, 4, 0.999, 3.40559569756402e-5, 6.984002e-11)]
    [InlineData(3, 3, 0, 0.002697973838564, null)]
    public void Two_correlated_events_have_their_exact_probability_and_variance(double a, double b, double correlation, double exact, double? variance)
    {
        HalfSpaces events = new(2, 0);
        events.Add([1, 0], a);
        events.Add([correlation, Math.Sqrt(1 - (correlation * correlation))], b);
        Estimate found = Plain(events, 0.0005);
        Assert.InRange((found.Value - exact) / found.StandardError, -4, 4);
        if (variance is { } expected)
            Assert.Equal(1, found.StandardError * found.StandardError * found.Draws / expected, 0.05);
    }

    [Fact]
    public void An_own_number_counts_like_a_dimension()
    {
        HalfSpaces shared = new(3, 0);
        shared.Add([0.6, 0.8, 0], 3.5);
        shared.Add([0.6, 0, 0.8], 3.2);
        HalfSpaces own = new(1, 2);
        own.Add([0.6], 3.5, 0.8, 0);
        own.Add([0.6], 3.2, 0.8, 1);
        Estimate first = Plain(shared, 0.001);
        Estimate second = Plain(own, 0.001);
        Assert.InRange((first.Value - second.Value) / Math.Sqrt(2 * first.StandardError * first.StandardError), -4, 4);
    }

    [Fact]
    public void One_event_is_met_exactly()
    {
        HalfSpaces one = new(2, 0);
        one.Add([0.6, 0.8], 7);
        Estimate found = Plain(one, 0.01);
        Assert.Equal(1, found.Value / 1.279812543885835e-12, 1e-13); // Q(7), mpmath 1.2.1, 30 digits; recomputed
        Assert.Equal(0, found.StandardError / found.Value, 1e-7); // what rounding leaves of a variance of zero
    }

    [Fact]
    public void No_event_has_no_probability() => Assert.Equal(0, Plain(new HalfSpaces(2, 0), 0.01).Value);

    // P(x > 4, |x + 0.5·z| ≤ 3): the reading has standard deviation 0.5 about x, so that hardly any x > 4 is accepted. Exact value by SciPy's
    // quad of φ(x)·[Φ((3−x)/0.5) − Φ((−3−x)/0.5)] over x > 4; recomputed.
    [Theory]
    [InlineData(new[] { 0.0 })]
    [InlineData(new[] { 0.0, 1.0 })]
    [InlineData(new[] { 0.0, 1.0, 2.5 })]
    public void Acceptance_is_counted_in_and_a_tilt_changes_nothing_but_the_scatter(double[] strengths)
    {
        HalfSpaces events = new(2, 0);
        events.Add([1, 0], 4);
        Readings readings = new(2, 0);
        readings.Add([1, 0], new Reading(0, -3, 3, 0.5, 0));
        Estimate found = UnionProbability.Of(events, readings, strengths, 1, 0.01, 10_000_000);
        Assert.InRange((found.Value - 3.301859595639509e-7) / found.StandardError, -4, 4);
    }

    [Fact]
    public void The_estimate_does_not_depend_on_how_work_was_shared() =>
        Assert.Equal(Plain(Polygon(100, 3), 0.01), Plain(Polygon(100, 3), 0.01));

    private static Estimate Plain(HalfSpaces events, double relativeError) =>
        UnionProbability.Of(events, Readings.None(events.Dimensions), [0], 20261124, relativeError, 20_000_000);

    private static HalfSpaces Polygon(int sides, double distance)
    {
        HalfSpaces events = new(2, 0);
        for (int j = 0; j < sides; j++)
        {
            (double sine, double cosine) = Math.SinCos(2 * Math.PI * j / sides);
            events.Add([cosine, sine], distance);
        }
        return events;
    }
}
