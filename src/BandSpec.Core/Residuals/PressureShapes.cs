using BandSpec.Core.Requirements;

namespace BandSpec.Core.Residuals;

/// <summary>The shapes of an error over the pressure fraction <c>x</c>; each a plain number.</summary>
internal static class PressureShapes
{
    /// <summary>How many shapes <c>ψ_j</c> there are.</summary>
    public const int Count = 4;

    private static readonly double SShapeScale = 6 * Math.Sqrt(3);

    /// <summary><c>ψ0 = 1</c>, <c>ψ1 = x</c>, <c>ψ2 = 4x(1−x)</c>, <c>ψ3 = 6√3·x(1−x)(1−2x)</c>.</summary>
    public static double At(PressureShape shape, double x) => shape switch
    {
        PressureShape.Zero => 1,
        PressureShape.Span => x,
        PressureShape.Bow => 4 * x * (1 - x),
        _ => SShapeScale * x * (1 - x) * (1 - (2 * x)),
    };

    /// <summary>The shape of pressure hysteresis, <c>η(x) = 4x(1−x)</c>.</summary>
    public static double Hysteresis(double x) => 4 * x * (1 - x);
}
