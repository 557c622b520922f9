using BandSpec.Core.Numerics;
using BandSpec.Core.Numerics.RandomStreams;
using BandSpec.Core.Quantities;

namespace BandSpec.Core.Requirements;

/// <summary>Ageing over a temperature profile: Arrhenius in temperature, a power law in time.</summary>
public static class AgeingLaw
{
    /// <summary>
    /// Boltzmann's constant in eV/K, the quotient of the exact SI values 1.380649·10⁻²³ J/K and 1.602176634·10⁻¹⁹ C (CODATA 2018).
    /// </summary>
    public const double BoltzmannElectronvolts = 1.380649e-23 / 1.602176634e-19;

    /// <summary>
    /// Acceleration factor <c>AF = exp(Ea/k_B·(1/T_test − 1/T))</c>: how much faster a unit ages at <paramref name="temperature"/> than in
    /// the test (Arrhenius).
    /// </summary>
    /// <param name="activationEnergy">Activation energy in electronvolts.</param>
    /// <param name="test">Temperature of the test.</param>
    /// <param name="temperature">Temperature in use.</param>
    public static double Acceleration(double activationEnergy, Temperature test, Temperature temperature) =>
        PortableFunctions.Exp(activationEnergy / BoltzmannElectronvolts * ((1 / test.Kelvin) - (1 / temperature.Kelvin)));

    /// <summary>The service life as time at the test's temperature: <c>Σ dwell · mean of AF over the bin</c>.</summary>
    public static Duration EquivalentTime(Ageing ageing, IReadOnlyList<DwellBin> profile)
    {
        ArgumentNullException.ThrowIfNull(ageing);
        ArgumentNullException.ThrowIfNull(profile);
        return Duration.FromHours(profile.Sum(bin => bin.Dwell.Hours * MeanAcceleration(ageing, bin)));
    }

    /// <summary>Drift at the end of life as a multiple of the drift in the test, <c>f = (equivalent time / test duration)^n</c>.</summary>
    public static double AgeFactor(Ageing ageing, IReadOnlyList<DwellBin> profile)
    {
        ArgumentNullException.ThrowIfNull(ageing);
        return PortableFunctions.Power(EquivalentTime(ageing, profile).Hours / ageing.TestDuration.Hours, ageing.TimeExponent);
    }

    /// <summary>
    /// Mean of the acceleration over a bin, uniform inside it. The integrand is smooth: 20 Gauss-Legendre points on the widest range of
    /// temperatures leave less than 10⁻¹² of it.
    /// </summary>
    private static double MeanAcceleration(Ageing ageing, DwellBin bin)
    {
        double width = (bin.To - bin.From).Kelvin;
        double At(double celsius) => Acceleration(ageing.ActivationEnergy, ageing.TestTemperature, Temperature.FromCelsius(celsius));
        return width > 0
            ? GaussLegendre.Integrate(At, bin.From.Celsius, bin.To.Celsius, 20) / width
            : At(bin.From.Celsius);
    }
}
