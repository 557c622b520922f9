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

    /// <summary><c>a²</c>.</summary>
    public Surface Square()
    {
        var c = new double[(2 * DegreeInX) + 1, (2 * DegreeInT) + 1];
        for (int i = 0; i <= DegreeInX; i++)
            for (int k = 0; k <= DegreeInT; k++)
                for (int j = 0; j <= DegreeInX; j++)
                    for (int l = 0; l <= DegreeInT; l++)
                        c[i + j, k + l] += coefficients[i, k] * coefficients[j, l];
        return new Surface(c);
    }

    /// <summary>The surface with <c>t = origin + slope·v</c>, as a polynomial in <c>x</c> and <c>v</c>.</summary>
    public Surface SubstituteT(double origin, double slope)
    {
        var c = new double[DegreeInX + 1, DegreeInT + 1];
        for (int i = 0; i <= DegreeInX; i++)
        {
            double[] inT = Polynomials.Substitute([.. Enumerable.Range(0, DegreeInT + 1).Select(k => coefficients[i, k])], origin, slope);
            for (int k = 0; k < inT.Length; k++)
                c[i, k] = inT[k];
        }

        return new Surface(c);
    }
}
