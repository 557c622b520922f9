using BandSpec.Core.Numerics;
using BandSpec.Tests.Reference;

using Xunit;

namespace BandSpec.Tests.Numerics;

public sealed class ChiSquaredTests
{
    /// <summary>chi-square.csv: mpmath at 32 digits, recomputed, with SciPy and R as witnesses.</summary>
    [Fact]
    public void Both_tails_agree_with_the_table()
    {
        foreach (double[] row in ReferenceTable.Numbers("chi-square.csv"))
        {
            (double nu, double x) = (row[0], row[1]);
            Close.Relative(row[2], ChiSquared.Cumulative(x, nu), 1e-12, $"P(X <= {x:R}), nu {nu}");
            Close.Relative(row[3], ChiSquared.UpperTail(x, nu), 1e-12, $"P(X > {x:R}), nu {nu}");
        }
    }

    [Fact]
    public void Quantile_turns_the_distribution_round()
    {
        foreach (double nu in new[] { 0.4, 1.0, 1.5, 2, 9, 120, 1e6 })
            foreach (double p in new[] { 1e-12, 1e-6, 0.05, 0.5, 0.95, 1 - 1e-9 })
                Close.Relative(p <= 0.5 ? p : 1 - p, Tail(p, ChiSquared.Quantile(p, nu), nu), 1e-11, $"p {p} nu {nu}");
    }

    /// <summary>χ² at 19 degrees of freedom, 2.5 % and 97.5 % (check-values section 5; recomputed).</summary>
    [Fact]
    public void Table_values()
    {
        Assert.Equal(8.906516, ChiSquared.Quantile(0.025, 19), 6e-7);
        Assert.Equal(32.852327, ChiSquared.Quantile(0.975, 19), 6e-7);
    }

    [Fact]
    public void Nothing_lies_below_zero()
    {
        Assert.Equal(0, ChiSquared.Cumulative(-1, 5));
        Close.Relative(1, ChiSquared.UpperTail(-1, 5), 1e-15);
    }

    private static double Tail(double p, double x, double nu) => p <= 0.5 ? ChiSquared.Cumulative(x, nu) : ChiSquared.UpperTail(x, nu);
}
