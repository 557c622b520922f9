using BandSpec.Core.Numerics;
using BandSpec.Core.Requirements;
using BandSpec.Core.Residuals;

namespace BandSpec.Core.Characterizing;

/// <summary>What a column of the readings' model stands for.</summary>
internal enum ColumnKind
{
    /// <summary>A coefficient <c>ψ_j τ^k</c> of the raw error.</summary>
    Coefficient,

    /// <summary>Pressure hysteresis, full width: <c>±η/2</c> for falling and rising pressure.</summary>
    PressureHysteresis,

    /// <summary>Thermal hysteresis, half width: <c>±1</c> when reached from hotter and from colder.</summary>
    ThermalHysteresis,
}

/// <summary>A column of the readings' model. Equality is that of kind and name.</summary>
/// <param name="Kind">What it stands for.</param>
/// <param name="Name">Which coefficient; without meaning for hysteresis.</param>
internal readonly record struct ReadingColumn(ColumnKind Kind, CoefficientName Name)
{
    public static ReadingColumn PressureHysteresis { get; } = new(ColumnKind.PressureHysteresis, default);

    public static ReadingColumn ThermalHysteresis { get; } = new(ColumnKind.ThermalHysteresis, default);

    public static ReadingColumn Of(PressureShape shape, int degree) => new(ColumnKind.Coefficient, new CoefficientName(shape, degree));

    /// <summary>Whether lots may differ in it: the platform knows no spread of hysteresis between lots.</summary>
    public bool DiffersBetweenLots => Kind == ColumnKind.Coefficient;

    /// <summary>Its name as in files: <c>zero.1</c>, <c>pressure-hysteresis</c>.</summary>
    public string Key => Kind switch
    {
        ColumnKind.PressureHysteresis => ErrorTerm.PressureHysteresis.Key,
        ColumnKind.ThermalHysteresis => ErrorTerm.ThermalHysteresis.Key,
        _ => Name.ToString(),
    };

    /// <summary>The regressor of a reading at pressure fraction <c>x</c> and reduced temperature <c>τ</c>.</summary>
    /// <param name="x">Pressure fraction.</param>
    /// <param name="tau">Reduced temperature.</param>
    /// <param name="pressureSide">+1 for falling, −1 for rising pressure, 0 when not known.</param>
    /// <param name="thermalSide">+1 when reached from hotter, −1 from colder, 0 when not known.</param>
    public double At(double x, double tau, int pressureSide, int thermalSide) => Kind switch
    {
        ColumnKind.PressureHysteresis => pressureSide * PressureShapes.Hysteresis(x) / 2,
        ColumnKind.ThermalHysteresis => thermalSide,
        _ => PressureShapes.At(Name.Shape, x) * Powers.Of(tau, Name.Degree),
    };
}
