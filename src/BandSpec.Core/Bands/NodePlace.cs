using BandSpec.Core.Quantities;

namespace BandSpec.Core.Bands;

/// <summary>A place at which a band is judged. Equality is that of its three parts.</summary>
/// <param name="PressureFraction">Pressure fraction, 0 … 1.</param>
/// <param name="Temperature">Temperature, inside the region.</param>
/// <param name="Region">Index of the region whose allowance holds, counted from the coldest.</param>
public sealed record NodePlace(double PressureFraction, Temperature Temperature, int Region);
