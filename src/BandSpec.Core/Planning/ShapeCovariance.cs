using System.Runtime.Intrinsics;

namespace BandSpec.Core.Planning;

/// <summary>A symmetric 4×4 matrix over the pressure shapes, for eight plans.</summary>
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

    /// <summary>Adds an entry to each place of the upper triangle, row by row.</summary>
    public void Add(
        Vector512<double> zz, Vector512<double> zp, Vector512<double> zb, Vector512<double> zs, Vector512<double> pp,
        Vector512<double> pb, Vector512<double> ps, Vector512<double> bb, Vector512<double> bs, Vector512<double> ss)
    {
        (zeroZero, zeroSpan, zeroBow, zeroS) = (zeroZero + zz, zeroSpan + zp, zeroBow + zb, zeroS + zs);
        (spanSpan, spanBow, spanS) = (spanSpan + pp, spanBow + pb, spanS + ps);
        (bowBow, bowS, sS) = (bowBow + bb, bowS + bs, sS + ss);
    }

    /// <summary>The variance at a pressure, <c>ψᵀ C ψ</c>; rounding below zero counts as zero.</summary>
    public readonly Vector512<double> At(in ShapeProducts w)
    {
        Vector512<double> zero = Vector512.FusedMultiplyAdd(Vector512.Create(w.ZeroSpan), zeroSpan, zeroZero);
        zero = Vector512.FusedMultiplyAdd(Vector512.Create(w.SpanSpan), spanSpan, zero);
        if (w.InnerIsZero)
            return Vector512.Max(zero, Vector512<double>.Zero);
        Vector512<double> bow = Vector512.FusedMultiplyAdd(Vector512.Create(w.ZeroBow), zeroBow, zero);
        bow = Vector512.FusedMultiplyAdd(Vector512.Create(w.SpanBow), spanBow, bow);
        bow = Vector512.FusedMultiplyAdd(Vector512.Create(w.BowBow), bowBow, bow);
        Vector512<double> s = Vector512.Create(w.ZeroS) * zeroS;
        s = Vector512.FusedMultiplyAdd(Vector512.Create(w.SpanS), spanS, s);
        s = Vector512.FusedMultiplyAdd(Vector512.Create(w.BowS), bowS, s);
        s = Vector512.FusedMultiplyAdd(Vector512.Create(w.SS), sS, s);
        return Vector512.Max(bow + s, Vector512<double>.Zero);
    }
}

/// <summary>The weights with which the ten entries of a <see cref="ShapeCovariance"/> make up the variance at one pressure.</summary>
internal readonly struct ShapeProducts(in ReadingPressure psi)
{
    /// <summary><c>2ψ0ψ1</c>; the weight of <c>ψ0ψ0</c> is 1.</summary>
    public readonly double ZeroSpan = 2 * psi.Fraction;

    /// <summary><c>2ψ0ψ2</c>.</summary>
    public readonly double ZeroBow = 2 * psi.Bow;

    /// <summary><c>2ψ0ψ3</c>.</summary>
    public readonly double ZeroS = 2 * psi.SShape;

    /// <summary><c>ψ1ψ1</c>.</summary>
    public readonly double SpanSpan = psi.Fraction * psi.Fraction;

    /// <summary><c>2ψ1ψ2</c>.</summary>
    public readonly double SpanBow = 2 * psi.Fraction * psi.Bow;

    /// <summary><c>2ψ1ψ3</c>.</summary>
    public readonly double SpanS = 2 * psi.Fraction * psi.SShape;

    /// <summary><c>ψ2ψ2</c>.</summary>
    public readonly double BowBow = psi.Bow * psi.Bow;

    /// <summary><c>2ψ2ψ3</c>.</summary>
    public readonly double BowS = 2 * psi.Bow * psi.SShape;

    /// <summary><c>ψ3ψ3</c>.</summary>
    public readonly double SS = psi.SShape * psi.SShape;

    /// <summary>Whether bow and s-shape vanish, as they do at both terminals.</summary>
    public readonly bool InnerIsZero = psi.Bow == 0 && psi.SShape == 0;
}
