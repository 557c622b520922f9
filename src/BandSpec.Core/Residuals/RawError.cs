using BandSpec.Core.Numerics;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.Residuals;

/// <summary>
/// The error of the sensor family before compensation, <c>raw(x,T) = Σ a_jk ψ_j(x) τ^k</c> in %FS, with its coefficients <c>a</c> normal over
/// production: mean <c>ā</c>, covariance <c>Σ_w</c> within a lot and <c>Σ_l</c> of the lots. K coefficients.
/// </summary>
internal sealed class RawError
{
    private readonly double referenceCelsius;

    public RawError(Platform platform)
    {
        referenceCelsius = platform.Temperature.Reference.Celsius;
        Names = [.. platform.RawError.Select(c => c.Name)];
        Mean = [.. platform.RawError.Select(c => c.Mean)];
        double[,] correlation = CorrelationMatrix(Names, platform.Correlations);
        Within = Covariance(correlation, [.. platform.RawError.Select(c => c.Sigma)]);
        Lots = Covariance(correlation, [.. platform.RawError.Select(c => c.LotSigma)]);
    }

    /// <summary>The coefficients' names, in the order of the platform file.</summary>
    public CoefficientName[] Names { get; }

    /// <summary><c>ā</c>, K.</summary>
    public double[] Mean { get; }

    /// <summary><c>Σ_w = diag(σ) R diag(σ)</c>, K×K.</summary>
    public double[,] Within { get; }

    /// <summary><c>Σ_l = diag(σ_lot) R diag(σ_lot)</c>, K×K.</summary>
    public double[,] Lots { get; }

    /// <summary>Reduced temperature <c>τ = (T − T_ref)/100 K</c>.</summary>
    public double Reduced(Temperature temperature) => (temperature.Celsius - referenceCelsius) / 100;

    /// <summary><c>b(x,T)</c>: the values of <c>ψ_j(x)·τ^k</c>, K.</summary>
    public double[] Basis(double x, double tau) =>
        [.. Names.Select(n => PressureShapes.At(n.Shape, x) * Powers.Of(tau, n.Degree))];

    /// <summary><c>d = ∂b/∂T</c> per kelvin, K.</summary>
    public double[] Slope(double x, double tau) =>
        [.. Names.Select(n => n.Degree == 0 ? 0 : PressureShapes.At(n.Shape, x) * n.Degree * Powers.Of(tau, n.Degree - 1) / 100)];

    /// <summary>
    /// The correlation matrix <c>R</c> of the coefficients: ones on the diagonal, the listed correlations off it.
    /// </summary>
    public static double[,] CorrelationMatrix(IReadOnlyList<CoefficientName> names, IReadOnlyList<CoefficientCorrelation> correlations)
    {
        var matrix = new double[names.Count, names.Count];
        for (int i = 0; i < names.Count; i++)
            matrix[i, i] = 1;
        foreach (CoefficientCorrelation c in correlations)
        {
            int i = names.ToList().IndexOf(c.First), j = names.ToList().IndexOf(c.Second);
            matrix[i, j] = matrix[j, i] = c.Value;
        }

        return matrix;
    }

    private static double[,] Covariance(double[,] correlation, double[] sigma)
    {
        var matrix = new double[sigma.Length, sigma.Length];
        for (int i = 0; i < sigma.Length; i++)
            for (int j = 0; j < sigma.Length; j++)
                matrix[i, j] = sigma[i] * correlation[i, j] * sigma[j];
        return matrix;
    }
}
