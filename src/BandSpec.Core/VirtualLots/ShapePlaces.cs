using System.Runtime.Intrinsics;
using BandSpec.Core.Requirements;
using Lanes = System.Runtime.Intrinsics.Vector512<double>;

namespace BandSpec.Core.VirtualLots;

/// <summary>
/// Where the coefficients of <c>Σ a_jk ψ_j(x) τ^k</c> stand in one list: by shape, then by rising power of reduced temperature, each shape
/// up to the highest power that raw error or correction has.
/// </summary>
internal sealed class ShapePlaces
{
    private readonly int[] first = new int[5];

    /// <summary>Places for the powers 0 … <c>highest</c> of each shape; −1 for a shape that is absent.</summary>
    public ShapePlaces(ReadOnlySpan<int> highest)
    {
        for (int shape = 0; shape < 4; shape++)
            first[shape + 1] = first[shape] + highest[shape] + 1;
    }

    /// <summary>How many places there are.</summary>
    public int Count => first[4];

    /// <summary>The place of a shape and power.</summary>
    public int Of(PressureShape shape, int power) => first[(int)shape] + power;

    /// <summary>The polynomial of one shape at reduced temperatures, eight units at once (Horner).</summary>
    /// <param name="coefficients">The coefficients of eight units, <see cref="Count"/> vectors, one every <paramref name="stride"/>.</param>
    /// <param name="stride">Distance from one place to the next.</param>
    /// <param name="shape">Which shape.</param>
    /// <param name="tau">Reduced temperatures.</param>
    public Lanes At(ReadOnlySpan<Lanes> coefficients, int stride, int shape, Lanes tau)
    {
        Lanes sum = Lanes.Zero;
        for (int place = first[shape + 1] - 1; place >= first[shape]; place--)
            sum = Vector512.FusedMultiplyAdd(sum, tau, coefficients[place * stride]);
        return sum;
    }

    /// <summary>The whole error of eight units at one pressure fraction and their own reduced temperatures.</summary>
    public Lanes At(ReadOnlySpan<Lanes> coefficients, int stride, in ShapeValues values, Lanes tau) =>
        At(coefficients, stride, new LaneShapes(Vector512.Create(values.Span), Vector512.Create(values.Bow), Vector512.Create(values.SShape)), tau);

    /// <summary>The whole error of eight units at their own pressures and reduced temperatures.</summary>
    public Lanes At(ReadOnlySpan<Lanes> coefficients, int stride, in LaneShapes shapes, Lanes tau)
    {
        Lanes sum = Vector512.FusedMultiplyAdd(At(coefficients, stride, 1, tau), shapes.Span, At(coefficients, stride, 0, tau));
        sum = Vector512.FusedMultiplyAdd(At(coefficients, stride, 2, tau), shapes.Bow, sum);
        return Vector512.FusedMultiplyAdd(At(coefficients, stride, 3, tau), shapes.SShape, sum);
    }
}

/// <summary>What the pressure shapes are at one pressure fraction.</summary>
/// <param name="Span"><c>ψ1 = x</c>.</param>
/// <param name="Bow"><c>ψ2 = 4x(1 − x)</c>, which is also the shape <c>η</c> of pressure hysteresis.</param>
/// <param name="SShape"><c>ψ3 = 6√3·x(1 − x)(1 − 2x)</c>.</param>
internal readonly record struct ShapeValues(double Span, double Bow, double SShape)
{
    /// <summary>The shapes at a pressure fraction.</summary>
    public static ShapeValues At(double x) =>
        new(x, 4 * x * (1 - x), 6 * Math.Sqrt(3) * x * (1 - x) * (1 - (2 * x)));
}

/// <summary>The same at eight pressure fractions.</summary>
/// <param name="Span"><c>ψ1</c>.</param>
/// <param name="Bow"><c>ψ2</c>.</param>
/// <param name="SShape"><c>ψ3</c>.</param>
internal readonly record struct LaneShapes(Lanes Span, Lanes Bow, Lanes SShape)
{
    /// <summary>The shapes at pressure fractions.</summary>
    public static LaneShapes At(Lanes x)
    {
        Lanes parabola = x * (Lanes.One - x);
        return new(
            x, Vector512.Create(4.0) * parabola,
            Vector512.Create(6 * Math.Sqrt(3)) * parabola * (Lanes.One - (Vector512.Create(2.0) * x)));
    }
}
