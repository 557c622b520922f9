using BandSpec.Core.Numerics.RandomStreams;

namespace BandSpec.Core.Numerics.RareEvents;

/// <summary>
/// A normal law that leans towards small readings: the standard normal density times <c>exp(−κ²/2·Σ (r_v(x)/ℓ_v)²)</c> for linear readings
/// <c>r_v = m_v + a_vᵀx</c> and their limits <c>ℓ_v</c>, brought to a total of 1. It is normal again, <c>N(b, C)</c> with
/// <c>C⁻¹ = I + κ² Σ a_v a_vᵀ/ℓ_v²</c> and <c>b = −κ² C Σ a_v m_v/ℓ_v²</c>. With κ = 0 nothing leans.
/// </summary>
internal sealed class Tilt
{
    private readonly double[,] factor;
    private readonly double[] mean;

    /// <summary>The law of a strength.</summary>
    public Tilt(Readings readings, double strength)
    {
        int d = readings.Dimensions;
        Strength = strength;
        double[,] precision = new double[d, d];
        double[] pull = new double[d];
        for (int i = 0; i < d; i++)
            precision[i, i] = 1;
        for (int v = 0; v < readings.Count && strength > 0; v++)
            Lean(readings, v, precision, pull);
        double[,] lower = Triangles.Cholesky(precision);
        factor = Triangles.InverseTransposed(lower);
        mean = Covariance(pull);
        LogTotal = LogTotalOf(readings, lower, pull);
    }

    /// <summary><c>κ</c>.</summary>
    public double Strength { get; }

    /// <summary>Logarithm of the total before it was brought to 1.</summary>
    public double LogTotal { get; }

    /// <summary><c>b</c>.</summary>
    public ReadOnlySpan<double> Mean => mean;

    /// <summary>A number of this law from standard normal ones, <c>b + F·z</c> with <c>F·Fᵀ = C</c>.</summary>
    public void Draw(ReadOnlySpan<double> normals, Span<double> x)
    {
        for (int i = 0; i < x.Length; i++)
        {
            double sum = mean[i];
            for (int j = i; j < x.Length; j++)
                sum = Math.FusedMultiplyAdd(factor[i, j], normals[j], sum);
            x[i] = sum;
        }
    }

    /// <summary><c>C·a</c>.</summary>
    public double[] Covariance(ReadOnlySpan<double> a)
    {
        int d = a.Length;
        double[] inner = new double[d];
        double[] result = new double[d];
        for (int j = 0; j < d; j++)
            for (int i = 0; i <= j; i++)
                inner[j] += factor[i, j] * a[i];
        for (int i = 0; i < d; i++)
            for (int j = i; j < d; j++)
                result[i] += factor[i, j] * inner[j];
        return result;
    }

    private void Lean(Readings readings, int v, double[,] precision, double[] pull)
    {
        ReadOnlySpan<double> a = readings.Weight(v);
        double part = Strength * Strength / (readings.Limit(v) * readings.Limit(v));
        for (int i = 0; i < a.Length; i++)
        {
            pull[i] -= part * a[i] * readings.Mean(v);
            for (int j = 0; j < a.Length; j++)
                precision[i, j] += part * a[i] * a[j];
        }
    }

    private double LogTotalOf(Readings readings, double[,] lower, double[] pull)
    {
        double sum = Vectors.Dot(pull, mean) / 2;
        for (int i = 0; i < mean.Length; i++)
            sum -= PortableFunctions.Log(lower[i, i]);
        for (int v = 0; v < readings.Count; v++)
        {
            double reading = Strength * readings.Mean(v) / readings.Limit(v);
            sum -= reading * reading / 2;
        }
        return sum;
    }
}
