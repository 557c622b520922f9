using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.Characterizing;

/// <summary>
/// How drift grows with time and temperature, relative to the drift at the end of the stated test:
/// <c>f = (AF(T)·t/t_test)^n</c> with Arrhenius' acceleration <c>AF</c>. Section 6 of the band model.
/// </summary>
/// <param name="scope">The stated test.</param>
/// <param name="energy">Activation energy <c>Ea</c>, electronvolts.</param>
/// <param name="exponent">Time exponent <c>n</c>, above 0.</param>
internal sealed class DriftLaw(AgeingScope scope, double energy, double exponent)
{
    public double Energy => energy;

    public double Exponent => exponent;

    /// <summary><c>f</c>; zero at the beginning.</summary>
    public double At(Temperature storage, Duration stored) =>
        stored.Hours == 0 ? 0 : Math.Exp(exponent * (Math.Log(stored.Hours / scope.TestDuration.Hours) + (energy * Inverse(storage))));

    /// <summary><c>∂f/∂Ea = f·n·(1/T_test − 1/T)/k</c>.</summary>
    public double EnergySlope(Temperature storage, Duration stored) => At(storage, stored) * exponent * Inverse(storage);

    /// <summary><c>∂f/∂n = f·ln f/n</c>.</summary>
    public double ExponentSlope(Temperature storage, Duration stored) =>
        At(storage, stored) is > 0 and var f ? f * Math.Log(f) / exponent : 0;

    /// <summary><c>(1/T_test − 1/T)/k</c>, per electronvolt.</summary>
    private double Inverse(Temperature storage) => Math.Log(AgeingLaw.Acceleration(1, scope.TestTemperature, storage));
}
