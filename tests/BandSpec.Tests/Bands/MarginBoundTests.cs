using BandSpec.Core.Bands;
using BandSpec.Core.Numerics;
using BandSpec.Core.Requirements;
using BandSpec.Tests.Numerics;
using Xunit;

namespace BandSpec.Tests.Bands;

/// <summary>The lower bound on the margin, first where it has to be a published tolerance factor.</summary>
public sealed class MarginBoundTests
{
    /// <summary>
    /// With the mean of n readings and their standard deviation, the index whose estimate is a third of the one-sided factor k1(n, content) has
    /// the bound z_content/3. Factors of ISO 16269-6 as in the check values, section 3, recomputed with SciPy.
    /// </summary>
    [Theory]
    [InlineData(5, 0.95, 4.202681)]
    [InlineData(10, 0.95, 2.910963)]
    [InlineData(10, 0.99, 3.981118)]
    [InlineData(20, 0.99, 3.295157)]
    [InlineData(30, 0.9973, 3.634642)]
    [InlineData(100, 0.99, 2.683958)]
    public void One_term_reduces_to_the_one_sided_tolerance_factor(int n, double content, double factor)
    {
        const double Sigma = 0.7;
        double bound = NodeAccuracy.Limit(factor / 3, Sigma, Sigma * Sigma / n, Sigma * Sigma * Math.Sqrt(2.0 / (n - 1)), 0.95);
        Close.Relative(NormalDistribution.Quantile(content) / 3, bound, 2e-6);
    }

    /// <summary>
    /// The whole way: a family with thermal hysteresis and nothing else, known from ten units, whose design band is exactly mean plus
    /// k1·s: the bound says that the criterion is just met.
    /// </summary>
    [Fact]
    public void A_family_with_one_term_is_claimed_as_its_tolerance_interval()
    {
        const int Units = 10;
        const double Mean = 0.2, Sigma = 0.1, Content = 0.99;
        double limit = Mean + (ToleranceFactors.OneSided(Units, Content, 0.95) * Sigma);
        double criterion = NormalDistribution.Quantile(Content) / 3;
        Application application = OneTerm(Mean, Sigma, limit, criterion, Units);
        CompensationPlan plan = PlanOf(application);
        MarginBound bound = MarginBound.Of(application, plan, BandMap.Of(application, plan), 0.95)!;
        Close.Relative(1, bound.Lower, 1e-6);
    }

    [Fact]
    public void A_bound_lies_below_the_margin_and_rises_to_it_with_the_sample()
    {
        Application application = Given.Application(platform: Given.Platform with { Sample = SampleOf(Given.Platform, 48, 3) });
        CompensationPlan plan = PlanOf(application);
        BandMap bands = BandMap.Of(application, plan);
        double small = MarginBound.Of(application, plan, bands, 0.95)!.Lower;
        Application larger = application.With(application.Platform with { Sample = application.Platform.Sample!.With(480_000) });
        double large = MarginBound.Of(larger, plan, bands, 0.95)!.Lower;
        Assert.True(small < large, $"{small} below {large}");
        Assert.InRange(large, 0.98 * bands.Margin, bands.Margin);
    }

    [Fact]
    public void Without_a_sample_there_is_no_bound()
    {
        Application application = Given.Application();
        CompensationPlan plan = PlanOf(application);
        Assert.Null(MarginBound.Of(application, plan, BandMap.Of(application, plan), 0.95));
        Assert.Null(MarginBound.FurtherUnits(application, plan, BandMap.Of(application, plan), 0.95));
    }

