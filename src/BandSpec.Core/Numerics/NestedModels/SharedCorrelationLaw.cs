using BandSpec.Core.Numerics.Dense;

namespace BandSpec.Core.Numerics.NestedModels;

/// <summary>
/// The platform file's law: <c>Σ_w = diag(σ) R diag(σ)</c> and <c>Σ_l = diag(σ_lot) R diag(σ_lot)</c> with the same correlations. The
/// parameters are the spreads in units of their start and the listed correlations; all others are zero. A spread's sign means nothing, so
/// zero is an inner point and needs no bound.
/// </summary>
/// <param name="within">Start of <c>σ</c>; a coefficient that starts at zero has no spread within lots.</param>
/// <param name="between">Start of <c>σ_lot</c>, likewise.</param>
/// <param name="pairs">The correlated pairs.</param>
/// <param name="correlations">Start of their correlations.</param>
internal sealed class SharedCorrelationLaw(
    double[] within, double[] between, IReadOnlyList<(int First, int Second)> pairs, IReadOnlyList<double> correlations) : ICovarianceLaw
{
    private readonly int[] freeWithin = Free(within);
    private readonly int[] freeBetween = Free(between);

    /// <summary>The correlated pairs.</summary>
    public IReadOnlyList<(int First, int Second)> Pairs => pairs;

    public double[] Start => [.. freeWithin.Select(_ => 1.0), .. freeBetween.Select(_ => 1.0), .. correlations];

    /// <summary>Twice the expected information of a spread's or correlation's logarithm with every unit or lot measured exactly.</summary>
    public double[] Curvature(int units, int lots) =>
        [.. freeWithin.Select(_ => 4.0 * units), .. freeBetween.Select(_ => 4.0 * lots), .. pairs.Select(_ => 2.0 * units)];

    public NestedFactors? Factors(double[] parameters)
    {
        Grid root = Correlations(parameters);
        if (!Cholesky.TryFactor(root))
            return null;
        (double[] sigma, double[] lotSigma) = Spreads(parameters);
        return new NestedFactors(Scaled(sigma, root), Scaled(lotSigma, root));
    }

    /// <summary>The law with one more correlated pair, starting from parameters of this one; a spread at zero starts just above it.</summary>
    public SharedCorrelationLaw From(double[] parameters, (int First, int Second) pair)
    {
        const double JustAbove = 1e-2;
        (double[] sigma, double[] lotSigma) = Spreads(parameters);
        double[] Lifted(double[] values, double[] scale) =>
            [.. values.Zip(scale, (value, unit) => Math.Max(Math.Abs(value), JustAbove * unit))];
        return new SharedCorrelationLaw(Lifted(sigma, within), Lifted(lotSigma, between), [.. pairs, pair], [.. PairValues(parameters), 0]);
    }

    /// <summary>The spreads that the parameters stand for, relative to the residual standard deviation; signs may be negative.</summary>
    public (double[] Within, double[] Between) Spreads(double[] parameters)
    {
        double[] sigma = new double[within.Length];
        double[] lotSigma = new double[within.Length];
        for (int i = 0; i < freeWithin.Length; i++)
            sigma[freeWithin[i]] = within[freeWithin[i]] * parameters[i];
        for (int i = 0; i < freeBetween.Length; i++)
            lotSigma[freeBetween[i]] = between[freeBetween[i]] * parameters[freeWithin.Length + i];
        return (sigma, lotSigma);
    }

    /// <summary>The correlation of each listed pair.</summary>
    public double[] PairValues(double[] parameters) => parameters[(freeWithin.Length + freeBetween.Length)..];

    public double[] Slope(double[] parameters, NestedFactors factors, NestedSlopes slopes)
    {
        (double[] sigma, double[] lotSigma) = Spreads(parameters);
        Grid correlation = Correlations(parameters);
        return
        [
            .. freeWithin.Select(j => within[j] * SpreadSlope(slopes.Within, correlation, sigma, j)),
            .. freeBetween.Select(j => between[j] * SpreadSlope(slopes.Between, correlation, lotSigma, j)),
            .. pairs.Select(pair => 2 * ((slopes.Within[pair.First, pair.Second] * sigma[pair.First] * sigma[pair.Second])
                + (slopes.Between[pair.First, pair.Second] * lotSigma[pair.First] * lotSigma[pair.Second]))),
        ];
    }

    public double[]? Downhill(double[] parameters, NestedSlopes slopes)
    {
        const double Small = 1e-3;
        double[] moved = (double[])parameters.Clone();
        for (int i = 0; i < freeWithin.Length + freeBetween.Length; i++)
        {
            bool inLots = i >= freeWithin.Length;
            int j = inLots ? freeBetween[i - freeWithin.Length] : freeWithin[i];
            double scale = inLots ? between[j] : within[j];
            double slope = (inLots ? slopes.Between : slopes.Within)[j, j] * scale * scale;
            if (Math.Abs(parameters[i]) < Small && slope * Small * Small < -1e-9)
                moved[i] = 10 * Small;
        }

        return moved.AsSpan().SequenceEqual(parameters) ? null : moved;
    }

    private static int[] Free(double[] start) => [.. Enumerable.Range(0, start.Length).Where(j => start[j] != 0)];

    private Grid Correlations(double[] parameters)
    {
        Grid matrix = Grid.Identity(within.Length);
        double[] values = PairValues(parameters);
        for (int p = 0; p < pairs.Count; p++)
            matrix[pairs[p].First, pairs[p].Second] = matrix[pairs[p].Second, pairs[p].First] = values[p];
        return matrix;
    }

    private static Grid Scaled(double[] spreads, Grid root)
    {
        Grid factor = root.Copy();
        for (int j = 0; j < spreads.Length; j++)
            foreach (ref double cell in factor.Row(j))
                cell *= spreads[j];
        return factor;
    }

    /// <summary><c>∂dev/∂σ_j = 2Σ_k G_jk R_jk σ_k</c>.</summary>
    private static double SpreadSlope(Grid slopes, Grid correlation, double[] spreads, int j)
    {
        double sum = 0;
        for (int k = 0; k < spreads.Length; k++)
            sum += slopes[j, k] * correlation[j, k] * spreads[k];
        return 2 * sum;
    }
}
