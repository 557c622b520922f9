using BandSpec.Core.Bands;
using BandSpec.Core.Requirements;
using Xunit;

namespace BandSpec.Tests.Bands;

/// <summary>
/// The closed form against 200,000 units made the naive way. Twenty means and twenty spreads are compared; each has to lie within 4.2
/// standard errors, which a right pair misses once in 900 such tests. The seed is fixed, so a pass stays a pass.
/// </summary>
public sealed class NaiveSamplingTests
{
    private const int Units = 200_000;
    private const double Limit = 4.2;

    private static readonly (double X, double Celsius)[] Places =
        [(0, -20), (1, -20), (0.5, 0), (0, 25), (0.3, 40), (1, 60), (0.7, 85), (0, 130), (0.5, 150), (1, 150)];

    [Theory]
    [InlineData(new[] { -20, 25, 90, 150 }, 3, 2, false)]
    [InlineData(new[] { -20, 25, 90, 150 }, 3, 2, true)]
    [InlineData(new[] { -10, 25, 70, 110, 150 }, 3, 3, true)]
    public void Means_and_spreads_of_units_made_one_by_one_are_those_of_the_closed_form(int[] celsius, int zero, int span, bool lots)
    {
        Application application = Given.Application();
        CompensationPlan plan = CompensationPlan.Of(
            [.. celsius.Select(t => Given.C(t))], zero, span, application.Requirement.Temperature.Reference, application.Station.PressurePoints);
        BandFormulas formulas = BandFormulas.Of(application, plan);
        BandNode[] nodes = [.. Places.Select(p => formulas.At(p.X, Given.C(p.Celsius), RegionAt(application, p.Celsius)))];
        double[] drifts = [.. Places.Select(p => formulas.DriftMean(p.X))];
        Figures[] found = Sample(application, plan, nodes, drifts, lots);

        for (int i = 0; i < Places.Length; i++)
        {
            double sigma = (lots ? nodes[i].SigmaLongRun : nodes[i].SigmaSample).Percent;
            Near($"left over at {Places[i]}", found[i].Residue, nodes[i].Mean.Percent, found[i].ResidueSpread / Math.Sqrt(Units));
            Near($"added at {Places[i]}", found[i].Whole, WorseEnd(nodes[i], drifts[i]), sigma / Math.Sqrt(Units));
            Near($"spread at {Places[i]}", found[i].Spread, sigma, sigma / Math.Sqrt(2.0 * Units));
        }
    }

    /// <summary>Whole errors are drawn at the end of life; where the new unit is the worse one the mean drift comes off again.</summary>
    private static double WorseEnd(BandNode node, double drift) =>
        Math.Abs(node.Mean.Percent) > Math.Abs(node.Mean.Percent + drift) ? node.Added.Percent + (Math.Sign(node.Mean.Percent) * drift) : node.Added.Percent;

    private static Figures[] Sample(Application application, CompensationPlan plan, BandNode[] nodes, double[] drifts, bool lots)
    {
        NaiveSampling sampling = new(application.Requirement, application.Platform, application.Station, plan, 20261124);
        double[] sides = [.. nodes.Zip(drifts, (n, d) =>
            Math.Abs(n.Mean.Percent) > Math.Abs(n.Mean.Percent + d) ? Side(n.Mean.Percent) : Side(n.Mean.Percent + d))];
        double[,] sums = new double[nodes.Length, 4];
        for (int unit = 0; unit < Units; unit++)
        {
            (double Residue, double Whole)[] errors = sampling.Unit(Places, sides, lots);
            for (int i = 0; i < errors.Length; i++)
            {
                (double residue, double whole) = (errors[i].Residue, sides[i] * errors[i].Whole);
                sums[i, 0] += residue;
                sums[i, 1] += residue * residue;
                sums[i, 2] += whole;
                sums[i, 3] += whole * whole;
            }
        }
        return [.. nodes.Select((_, i) => new Figures(
            sums[i, 0] / Units, SpreadOf(sums[i, 0], sums[i, 1]), sums[i, 2] / Units, SpreadOf(sums[i, 2], sums[i, 3])))];
    }

    private static double Side(double value) => value < 0 ? -1 : 1;

    private static double SpreadOf(double sum, double squares) => Math.Sqrt((squares - (sum * sum / Units)) / (Units - 1));

    private static int RegionAt(Application application, double celsius) =>
        Enumerable.Range(0, application.Requirement.AllowedError.Count).First(r => celsius <= application.Requirement.AllowedError[r].To.Celsius);

    private static void Near(string what, double found, double expected, double standardError) =>
        Assert.True(
            Math.Abs(found - expected) <= Limit * standardError,
            $"{what}: {found:G6} sampled, {expected:G6} in closed form, {(found - expected) / standardError:F1} standard errors apart");

    private sealed record Figures(double Residue, double ResidueSpread, double Whole, double Spread);
}
