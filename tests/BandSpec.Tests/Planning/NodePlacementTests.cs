using BandSpec.Core.Bands;
using BandSpec.Core.Planning;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using Xunit;

namespace BandSpec.Tests.Planning;

/// <summary>
/// Where the real search puts plan temperatures when the best places are known from approximation theory. The operating range −100 … 100 °C
/// stands for −1 … 1: reduced temperature τ = T/100 K.
/// </summary>
public sealed class NodePlacementTests
{
    /// <summary>
    /// A raw error of one coefficient of degree n, no noise, n temperatures, a uniform allowance: the least largest residue is 2^(1−n), at the
    /// zeros of the Chebyshev polynomial, cos((2k − 1)π/2n) (any text on approximation theory; check-values section 7, recomputed there).
    /// </summary>
    [Theory]
    [InlineData(2)]
    [InlineData(3)]
    [InlineData(4)]
    public void Without_noise_they_are_the_zeros_of_a_chebyshev_polynomial(int n)
    {
        double step = n < 4 ? 2 : 4;
        Application application = ApplicationOf(n, highestMean: 1, noise: 0, step, reach: n == 2 ? 40 : 20);
        PlanChoice choice = PlanChoosing.Choose(application, null, default);
        double[] zeros = [.. Enumerable.Range(1, n).Select(k => -Math.Cos(((2 * k) - 1) * Math.PI / (2 * n)))];
        Assert.Equal(zeros, Places(choice), (a, b) => Math.Abs(a - b) <= 1.01 * step / 100);
        double largest = BandMap.Of(application, choice.Plan, choice.AddedNodes).Nodes.Max(b => Math.Abs(b.Mean.Percent));
        Assert.InRange(largest, Math.Pow(2, 1 - n), Math.Pow(2, 1 - n) * 1.15);
    }

    /// <summary>
    /// Noise alone, n temperatures, degree n − 1: the least largest variance is that of a single reading, at the Gauss-Lobatto-Legendre nodes
    /// (Guest 1958, Ann. Math. Stat. 29, 294-299; Hoel 1958, ibid. 1134-1145: citations from memory, not found; nodes and variances recomputed
    /// in check-values section 7).
    /// </summary>
    [Theory]
    [InlineData(3, new[] { -1.0, 0, 1 })]
    [InlineData(4, new[] { -1, -0.44721359549995793, 0.44721359549995793, 1 })]
    [InlineData(5, new[] { -1, -0.65465367070797714, 0, 0.65465367070797714, 1 })]
    public void With_noise_alone_they_are_the_gauss_lobatto_legendre_nodes(int n, double[] nodes)
    {
        double step = n < 5 ? 2 : 4;
        Application application = ApplicationOf(n, highestMean: 0, noise: 0.01, step, reach: 10);
        PlanChoice choice = PlanChoosing.Choose(application, null, default);
        Assert.Equal(nodes, Places(choice), (a, b) => Math.Abs(a - b) <= 1.01 * step / 100);
        double largest = BandMap.Of(application, choice.Plan, choice.AddedNodes).Nodes
            .Max(b => b.Terms.First(t => t.Term.Key == "carried-noise").SigmaSample.Percent);
        Assert.InRange(largest, 0.01, 0.01 * 1.01);
    }

    private static double[] Places(PlanChoice choice) => [.. choice.Plan.Temperatures.Select(t => t.Celsius / 100)];

    /// <summary>
    /// A family whose zero has one coefficient of degree n, read at both terminals. Zero and span also scatter by 20 %FS with degree n − 1: a
    /// correction of that degree follows it and nothing is left, one of a lower degree is out of the question.
    /// </summary>
    private static Application ApplicationOf(int n, double highestMean, double noise, double step, double reach)
    {
        Platform platform = Given.Platform with
        {
            Temperature = new OperatingTemperature(Given.C(-100), Given.C(100), Given.C(0)),
            RawError =
            [
                new RawErrorCoefficient(new CoefficientName(PressureShape.Zero, n), highestMean, 0, 0),
                new RawErrorCoefficient(new CoefficientName(PressureShape.Zero, n - 1), 0, 20, 0),
                new RawErrorCoefficient(new CoefficientName(PressureShape.Span, n - 1), 0, 20, 0),
            ],
            Correlations = [],
            ZeroDegree = n - 1,
            SpanDegree = n - 1,
            PressureHysteresis = Given.Spread(0, 0),
            ThermalHysteresis = Given.Spread(0, 0),
            Repeatability = Given.P(0),
            Ageing = Given.Platform.Ageing with { Zero = Given.Spread(0, 0), Span = Given.Spread(0, 0) },
        };
        Station station = Given.Station with
        {
            ReadingNoise = Given.P(noise), ReadingsAveraged = 1, SoakGradient = Given.K(0),
            StandardZero = Given.P(0), StandardProportional = Given.P(0), PressurePoints = new PressureLists([0, 1], [0, 1]),
        };
        return Given.Application(
            Given.Requirement with
            {
                SafetyFactor = 1,
                HeldTerms = [],
                FurtherTerms = [new FurtherTerm("Floor", Given.P(0), Given.P(0.001), FurtherTermShape.Constant)],
                Output = Given.Requirement.Output with { Step = null, Resolution = null },
                Temperature = platform.Temperature,
                Profile = [new DwellBin(Given.C(-100), Given.C(100), Duration.FromHours(1000))],
                AllowedError = [new AllowedErrorRegion(Given.C(-100), Given.C(100), Given.P(2), null, 0)],
                Compensation = Given.Requirement.Compensation with
                {
                    CandidateStep = Given.K(step), FewestTemperatures = n, MostTemperatures = n, Separation = Given.K(20), Reach = Given.K(reach),
                    Objective = PlanObjective.MostMargin,
                },
            },
            platform, station);
    }
}
