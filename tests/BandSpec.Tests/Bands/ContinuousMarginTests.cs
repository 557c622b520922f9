using BandSpec.Core.Bands;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using CsCheck;
using Xunit;

namespace BandSpec.Tests.Bands;

/// <summary>The least margin over every place against the plain formulas on a dense lattice.</summary>
public sealed class ContinuousMarginTests
{
    private const int Lattice = 40;

    [Fact]
    public void It_is_the_margin_of_the_plain_formulas_at_its_place_and_no_place_of_a_lattice_is_below_it() => Gen.Select(
        Gen.Double[0.5, 3], Gen.Double[0.2, 3], Gen.Double[0, 0.03], Gen.Double[-30, 10], Gen.Double[-0.1, 0.1]).Sample(
        (safety, limit, ofReading, lower, drift) => Judge(ApplicationOf(1 + safety, limit, ofReading, lower, drift)), iter: 40);

    [Fact]
    public void It_is_found_for_a_band_that_added_errors_alone_overfill() =>
        Judge(ApplicationOf(3, 0.2, 0, 0, 0.2));

    [Fact]
    public void Without_scatter_it_is_unlimited()
    {
        Platform platform = Given.Platform with
        {
            RawError = [.. Given.Platform.RawError.Take(1).Select(c => c with { Sigma = 0, LotSigma = 0 })],
            Correlations = [],
            PressureHysteresis = Given.Spread(0.05, 0),
            ThermalHysteresis = Given.Spread(0.04, 0),
            Repeatability = Given.P(0),
            Ageing = Given.Platform.Ageing with { Zero = Given.Spread(0.02, 0), Span = Given.Spread(0, 0) },
        };
        Station station = Given.Station with { StandardZero = Given.P(0), StandardProportional = Given.P(0), ReadingNoise = Given.P(0), SoakGradient = Given.K(0) };
        Requirement requirement = Given.Requirement with { FurtherTerms = [], Output = Given.Requirement.Output with { Step = null, Resolution = null } };
        Assert.All(ContinuousMargin.AllOf(Given.Application(requirement, platform, station), PlanOf()), r => Assert.True(r.Margin >= 1e6));
    }

    private static void Judge(Application application)
    {
        BandFormulas formulas = BandFormulas.Of(application, PlanOf());
        foreach (ContinuousMargin found in ContinuousMargin.AllOf(application, PlanOf()))
        {
            BandNode worst = formulas.At(found.Worst.PressureFraction, found.Worst.Temperature, found.Region);
            Assert.Equal(worst.Margin, found.Margin, 1e-8 * Math.Abs(worst.Margin));
            Assert.All(LatticeOf(application, formulas, found.Region), m => Assert.True(m >= found.Margin - (2e-9 * Math.Abs(found.Margin))));
        }
    }

    private static IEnumerable<double> LatticeOf(Application application, BandFormulas formulas, int region)
    {
        AllowedErrorRegion allowance = application.Requirement.AllowedError[region];
        for (int i = 0; i <= Lattice; i++)
            for (int k = 0; k <= Lattice; k++)
            {
                double celsius = allowance.From.Celsius + ((allowance.To - allowance.From).Kelvin * k / Lattice);
                yield return formulas.At((double)i / Lattice, Temperature.FromCelsius(celsius), region).Margin;
            }
    }

    private static CompensationPlan PlanOf() => CompensationPlan.Of(
        [Given.C(-20), Given.C(55), Given.C(110), Given.C(150)], 2, 3, Given.C(25), Given.Station.PressurePoints);

    private static Application ApplicationOf(double safety, double limit, double ofReading, double lowerBar, double drift) => Given.Application(
        Given.Requirement with
        {
            SafetyFactor = safety,
            Pressure = new PressureRange(
                Pressure.From(lowerBar, PressureUnit.Bar), Pressure.From(25, PressureUnit.Bar), PressureReference.Differential),
            AllowedError =
            [
                new AllowedErrorRegion(Given.C(-20), Given.C(40), Given.P(1.6), null, ofReading),
                new AllowedErrorRegion(Given.C(40), Given.C(150), Given.P(limit), Given.P(1.4), ofReading / 2),
            ],
        },
        Given.Platform with { Ageing = Given.Platform.Ageing with { Zero = Given.Spread(drift, 0.02), Span = Given.Spread(-2 * drift, 0.01) } });
}
