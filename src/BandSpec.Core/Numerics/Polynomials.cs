namespace BandSpec.Core.Numerics;

/// <summary>Polynomials as lists of coefficients by rising powers; an empty list is zero. Inputs are never changed.</summary>
internal static class Polynomials
{
    /// <summary><c>p + factor·q</c>.</summary>
    public static double[] Add(double[] p, double[] q, double factor = 1)
    {
        var sum = new double[Math.Max(p.Length, q.Length)];
        p.CopyTo(sum, 0);
        for (int i = 0; i < q.Length; i++)
            sum[i] += factor * q[i];
        return sum;
    }

    /// <summary><c>p·q</c>.</summary>
    public static double[] Multiply(double[] p, double[] q)
    {
        if (p.Length == 0 || q.Length == 0)
            return [];
        var product = new double[p.Length + q.Length - 1];
        for (int i = 0; i < p.Length; i++)
            for (int j = 0; j < q.Length; j++)
                product[i + j] += p[i] * q[j];
        return product;
    }

    /// <summary><c>p(origin + slope·t)</c> as a polynomial in <c>t</c>, by Horner's rule.</summary>
    public static double[] Substitute(double[] p, double origin, double slope)
    {
        double[] result = [];
        for (int i = p.Length - 1; i >= 0; i--)
            result = Add(Multiply(result, [origin, slope]), [p[i]]);
        return result;
    }
}
