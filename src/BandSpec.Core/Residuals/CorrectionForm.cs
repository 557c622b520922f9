using BandSpec.Core.Numerics;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.Residuals;

/// <summary>
/// The form of the stored correction: <c>q(x,T) = [τ^0 … τ^d_z, x·τ^0 … x·τ^d_s, ψ2(x) if the reference list has ≥ 3 pressures,
/// ψ3(x) if ≥ 4]</c>. Equality is that of its four parts.
/// </summary>
/// <param name="ZeroDegree"><c>d_z ≥ 0</c>.</param>
/// <param name="SpanDegree"><c>d_s ≥ 0</c>.</param>
/// <param name="HasBow">Whether <c>ψ2</c> is fitted.</param>
/// <param name="HasSShape">Whether <c>ψ3</c> is fitted.</param>
internal readonly record struct CorrectionForm(int ZeroDegree, int SpanDegree, bool HasBow, bool HasSShape)
{
    /// <summary>The form that a station's reference list allows.</summary>
    public static CorrectionForm For(Station station, int zeroDegree, int spanDegree)
    {
        int pressures = station.PressurePoints.Reference.Count;
        return new CorrectionForm(zeroDegree, spanDegree, pressures >= 3, pressures >= 4);
    }

    /// <summary>How many coefficients the correction has.</summary>
    public int Columns => ZeroDegree + 1 + SpanDegree + 1 + (HasBow ? 1 : 0) + (HasSShape ? 1 : 0);

    /// <summary>The shape and degree of each coefficient, in the order of <c>q</c>.</summary>
    public IEnumerable<CoefficientName> Terms()
    {
        for (int k = 0; k <= ZeroDegree; k++)
            yield return new CoefficientName(PressureShape.Zero, k);
        for (int k = 0; k <= SpanDegree; k++)
            yield return new CoefficientName(PressureShape.Span, k);
        if (HasBow)
            yield return new CoefficientName(PressureShape.Bow, 0);
        if (HasSShape)
            yield return new CoefficientName(PressureShape.SShape, 0);
    }

    /// <summary><c>q(x,T)</c>, one number a coefficient.</summary>
    public double[] At(double x, double tau) => [.. Terms().Select(t => PressureShapes.At(t.Shape, x) * Powers.Of(tau, t.Degree))];
}
