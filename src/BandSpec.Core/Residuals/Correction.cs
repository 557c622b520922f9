using BandSpec.Core.Numerics;
using BandSpec.Core.Quantities;
using BandSpec.Core.Requirements;
using MathNet.Numerics.LinearAlgebra;

namespace BandSpec.Core.Residuals;

/// <summary>
/// The correction that a plan leads to, and what it leaves over at any pressure and temperature, term by term: the plain form of the
/// formulas, one page of the method. The search has a faster way to the same numbers and is checked against this one.
/// </summary>
internal sealed class Correction
{
    private readonly RawError raw;
    private readonly CorrectionForm form;
    private readonly Matrix<double> inverse;
    private readonly double[][] basis;
    private readonly double[] readingVariance;
    private readonly double[] fractions;

    public Correction(RawError raw, Platform platform, Station station, CompensationPlan plan)
    {
        this.raw = raw;
        form = CorrectionForm.For(station, plan.ZeroDegree, plan.SpanDegree);
        fractions = [.. plan.Points.Select(p => p.PressureFraction)];
        double[] taus = [.. plan.Points.Select(p => raw.Reduced(p.Temperature))];
        basis = [.. fractions.Zip(taus, raw.Basis)];
        inverse = Matrix<double>.Build.DenseOfRowArrays(fractions.Zip(taus, (x, tau) => form.At(x, tau))).QR().Solve(
            Matrix<double>.Build.DenseIdentity(fractions.Length));
        double noise = ReadingNoise.VarianceOf(platform, station);
        readingVariance = [.. fractions.Zip(taus, (x, tau) => noise + SoakVariance(raw, station, x, tau))];
    }

    /// <summary>What is left at <c>(x,T)</c>: <c>ρ = gᵀa − wᵀε</c> with <c>wᵀ = qᵀQ⁺</c> and <c>g = b − Bᵀw</c>.</summary>
    public Residue At(double x, Temperature temperature)
    {
        double tau = raw.Reduced(temperature);
        double[] w = Weights(x, tau);
        double[] g = raw.Basis(x, tau);
        for (int i = 0; i < w.Length; i++)
            for (int k = 0; k < g.Length; k++)
                g[k] -= basis[i][k] * w[i];
        return new Residue(g, w);
    }

    /// <summary><c>w(x,T)</c>, one weight a reading.</summary>
    public double[] Weights(double x, double tau) => inverse.TransposeThisAndMultiply(Vector<double>.Build.Dense(form.At(x, tau))).ToArray();

    /// <summary>Mean left over in a shape group, <c>gᵀā</c> over the group's coefficients.</summary>
    public double Mean(Residue residue, ResidueGroup group) => Vectors.Dot(residue.PartOf(group, raw.Names), raw.Mean);

    /// <summary>Covariance within a lot of what is left in two shape groups, <c>g_aᵀ Σ_w g_b</c>.</summary>
    public double CovarianceWithin(Residue residue, ResidueGroup a, ResidueGroup b) =>
        Vectors.Form(residue.PartOf(a, raw.Names), raw.Within, residue.PartOf(b, raw.Names));

    /// <summary>Covariance of the lots of what is left in two shape groups, <c>g_aᵀ Σ_l g_b</c>.</summary>
    public double CovarianceOfLots(Residue residue, ResidueGroup a, ResidueGroup b) =>
        Vectors.Form(residue.PartOf(a, raw.Names), raw.Lots, residue.PartOf(b, raw.Names));

    /// <summary>Variance of reading noise and unsettled temperature carried into the correction, <c>Σ w_i² v_i</c>.</summary>
    public double CarriedVariance(Residue residue)
    {
        double sum = 0;
        for (int i = 0; i < residue.Weights.Length; i++)
            sum += residue.Weights[i] * residue.Weights[i] * readingVariance[i];
        return sum;
    }

    /// <summary>Variance of the pressure standard, common to all points: <c>(u_0 Σw_i)² + (u_1 Σw_i x_i)²</c>.</summary>
    public double StandardVariance(Residue residue, Station station)
    {
        double zero = station.StandardZero.Percent * residue.Weights.Sum();
        double proportional = station.StandardProportional.Percent * Vectors.Dot(residue.Weights, fractions);
        return (zero * zero) + (proportional * proportional);
    }

    /// <summary>
    /// What one standard deviation of each independent error of the compensation run does to the residue: each reading's own, then the standard's zero
    /// and proportional error. Their squares add up to <see cref="CarriedVariance"/> and <see cref="StandardVariance"/>.
    /// </summary>
    public double[] RunWeights(Residue residue, Station station) =>
    [
        .. residue.Weights.Zip(readingVariance, (w, v) => -w * Math.Sqrt(v)),
        -station.StandardZero.Percent * residue.Weights.Sum(), -station.StandardProportional.Percent * Vectors.Dot(residue.Weights, fractions),
    ];

    /// <summary><c>u_T² E[(∂raw/∂T)²]</c> with <c>E[s²] = (dᵀā)² + dᵀΣ_w d</c>: variance of a reading before the temperature has settled.</summary>
    public static double SoakVariance(RawError raw, Station station, double x, double tau)
    {
        double[] d = raw.Slope(x, tau);
        double mean = Vectors.Dot(d, raw.Mean);
        double gradient = station.SoakGradient.Kelvin;
        return gradient * gradient * ((mean * mean) + Vectors.Form(d, raw.Within, d));
    }
}
