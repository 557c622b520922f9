using BandSpec.Core.Numerics;
using BandSpec.Core.Requirements;
using BandSpec.Core.Residuals;
using MathNet.Numerics.LinearAlgebra;

namespace BandSpec.Core.Planning;

/// <summary>
/// The linear system behind the prices of one plan. Functions are combinations <c>h = Σ η_k b_k</c> of the raw error's terms and those of the
/// correction. With <c>A = Σ b bᵀ/v</c> over the plan's readings, <c>S</c> a covariance of the terms that the correction cannot follow, and a lean
/// <c>ϑ</c> towards their means <c>ā</c>, the function of a place <c>v</c> solves <c>y = (b(v) − Aη)</c> on those terms with <c>η = S y + ϑ ā</c>
/// there, and <c>(b(v) − Aη) = 0</c> on the terms of the correction: the best linear prediction that follows the correction's terms exactly.
/// </summary>
internal sealed class PriceSystem
{
    private readonly PriceBasis basis;
    private readonly double[,] spread;
    private readonly Matrix<double> information;
    private readonly double[,] inverse;

    public PriceSystem(PriceBasis basis, double[,] spread, Matrix<double> information)
    {
        (this.basis, this.spread, this.information) = (basis, spread, information);
        int left = basis.Left, all = basis.Count;
        var m = Matrix<double>.Build.Dense(all, all);
        for (int i = 0; i < all; i++)
        {
            for (int k = 0; k < left; k++)
            {
                double sum = i == k ? 1 : 0;
                for (int j = 0; j < left; j++)
                    sum += information[i, j] * spread[j, k];
                m[i, k] = sum;
            }

            for (int q = left; q < all; q++)
                m[i, q] = information[i, q];
        }

        inverse = m.Inverse().ToArray();
    }

    /// <summary>The function of a place.</summary>
    /// <param name="place"><c>b(v)</c>.</param>
    /// <param name="lean"><c>ϑ</c>.</param>
    public PriceFunction Solve(double[] place, double lean)
    {
        int left = basis.Left;
        double[] right = new double[basis.Count], solved = new double[basis.Count];
        for (int i = 0; i < right.Length; i++)
        {
            right[i] = place[i];
            for (int j = 0; lean != 0 && j < left; j++)
                right[i] -= lean * information[i, j] * basis.Mean[j];
        }

        for (int i = 0; i < solved.Length; i++)
            for (int j = 0; j < solved.Length; j++)
                solved[i] += inverse[i, j] * right[j];
        double[] y = solved[..left], eta = [.. solved];
        for (int i = 0; i < left; i++)
        {
            eta[i] = lean * basis.Mean[i];
            for (int j = 0; j < left; j++)
                eta[i] += spread[i, j] * y[j];
        }

        return new PriceFunction(eta, Vectors.Form(y, spread, y), Vectors.Dot(y, basis.Mean), lean);
    }
}

/// <summary>A function that prices are made of.</summary>
/// <param name="Eta">Its coefficients <c>η</c>.</param>
/// <param name="Own"><c>yᵀ S y</c>: what it pays by itself.</param>
/// <param name="Mean"><c>yᵀā</c>: the mean that the prediction leaves.</param>
/// <param name="Lean"><c>ϑ</c>.</param>
internal sealed record PriceFunction(double[] Eta, double Own, double Mean, double Lean);

/// <summary>
/// The terms of which functions are made: first those of the raw error that a correction cannot follow, then those of the correction.
/// </summary>
internal sealed class PriceBasis
{
    private readonly CoefficientName[] names;

    public PriceBasis(RawError raw, CorrectionForm form)
    {
        CoefficientName[] followed = [.. form.Terms()];
        int[] left = [.. Enumerable.Range(0, raw.Names.Length).Where(k => !followed.Contains(raw.Names[k]))];
        names = [.. left.Select(k => raw.Names[k]), .. followed];
        Left = left.Length;
        Mean = [.. left.Select(k => raw.Mean[k])];
        Within = Part(raw.Within, left);
        LongRun = Part(raw.Lots, left);
        for (int i = 0; i < Left; i++)
            for (int j = 0; j < Left; j++)
                LongRun[i, j] += Within[i, j];
    }

    /// <summary>How many terms the correction cannot follow.</summary>
    public int Left { get; }

    /// <summary>How many terms there are.</summary>
    public int Count => names.Length;

    /// <summary>Means of the terms it cannot follow.</summary>
    public double[] Mean { get; }

    /// <summary>Their covariance within a lot.</summary>
    public double[,] Within { get; }

    /// <summary>Their covariance over lots.</summary>
    public double[,] LongRun { get; }

    /// <summary><c>b(x,T)</c>.</summary>
    public double[] At(double x, double tau) => [.. names.Select(n => PressureShapes.At(n.Shape, x) * Powers.Of(tau, n.Degree))];

    private static double[,] Part(double[,] matrix, int[] indices)
    {
        var part = new double[indices.Length, indices.Length];
        for (int i = 0; i < indices.Length; i++)
            for (int j = 0; j < indices.Length; j++)
                part[i, j] = matrix[indices[i], indices[j]];
        return part;
    }
}
