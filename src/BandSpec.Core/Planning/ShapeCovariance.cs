using System.Runtime.Intrinsics;

namespace BandSpec.Core.Planning;

/// <summary>A symmetric 4×4 matrix over the pressure shapes at eight temperatures, a sum of squares.</summary>
internal struct ShapeCovariance
{
    private Vector512<double> zeroZero, zeroSpan, zeroBow, zeroS, spanSpan, spanBow, spanS, bowBow, bowS, sS;

    /// <summary>Adds <c>v·vᵀ</c>.</summary>
    public void Add(in ShapeVector v)
    {
        zeroZero = Vector512.FusedMultiplyAdd(v.Zero, v.Zero, zeroZero);
        zeroSpan = Vector512.FusedMultiplyAdd(v.Zero, v.Span, zeroSpan);
        zeroBow = Vector512.FusedMultiplyAdd(v.Zero, v.Bow, zeroBow);
        zeroS = Vector512.FusedMultiplyAdd(v.Zero, v.SShape, zeroS);
        spanSpan = Vector512.FusedMultiplyAdd(v.Span, v.Span, spanSpan);
        spanBow = Vector512.FusedMultiplyAdd(v.Span, v.Bow, spanBow);
        spanS = Vector512.FusedMultiplyAdd(v.Span, v.SShape, spanS);
        bowBow = Vector512.FusedMultiplyAdd(v.Bow, v.Bow, bowBow);
        bowS = Vector512.FusedMultiplyAdd(v.Bow, v.SShape, bowS);
        sS = Vector512.FusedMultiplyAdd(v.SShape, v.SShape, sS);
    }

    /// <summary>The variance at a pressure, <c>ψᵀ C ψ</c>; rounding below zero counts as zero.</summary>
    public readonly Vector512<double> At(in ShapeWeights psi)
    {
        Vector512<double> zero = zeroZero + (2 * ((psi.Span * zeroSpan) + (psi.Bow * zeroBow) + (psi.SShape * zeroS)));
        Vector512<double> span = psi.Span * ((psi.Span * spanSpan) + (2 * ((psi.Bow * spanBow) + (psi.SShape * spanS))));
        Vector512<double> bow = psi.Bow * ((psi.Bow * bowBow) + (2 * psi.SShape * bowS));
        return Vector512.Max(zero + span + bow + (psi.SShape * psi.SShape * sS), Vector512<double>.Zero);
    }
}

/// <summary>The values of the shapes <c>ψ1</c>, <c>ψ2</c>, <c>ψ3</c> at one pressure; <c>ψ0</c> is 1.</summary>
/// <param name="Span"><c>ψ1</c>.</param>
/// <param name="Bow"><c>ψ2</c>.</param>
/// <param name="SShape"><c>ψ3</c>.</param>
internal readonly record struct ShapeWeights(double Span, double Bow, double SShape)
{
    /// <summary>The mean at this pressure, <c>ψᵀ c̄</c>.</summary>
    public Vector512<double> Mean(in ShapeVector c) => c.Zero + (Span * c.Span) + (Bow * c.Bow) + (SShape * c.SShape);
}
