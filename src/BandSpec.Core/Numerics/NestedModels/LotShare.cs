using BandSpec.Core.Numerics.Dense;

namespace BandSpec.Core.Numerics.NestedModels;

/// <summary>
/// One lot's part of the likelihood at given factors. The units are whitened one by one (<c>I + RΛΛᵀRᵀ = KKᵀ</c>, <c>R̃ = K⁻¹R</c>),
/// stacked and reduced to one triangle, which is whitened again for the lot. Only orthogonal steps lie on the way to the deviance.
/// </summary>
internal sealed class LotShare
{
    private readonly Grid between;

    public LotShare(IReadOnlyList<UnitSummary> units, Grid within, Grid between)
    {
        this.between = between;
        int size = within.Rows;
        Precision = new Grid(size, size);
        Pull = new double[size];
        OrthogonalStack stack = new(size);
        Units = [.. units.Select(unit => new UnitShare(unit, within))];
        foreach (UnitShare unit in Units)
        {
            LogDeterminant += unit.LogDeterminant;
            Products.AddTo(Precision, 1, unit.Precision);
            Products.AddTo(Pull, 1, unit.Pull);
            stack.AddRemainder(unit.Remainder);
            stack.Add(unit.Rows());
        }

        Remainder = stack.Remainder;
        (Whitened, double own) = UnitShare.Whiten(stack.Triangle, stack.Side, between);
        LogDeterminant += own;
    }

    /// <summary>The units.</summary>
    public IReadOnlyList<UnitShare> Units { get; }

    /// <summary><c>Σ_i Z_iᵀV_i⁻¹Z_i</c> with the lot's own deviation left out of <c>V</c>.</summary>
    public Grid Precision { get; }

    /// <summary><c>Σ_i Z_iᵀV_i⁻¹y_i</c>, likewise.</summary>
    public double[] Pull { get; }

    /// <summary>The whitened rows <c>[R̃ ṽ]</c>.</summary>
    public Grid Whitened { get; }

    /// <summary>The sum of squares that no coefficients of the lot explain.</summary>
    public double Remainder { get; }

    /// <summary><c>ln det V</c> of the lot, relative to <c>σ²</c>.</summary>
    public double LogDeterminant { get; }

    /// <summary>The lot's predicted coefficients <c>β + b_l</c> and their covariance relative to <c>σ²</c>.</summary>
    /// <param name="mean">The means <c>β</c>.</param>
    /// <param name="covariance">Their covariance; zero to take them as known.</param>
    public (double[] Coefficients, Grid Covariance) Predict(double[] mean, Grid covariance)
    {
        (Grid own, Grid passed) = Shrinkage();
        double[] predicted = own.Times(Pull);
        Products.AddTo(predicted, 1, passed.Times(mean));
        Grid spread = passed.Times(covariance).TimesTransposed(passed);
        Products.AddTo(spread, 1, own);
        return (predicted, spread);
    }

    /// <summary>
    /// <c>N = Λ(I + ΛᵀPΛ)⁻¹Λᵀ</c>, the covariance of the lot's deviation given its readings, and <c>T = I − NP</c>, the part of the means that
    /// its prediction keeps.
    /// </summary>
    public (Grid Own, Grid Passed) Shrinkage()
    {
        Grid inner = between.Transposed().Times(Precision).Times(between);
        for (int i = 0; i < inner.Rows; i++)
            inner[i, i] += 1;
        Grid half = between.Transposed();
        Cholesky.SolveLower(Cholesky.Factor(inner), half);
        Grid own = half.Gram();
        Grid passed = Grid.Identity(own.Rows);
        Products.AddTo(passed, -1, own.Times(Precision));
        return (own, passed);
    }

    /// <summary>Adds the lot's and its units' parts of the slopes.</summary>
    public void AddTo(NestedSlopes slopes, double[] mean, Grid covariance, double variance)
    {
        (double[] predicted, Grid spread) = Predict(mean, covariance);
        Add(slopes.Between, Precision, Pull, predicted, spread, variance);
        foreach (UnitShare unit in Units)
            Add(slopes.Within, unit.Precision, unit.Pull, predicted, spread, variance);
    }

    /// <summary><c>target += P − PEP − gg ᵀ/σ²</c> with <c>g = d − Pm</c>.</summary>
    private static void Add(Grid target, Grid precision, double[] pull, double[] predicted, Grid spread, double variance)
    {
        Products.AddTo(target, 1, precision);
        Products.AddTo(target, -1, precision.Times(spread).Times(precision));
        double[] weighted = precision.Times(predicted);
        for (int i = 0; i < weighted.Length; i++)
            weighted[i] = pull[i] - weighted[i];
        for (int i = 0; i < weighted.Length; i++)
            Products.AddTo(target.Row(i), -weighted[i] / variance, weighted);
    }
}