    [Fact]
    public void Further_units_are_as_many_as_needed_and_not_one_more()
    {
        const double Mean = 0.2, Sigma = 0.1;
        double limit = Mean + (ToleranceFactors.OneSided(25, 0.99, 0.95) * Sigma);
        Application application = OneTerm(Mean, Sigma, limit, NormalDistribution.Quantile(0.99) / 3, 10);
        CompensationPlan plan = PlanOf(application);
        int further = MarginBound.FurtherUnits(application, plan, BandMap.Of(application, plan), 0.95)!.Value;

        // 25 units suffice exactly; the errors of a larger sample are scaled with n, not with n - 1, so one or two may differ.
        Assert.InRange(10 + further, 23, 27);
        double At(int more) => MarginBound.Of(
            application.With(application.Platform with { Sample = application.Platform.Sample!.With(more) }), plan,
            BandMap.Of(application, plan), 0.95)!.Lower;
        Assert.True(At(further) >= 1);
        Assert.True(At(further - 1) < 1);
    }

    /// <summary>A bound comes as near to its margin as the sample allows, however large that is: here with 40 million units.</summary>
    [Fact]
    public void A_bound_has_no_floor_of_its_own()
    {
        Application application = OneTerm(0.2, 0.1, 0.5, 1, 40_000_000);
        CompensationPlan plan = PlanOf(application);
        BandMap bands = BandMap.Of(application, plan);
        double lower = MarginBound.Of(application, plan, bands, 0.95)!.Lower;
        // Cpk 1, n readings: 1 - z·√(1/(9n) + 1/(2n)), Bissell 1990.
        Assert.Equal(bands.Margin - (1.6448536 * Math.Sqrt(((1 / 9.0) + 0.5) / 40_000_000)), lower, 3e-4);
    }

    private static Application OneTerm(double mean, double sigma, double limit, double criterion, int units)
    {
        double variance = sigma * sigma;
        Platform platform = Given.Platform with
        {
            RawError = [new RawErrorCoefficient(new CoefficientName(PressureShape.Zero, 0), 0, 0, 0)],
            Correlations = [],
            PressureHysteresis = Given.Spread(0, 0),
            ThermalHysteresis = Given.Spread(mean, sigma),
            Repeatability = Given.P(0),
            Ageing = Given.Platform.Ageing with { Zero = Given.Spread(0, 0), Span = Given.Spread(0, 0) },
            Sample = new PlatformSample
            {
                Units = units, Lots = 1, Readings = units,
                Coefficients = [new CoefficientAccuracy(new CoefficientName(PressureShape.Zero, 0), 0, 0, [0])],
                ThermalHysteresis = new SpreadAccuracy(Given.P(sigma / Math.Sqrt(units)), variance * Math.Sqrt(2.0 / (units - 1))),
            },
        };
        Station station = Given.Station with { StandardZero = Given.P(0), StandardProportional = Given.P(0), ReadingNoise = Given.P(0) };
        Requirement requirement = Given.Requirement with
        {
            AllowedError = [new AllowedErrorRegion(Given.C(-20), Given.C(150), Given.P(limit), null, 0)],
            SafetyFactor = 1,
            Capability = new CapabilityTarget(criterion, criterion),
            FurtherTerms = [],
            HeldTerms = [],
            Output = Given.Requirement.Output with { Step = null, Resolution = null },
        };
        return Given.Application(requirement, platform, station);
    }

    private static PlatformSample SampleOf(Platform platform, int units, int lots) => new()
    {
        Units = units, Lots = lots, Readings = 40 * units,
        Coefficients = [.. platform.RawError.Select((c, j) => new CoefficientAccuracy(
            c.Name, c.Sigma * c.Sigma * Math.Sqrt(2.0 / (units - lots)), c.LotSigma * c.LotSigma * Math.Sqrt(2.0 / (lots - 1)),
            [.. Enumerable.Range(0, j + 1).Select(i => i == j ? (c.LotSigma * c.LotSigma / lots) + (c.Sigma * c.Sigma / units) : 0)]))],
    };

    private static CompensationPlan PlanOf(Application application)
    {
        double[] temperatures = [-20, 25, 70, 110, 150];
        return new CompensationPlan(
            [.. temperatures.Select(Given.C)], 3, 3,
            [.. from celsius in temperatures
                from x in celsius == 25 ? application.Station.PressurePoints.Reference : application.Station.PressurePoints.Others
                select new PlanPoint(Given.C(celsius), x)]);
    }
}
