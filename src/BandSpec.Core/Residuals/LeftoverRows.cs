using BandSpec.Core.Numerics;
using BandSpec.Core.Requirements;

namespace BandSpec.Core.Residuals;

/// <summary>
/// What a form of correction cannot follow, in factored form. A fit reproduces every coefficient of the raw error that the form itself has,
/// whatever the points; only the others leave a residue. With <c>Σ_w = L_w L_wᵀ</c> and <c>Σ_l = L_l L_lᵀ</c> over those others the rows of
/// <c>L_wᵀ</c>, of <c>L_lᵀ</c> and of their means stand below each other: what a fit leaves of each row gives, by sums of squares, the spread
/// within a lot, the spread of the lots, and the mean.
/// </summary>
internal sealed class LeftoverRows
{
    private readonly double[][] polynomials;

    public LeftoverRows(int index, CorrectionForm form, RawError raw)
    {
        (Index, Form) = (index, form);
        HashSet<CoefficientName> followed = [.. form.Terms()];
        int[] left = [.. Enumerable.Range(0, raw.Names.Length).Where(k => !followed.Contains(raw.Names[k]))];
        double[][] within = SemidefiniteFactor.RowsOf(Part(raw.Within, left)), lots = SemidefiniteFactor.RowsOf(Part(raw.Lots, left));
        (WithinCount, LotCount) = (within.Length, lots.Length);
        double[][] rows = [.. within, .. lots, [.. left.Select(k => raw.Mean[k])]];
        CoefficientName[] names = [.. left.Select(k => raw.Names[k])];
        polynomials = [.. rows.SelectMany(row => Enum.GetValues<PressureShape>().Select(shape => PolynomialOf(row, names, shape)))];
    }

    /// <summary>Position among the forms of a search.</summary>
    public int Index { get; }

    /// <summary>The form.</summary>
    public CorrectionForm Form { get; }

    /// <summary>How many rows belong to the spread within a lot; they come first.</summary>
    public int WithinCount { get; }

    /// <summary>How many rows belong to the spread of the lots; they follow. The row of the means is the last.</summary>
    public int LotCount { get; }

    /// <summary>How many rows there are.</summary>
    public int Count => WithinCount + LotCount + 1;

    /// <summary>The coefficients of a row in one shape by rising powers of <c>τ</c>; empty when the row has nothing of that shape.</summary>
    public ReadOnlySpan<double> Polynomial(int row, PressureShape shape) => polynomials[(row * PressureShapes.Count) + (int)shape];

    /// <summary>The value of a row in one shape at a reduced temperature.</summary>
    public double At(int row, PressureShape shape, double tau)
    {
        double sum = 0;
        ReadOnlySpan<double> polynomial = Polynomial(row, shape);
        for (int k = 0; k < polynomial.Length; k++)
            sum += polynomial[k] * Powers.Of(tau, k);
        return sum;
    }

    private static double[,] Part(double[,] matrix, int[] indices)
    {
        var part = new double[indices.Length, indices.Length];
        for (int i = 0; i < indices.Length; i++)
            for (int j = 0; j < indices.Length; j++)
                part[i, j] = matrix[indices[i], indices[j]];
        return part;
    }

    private static double[] PolynomialOf(double[] row, CoefficientName[] names, PressureShape shape)
    {
        int[] own = [.. Enumerable.Range(0, names.Length).Where(k => names[k].Shape == shape && row[k] != 0)];
        var polynomial = new double[own.Length == 0 ? 0 : own.Max(k => names[k].Degree) + 1];
        foreach (int k in own)
            polynomial[names[k].Degree] += row[k];
        return polynomial;
    }
}
