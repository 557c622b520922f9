using BandSpec.Core.Numerics;
using BandSpec.Core.Numerics.Dense;

namespace BandSpec.Core.Characterizing;

/// <summary>
/// The expected information of an ageing test about <c>θ = (Ea, n, z̄, s̄, σ_z², σ_s², σ²)</c>, unit by unit:
/// <c>I_ab = ṁ_aᵀPṁ_b + ½tr(PV̇_aPV̇_b)</c> with <c>P = V⁻¹ − V⁻¹B(BᵀV⁻¹B)⁻¹BᵀV⁻¹</c> for the unit's own start <c>B = [1 x]</c>
/// (Searle, Casella &amp; McCulloch, Variance Components, 1992, section 6.6). It needs conditions only, no readings: so it also tells what a
/// test that has not been made would add.
/// </summary>
/// <param name="law">The drift law.</param>
/// <param name="mean">Mean drift of zero and span.</param>
/// <param name="variance">Variances of drift of zero and span, and of a reading.</param>
internal sealed class DriftInformation(DriftLaw law, (double Zero, double Span) mean, (double Zero, double Span, double Reading) variance)
{
    /// <summary>How many figures there are.</summary>
    public const int Size = 7;

    /// <summary>The standard error of a spread from that of its square, <c>Var(σ̂²)/(4σ²)</c>, for zero and for span.</summary>
    public (double Zero, double Span) SigmaError(double varianceOfVariance) => (
        Math.Sqrt(varianceOfVariance / variance.Zero) / 2, Math.Sqrt(varianceOfVariance / variance.Span) / 2);

    /// <summary>The information of one unit's conditions.</summary>
    public Grid Of(IReadOnlyList<DriftCondition> conditions)
    {
        (double[][] means, Grid[] variances) = Slopes(conditions);
        Grid weight = Weight(conditions);
        Grid information = new(Size, Size);
        Grid[] weighted = [.. variances.Select(slope => weight.Times(slope))];
        for (int a = 0; a < Size; a++)
            for (int b = 0; b < Size; b++)
                information[a, b] = Vectors.Dot(means[a], weight.Times(means[b]))
                    + (Products.TraceOfProduct(weighted[a], weighted[b].Transposed()) / 2);
        return information;
    }

    /// <summary>How mean and covariance of the readings change with each figure.</summary>
    private (double[][] Means, Grid[] Variances) Slopes(IReadOnlyList<DriftCondition> conditions)
    {
        double[] f = [.. conditions.Select(c => law.At(c.Storage, c.Stored))];
        double[] x = [.. conditions.Select(c => c.PressureFraction)];
        double[] fx = [.. f.Zip(x, (a, b) => a * b)];
        double[] byEnergy = [.. conditions.Select(c => law.EnergySlope(c.Storage, c.Stored))];
        double[] byExponent = [.. conditions.Select(c => law.ExponentSlope(c.Storage, c.Stored))];
        double[] drift = [.. x.Select(p => mean.Zero + (mean.Span * p))];
        double[] none = new double[f.Length];
        double[][] means =
            [[.. byEnergy.Zip(drift, (a, b) => a * b)], [.. byExponent.Zip(drift, (a, b) => a * b)], f, fx, none, none, none];
        Grid Cross(double[] slope)
        {
            Grid cross = new(f.Length, f.Length);
            for (int i = 0; i < f.Length; i++)
                for (int j = 0; j < f.Length; j++)
                    cross[i, j] = (variance.Zero + (variance.Span * x[i] * x[j])) * ((slope[i] * f[j]) + (f[i] * slope[j]));
            return cross;
        }

        Grid empty = new(f.Length, f.Length);
        return (means, [Cross(byEnergy), Cross(byExponent), empty, empty, Outer(f), Outer(fx), Grid.Identity(f.Length)]);
    }

    private Grid Weight(IReadOnlyList<DriftCondition> conditions)
    {
        double[] f = [.. conditions.Select(c => law.At(c.Storage, c.Stored))];
        Grid covariance = Outer(f).ScaledBy(variance.Zero);
        Products.AddTo(covariance, variance.Span, Outer([.. f.Zip(conditions, (a, c) => a * c.PressureFraction)]));
        Products.AddTo(covariance, variance.Reading, Grid.Identity(f.Length));
        Grid inverse = Cholesky.Inverse(Cholesky.Factor(covariance));
        bool hasSpan = conditions.Any(c => c.PressureFraction != conditions[0].PressureFraction);
        Grid start = new(f.Length, hasSpan ? 2 : 1);
        for (int i = 0; i < f.Length; i++)
        {
            start[i, 0] = 1;
            if (hasSpan)
                start[i, 1] = conditions[i].PressureFraction;
        }

        Grid turned = inverse.Times(start);
        Grid spent = Cholesky.Inverse(Cholesky.Factor(start.Transposed().Times(turned)));
        Products.AddTo(inverse, -1, turned.Times(spent).TimesTransposed(turned));
        return inverse;
    }

    private static Grid Outer(double[] v)
    {
        Grid outer = new(v.Length, v.Length);
        for (int i = 0; i < v.Length; i++)
            Products.AddTo(outer.Row(i), v[i], v);
        return outer;
    }
}

/// <summary>Under which conditions a reading is taken.</summary>
/// <param name="Storage">Temperature of the storage.</param>
/// <param name="Stored">Time in storage.</param>
/// <param name="PressureFraction">Applied pressure.</param>
internal readonly record struct DriftCondition(Quantities.Temperature Storage, Quantities.Duration Stored, double PressureFraction);
