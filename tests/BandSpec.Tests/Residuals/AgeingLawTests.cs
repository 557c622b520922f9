using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using BandSpec.Tests.Numerics;
using Xunit;

namespace BandSpec.Tests.Residuals;

/// <summary>
/// Arrhenius' acceleration factor. Figures: check-values section 11, recomputed with mpmath from Boltzmann's constant and the elementary
/// charge (exact SI values, CODATA 2018), 0 °C = 273.15 K.
/// </summary>
public sealed class AgeingLawTests
{
    [Theory]
    [InlineData(0.3, 55, 125, 6.45727907196)]
    [InlineData(0.3, 25, 125, 18.7781610722)]
    [InlineData(0.3, 85, 125, 2.655292825)]
    [InlineData(0.3, 40, 85, 4.04236474)]
    [InlineData(0.5, 55, 125, 22.3914693699)]
    [InlineData(0.5, 25, 125, 132.664614669)]
    [InlineData(0.5, 85, 125, 5.091597172)]
    [InlineData(0.5, 40, 85, 10.25791655)]
    [InlineData(0.7, 55, 125, 77.64538204961)]
    [InlineData(0.7, 25, 125, 937.253648944)]
    [InlineData(0.7, 85, 125, 9.763277903)]
    [InlineData(0.7, 40, 85, 26.03051896)]
    [InlineData(0.8, 55, 125, 144.587966553)]
    [InlineData(0.8, 25, 125, 2491.19750285)]
    [InlineData(0.8, 85, 125, 13.51968144)]
    [InlineData(0.8, 40, 85, 41.46624018)]
    [InlineData(1.0, 55, 125, 501.377900543)]
    [InlineData(1.0, 25, 125, 17599.8999854)]
    [InlineData(1.0, 85, 125, 25.92436177)]
    [InlineData(1.0, 40, 85, 105.224852)]
    [InlineData(1.1, 55, 125, 933.644850477)]
    [InlineData(1.1, 25, 125, 46780.1079712)]
    [InlineData(1.1, 85, 125, 35.89871313)]
    [InlineData(1.1, 40, 85, 167.6216672)]
    public void Acceleration_from_use_to_test(double electronvolts, double use, double test, double factor)
    {
        double slower = AgeingLaw.Acceleration(electronvolts, Given.C(test), Given.C(use));
        Close.Relative(factor, 1 / slower, 1e-9, "acceleration");
    }

    /// <summary>
    /// NIST/SEMATECH e-Handbook, 8.1.5.1: 133 and 17,597 from 25 to 125 °C at 0.5 and 1.0 eV (found, check-values section 3), with Boltzmann's
    /// constant rounded to 8.617e-5 eV/K and 0 °C taken as 273.16 K; exact constants differ by less than two parts in ten thousand.
    /// </summary>
    [Theory]
    [InlineData(0.5, 132.6517)]
    [InlineData(1.0, 17596.4626)]
    public void The_handbooks_factors(double electronvolts, double factor) =>
        Close.Relative(factor, 1 / AgeingLaw.Acceleration(electronvolts, Given.C(125), Given.C(25)), 2.1e-4, "acceleration");

    [Fact]
    public void A_profile_at_the_tests_temperature_ages_as_the_test_does()
    {
        Ageing ageing = Given.Platform.Ageing;
        DwellBin[] life = [new DwellBin(Given.C(125), Given.C(125), Duration.FromHours(4000))];
        Assert.Equal(4000, AgeingLaw.EquivalentTime(ageing, life).Hours, 1e-9);
        Assert.Equal(2, AgeingLaw.AgeFactor(ageing, life), 1e-12);
    }

    /// <summary>
    /// The mean over a bin is the average of many narrow slices of it; a midpoint rule of 20,000 slices is within 1e-9 of that.
    /// </summary>
    [Fact]
    public void The_mean_over_a_bin_is_the_average_over_its_temperatures()
    {
        Ageing ageing = Given.Platform.Ageing;
        const int Slices = 20_000;
        double sum = Enumerable.Range(0, Slices)
            .Sum(i => AgeingLaw.Acceleration(ageing.ActivationEnergy, ageing.TestTemperature, Given.C(-40 + (200 * (i + 0.5) / Slices))));
        Duration equivalent = AgeingLaw.EquivalentTime(ageing, [new DwellBin(Given.C(-40), Given.C(160), Duration.FromHours(1))]);
        Close.Relative(sum / Slices, equivalent.Hours, 1e-7, "mean acceleration");
    }
}
