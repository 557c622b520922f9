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
    [InlineData(0.7, 55, 125, 77.64538204961)]
    [InlineData(0.3, 55, 125, 6.45727907196)]
    [InlineData(1.1, 55, 125, 933.644850477)]
    [InlineData(0.5, 25, 125, 132.664614669)]
    [InlineData(1.0, 85, 125, 25.92436177)]
    [InlineData(0.8, 40, 85, 41.46624018)]
    public void Acceleration_from_use_to_test(double electronvolts, double use, double test, double factor)
    {
        double slower = AgeingLaw.Acceleration(electronvolts, Given.C(test), Given.C(use));
        Close.Relative(factor, 1 / slower, 1e-9, "acceleration");
    }

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
