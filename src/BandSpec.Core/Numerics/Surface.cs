namespace BandSpec.Core.Numerics;

/// <summary>A polynomial in two variables, <c>Σ c_ik x^i t^k</c>. It never changes.</summary>
internal sealed class Surface
{
    private readonly double[,] coefficients;

    private Surface(double[,] coefficients) => this.coefficients = coefficients;

    /// <summary>Degree in <c>x</c>.</summary>
    public int DegreeInX => coefficients.GetLength(0) - 1;

    /// <summary>Degree in <c>t</c>.</summary>
    public int DegreeInT => coefficients.GetLength(1) - 1;

    /// <summary>The coefficient of <c>x^i t^k</c>; 0 beyond the degrees.</summary>
    public double this[int i, int k] => i <= DegreeInX && k <= DegreeInT ? coefficients[i, k] : 0;

    /// <summary><c>p(x)·q(t)</c>; an empty polynomial counts as zero.</summary>
    public static Surface Product(double[] p, double[] q)
    {
        var c = new double[Math.Max(1, p.Length), Math.Max(1, q.Length)];
        for (int i = 0; i < p.Length; i++)
            for (int k = 0; k < q.Length; k++)
                c[i, k] = p[i] * q[k];
        return new Surface(c);
    }

    /// <summary><c>a + factor·b</c>.</summary>
    public static Surface Add(Surface a, Surface b, double factor = 1)
    {
        var c = new double[Math.Max(a.DegreeInX, b.DegreeInX) + 1, Math.Max(a.DegreeInT, b.DegreeInT) + 1];
        for (int i = 0; i < c.GetLength(0); i++)
            for (int k = 0; k < c.GetLength(1); k++)
                c[i, k] = a[i, k] + (factor * b[i, k]);
        return new Surface(c);
    }

    /// <summary><c>a·b</c>.</summary>
    public static Surface Multiply(Surface a, Surface b)
    {
        var c = new double[a.DegreeInX + b.DegreeInX + 1, a.DegreeInT + b.DegreeInT + 1];
        for (int i = 0; i <= a.DegreeInX; i++)
            for (int k = 0; k <= a.DegreeInT; k++)
                for (int j = 0; j <= b.DegreeInX; j++)
                    for (int l = 0; l <= b.DegreeInT; l++)
                        c[i + j, k + l] += a[i, k] * b[j, l];
        return new Surface(c);
    }

    /// <summary>Value and derivatives at a place, by Horner's rule.</summary>
    public SurfaceJet At(double x, double t)
    {
        SurfaceJet sum = default;
        for (int i = DegreeInX; i >= 0; i--)
            sum = sum.TimesPlus(x, InT(i, t));
        return sum;
    }

    /// <summary>The value alone.</summary>
    public double ValueAt(double x, double t)
    {
        double sum = 0;
        for (int i = DegreeInX; i >= 0; i--)
        {
            double inT = 0;
            for (int k = DegreeInT; k >= 0; k--)
                inT = (inT * t) + coefficients[i, k];
            sum = (sum * x) + inT;
        }

        return sum;
    }

    /// <summary>The surface in new variables <c>u, v</c>: <c>x</c> replaced by a surface in them, <c>t</c> by a polynomial in <c>v</c>.</summary>
    public Surface Substitute(Surface x, double[] t)
    {
        Surface result = Product([], []);
        for (int i = DegreeInX; i >= 0; i--)
        {
            double[] inV = [];
            for (int k = DegreeInT; k >= 0; k--)
                inV = Polynomials.Add(Polynomials.Multiply(inV, t), [coefficients[i, k]]);
            result = Add(Multiply(result, x), Product([1], inV));
        }

        return result;
    }

    private (double Value, double First, double Second) InT(int i, double t)
    {
        double value = 0, first = 0, half = 0;
        for (int k = DegreeInT; k >= 0; k--)
        {
            half = (half * t) + first;
            first = (first * t) + value;
            value = (value * t) + coefficients[i, k];
        }

        return (value, first, 2 * half);
    }
}

/// <summary>A surface at a place: its value and its first and second derivatives.</summary>
/// <param name="Value">The value.</param>
/// <param name="X">Derivative by <c>x</c>.</param>
/// <param name="T">Derivative by <c>t</c>.</param>
/// <param name="XX">Second derivative by <c>x</c>.</param>
/// <param name="XT">Derivative by both.</param>
/// <param name="TT">Second derivative by <c>t</c>.</param>
internal readonly record struct SurfaceJet(double Value, double X, double T, double XX, double XT, double TT)
{
    /// <summary>One step of Horner's rule: this times <c>x</c>, plus a polynomial in <c>t</c>.</summary>
    public SurfaceJet TimesPlus(double x, (double Value, double First, double Second) next) => new(
        (Value * x) + next.Value, (X * x) + Value, (T * x) + next.First, (XX * x) + (2 * X), (XT * x) + T, (TT * x) + next.Second);
}
