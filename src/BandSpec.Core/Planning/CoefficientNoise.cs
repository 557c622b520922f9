using System.Runtime.Intrinsics;
using BandSpec.Core.Numerics;
using BandSpec.Core.Residuals;

namespace BandSpec.Core.Planning;

/// <summary>
/// The noise of eight fitted corrections. The covariance of the coefficients, <c>Q⁺ diag(v) Q⁺ᵀ</c>, is gathered by powers of the scaled
/// temperature, so that the covariance of two shapes at a temperature is one polynomial. In −1 … 1 that loses no more than a few digits,
/// and it takes a quarter of the time of one residue for each reading.
/// </summary>
internal sealed class CoefficientNoise
{
    private static readonly ShapePair[] Pairs =
    [
        new(0, 0), new(0, 1), new(0, 2), new(0, 3), new(1, 1), new(1, 2), new(1, 3), new(2, 2), new(2, 3), new(3, 3),
    ];

    private readonly int stride;
    private readonly Vector512<double>[] polynomials;
    private readonly Vector512<double>[] scaled;
    private readonly int[] degrees = new int[4];

    public CoefficientNoise(int powers, int entries)
    {
        stride = (2 * powers) - 1;
        polynomials = new Vector512<double>[Pairs.Length * stride];
        scaled = new Vector512<double>[entries];
    }

    /// <summary>Gathers the noise of a fit.</summary>
    /// <param name="form">The form of the fit.</param>
    /// <param name="inverse"><c>Q⁺</c>, one row a coefficient.</param>
    /// <param name="sigmas">Standard deviation of each reading.</param>
    /// <param name="readings">How many readings there are.</param>
    public void Fill(CorrectionForm form, ReadOnlySpan<Vector512<double>> inverse, ReadOnlySpan<Vector512<double>> sigmas, int readings)
    {
        degrees[0] = form.ZeroDegree;
        degrees[1] = form.SpanDegree;
        degrees[2] = form.HasBow ? 0 : -1;
        degrees[3] = form.HasSShape ? 0 : -1;
        for (int p = 0; p < Pairs.Length; p++)
            polynomials.AsSpan(p * stride, DegreeOf(Pairs[p]) + 1).Clear();
        for (int c = 0; c < form.Columns; c++)
            for (int i = 0; i < readings; i++)
                scaled[(c * readings) + i] = inverse[(c * readings) + i] * sigmas[i];
        for (int p = 0; p < Pairs.Length; p++)
            Gather(Pairs[p], polynomials.AsSpan(p * stride, stride), readings);
    }

    /// <summary>Adds the noise at a scaled temperature to a covariance.</summary>
    public void AddTo(ref ShapeCovariance covariance, Vector512<double> at) => covariance.Add(
        Horner(0, at), Horner(1, at), Horner(2, at), Horner(3, at), Horner(4, at),
        Horner(5, at), Horner(6, at), Horner(7, at), Horner(8, at), Horner(9, at));

    /// <summary>Covariances of the coefficients of two shapes; for one shape with itself each pair of different coefficients counts twice.</summary>
    private void Gather(ShapePair pair, Span<Vector512<double>> target, int readings)
    {
        int first = StartOf(pair.First), second = StartOf(pair.Second);
        bool isOne = pair.First == pair.Second;
        for (int k = 0; k <= degrees[pair.First]; k++)
            for (int l = isOne ? k : 0; l <= degrees[pair.Second]; l++)
            {
                Vector512<double> covariance = LanewiseLeastSquares.Dot(
                    scaled.AsSpan((first + k) * readings, readings), scaled.AsSpan((second + l) * readings, readings));
                target[k + l] += isOne && l > k ? covariance + covariance : covariance;
            }
    }

    private int StartOf(int shape)
    {
        int start = 0;
        for (int s = 0; s < shape; s++)
            start += degrees[s] + 1;
        return start;
    }

    private int DegreeOf(ShapePair pair) =>
        degrees[pair.First] < 0 || degrees[pair.Second] < 0 ? -1 : degrees[pair.First] + degrees[pair.Second];

    private Vector512<double> Horner(int pair, Vector512<double> at)
    {
        int degree = DegreeOf(Pairs[pair]);
        if (degree < 0)
            return Vector512<double>.Zero;
        ReadOnlySpan<Vector512<double>> polynomial = polynomials.AsSpan(pair * stride, degree + 1);
        Vector512<double> sum = polynomial[degree];
        for (int k = degree - 1; k >= 0; k--)
            sum = Vector512.FusedMultiplyAdd(sum, at, polynomial[k]);
        return sum;
    }

    /// <summary>Two shapes by their index <c>j</c>, the first not above the second.</summary>
    private readonly record struct ShapePair(int First, int Second);
}
