using BandSpec.Core.Quantities;

namespace BandSpec.Core.TestLimits;

/// <summary>Where and how a verification test reads a unit.</summary>
/// <param name="Temperature">Chamber temperature.</param>
/// <param name="Fraction">Pressure fraction.</param>
/// <param name="Direction">From which side the pressure is approached.</param>
internal readonly record struct TestPlace(Temperature Temperature, double Fraction, PressureDirection Direction)
{
    /// <summary>The place of a point.</summary>
    public static TestPlace Of(VerificationPoint point) => new(point.Temperature, point.PressureFraction, point.Direction);
}
