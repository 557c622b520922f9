using MathNet.Numerics.LinearAlgebra;

namespace BandSpec.Tests.Characterizing;

/// <summary>The information about variances by the definition, <c>½ tr(P V_a P V_b)</c> with full matrices over all readings.</summary>
internal static class PlainInformation
{
    /// <summary>For one level coefficient: within lots, between lots, residual; relative to the residual variance.</summary>
    public static double[,] Of(IReadOnlyList<ReferenceData.Row> rows, double within, double between)
    {
        MatrixBuilder<double> build = Matrix<double>.Build;
        int n = rows.Count;
        Matrix<double> units = build.Dense(n, n, (i, j) => rows[i].Unit == rows[j].Unit ? 1 : 0);
        Matrix<double> lots = build.Dense(n, n, (i, j) => rows[i].Lot == rows[j].Lot ? 1 : 0);
        Matrix<double> one = build.DenseIdentity(n);
        Matrix<double> inverse = (one + (units * within) + (lots * between)).Inverse();
        Matrix<double> mean = build.Dense(n, 1, 1);
        Matrix<double> turned = inverse * mean;
        Matrix<double> weight = inverse - (turned * (mean.Transpose() * turned).Inverse() * turned.Transpose());
        Matrix<double>[] parts = [weight * units, weight * lots, weight];
        double[,] information = new double[3, 3];
        for (int a = 0; a < 3; a++)
            for (int b = 0; b < 3; b++)
                information[a, b] = (parts[a] * parts[b]).Trace() / 2;
        return information;
    }
}
