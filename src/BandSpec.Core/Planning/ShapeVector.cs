using System.Runtime.Intrinsics;
using BandSpec.Core.Residuals;

namespace BandSpec.Core.Planning;

/// <summary>One number for each pressure shape, for eight plans.</summary>
internal readonly struct ShapeVector(Vector512<double> zero, Vector512<double> span, Vector512<double> bow, Vector512<double> sShape)
{
    /// <summary>Of the shape <c>ψ0</c>.</summary>
    public readonly Vector512<double> Zero = zero;

    /// <summary>Of the shape <c>ψ1</c>.</summary>
    public readonly Vector512<double> Span = span;

    /// <summary>Of the shape <c>ψ2</c>.</summary>
    public readonly Vector512<double> Bow = bow;

    /// <summary>Of the shape <c>ψ3</c>.</summary>
    public readonly Vector512<double> SShape = sShape;

    /// <summary>The error at a pressure, <c>Σ ψ_j(x) c_j</c>.</summary>
    public Vector512<double> At(in ReadingPressure pressure)
    {
        Vector512<double> sum = Vector512.FusedMultiplyAdd(Vector512.Create(pressure.Fraction), Span, Zero);
        sum = Vector512.FusedMultiplyAdd(Vector512.Create(pressure.Bow), Bow, sum);
        return Vector512.FusedMultiplyAdd(Vector512.Create(pressure.SShape), SShape, sum);
    }

    /// <summary>What is left of four values, the same for all plans, when a correction is taken away.</summary>
    /// <param name="raw">The values before, one a shape.</param>
    /// <param name="coefficients">The correction's coefficients, its polynomials by rising powers.</param>
    /// <param name="form">Its form.</param>
    /// <param name="at">The scaled temperature.</param>
    public static ShapeVector Left(
        ReadOnlySpan<double> raw, ReadOnlySpan<Vector512<double>> coefficients, CorrectionForm form, Vector512<double> at)
    {
        int span = form.ZeroDegree + 1, bow = span + form.SpanDegree + 1, sShape = bow + (form.HasBow ? 1 : 0);
        Vector512<double> ofBow = Vector512.Create(raw[2]), ofSShape = Vector512.Create(raw[3]);
        return new ShapeVector(
            Vector512.Create(raw[0]) - Horner(coefficients[..span], at),
            Vector512.Create(raw[1]) - Horner(coefficients[span..bow], at),
            form.HasBow ? ofBow - coefficients[bow] : ofBow,
            form.HasSShape ? ofSShape - coefficients[sShape] : ofSShape);
    }

    private static Vector512<double> Horner(ReadOnlySpan<Vector512<double>> polynomial, Vector512<double> at)
    {
        Vector512<double> sum = polynomial[^1];
        for (int k = polynomial.Length - 2; k >= 0; k--)
            sum = Vector512.FusedMultiplyAdd(sum, at, polynomial[k]);
        return sum;
    }
}
