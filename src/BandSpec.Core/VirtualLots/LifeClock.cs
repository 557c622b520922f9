using BandSpec.Core.Numerics.RandomStreams;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.VirtualLots;

/// <summary>
/// How far a service life has aged a unit: hours at each temperature counted one small step of temperature after the other, each speeded up
/// or slowed down against the ageing test by Arrhenius' law, and the time law applied to their sum.
/// </summary>
internal static class LifeClock
{
    private const double BoltzmannInElectronvolts = 1.380649e-23 / 1.602176634e-19; // both exact in the SI since 2019
    private const int StepsPerBin = 2000;

    /// <summary>Drift at the end of life as a multiple of the drift at the end of the ageing test; the midpoint steps leave 1e-7 of it.</summary>
    public static double AgeFactor(Ageing ageing, IReadOnlyList<DwellBin> profile)
    {
        double hours = profile.Sum(bin => HoursInTest(ageing, bin));
        return PortableFunctions.Power(hours / ageing.TestDuration.Hours, ageing.TimeExponent);
    }

    private static double HoursInTest(Ageing ageing, DwellBin bin)
    {
        double step = (bin.To - bin.From).Kelvin / StepsPerBin;
        double hours = 0;
        for (int i = 0; i < StepsPerBin; i++)
        {
            double kelvin = bin.From.Kelvin + ((i + 0.5) * step);
            double barrier = ageing.ActivationEnergy / BoltzmannInElectronvolts;
            hours += PortableFunctions.Exp(barrier * ((1 / ageing.TestTemperature.Kelvin) - (1 / kelvin)));
        }
        return hours / StepsPerBin * bin.Dwell.Hours;
    }
}
