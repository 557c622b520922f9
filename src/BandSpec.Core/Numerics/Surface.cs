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
}
