using BandSpec.Core.Numerics;
using BandSpec.Tests.Reference;

using Xunit;

namespace BandSpec.Tests.Numerics;

public sealed class NoncentralTTests
{
    /// <summary>noncentral-t.csv: mpmath at 32 digits, recomputed; tails down to 1e-290.</summary>
    [Fact]
    public void Both_tails_agree_with_the_table()
    {
        foreach (double[] row in ReferenceTable.Numbers("noncentral-t.csv"))
        {
            (double nu, double delta, double t) = (row[0], row[1], row[2]);
            if (row[3] > 1e-290)
                Close.Relative(row[3], NoncentralT.Cumulative(t, nu, delta), 1e-12, $"P(T <= {t:R}), nu {nu}, delta {delta:R}");
            if (row[4] > 1e-290)
                Close.Relative(row[4], NoncentralT.UpperTail(t, nu, delta), 1e-12, $"P(T > {t:R}), nu {nu}, delta {delta:R}");
        }
    }

    /// <summary>
    /// SciPy 1.10.1 where its tail is above 1e-6, and R 4.2.2 where its algorithm (noncentrality up to 37.62) holds: both work to an absolute
    /// error and lose the small tails, which is why own code is needed.
    /// </summary>
    [Fact]
    public void Large_tails_agree_with_two_other_programs()
    {
        foreach (double[] row in ReferenceTable.Numbers("noncentral-t.csv"))
        {
            double lower = NoncentralT.Cumulative(row[2], row[0], row[1]), upper = NoncentralT.UpperTail(row[2], row[0], row[1]);
            if (Math.Min(lower, upper) < 1e-6)
                continue;
            Close.Relative(row[5], lower, 1e-12, "SciPy, lower");
            Close.Relative(row[6], upper, 1e-12, "SciPy, upper");
            if (Math.Abs(row[1]) <= 37.62)
                Assert.Equal(row[7], lower, 1e-9);
        }
    }

    [Fact]
    public void Quantile_and_noncentrality_turn_the_distribution_round()
    {
        foreach (double nu in new[] { 1.0, 4, 29, 999 })
        {
            foreach (double p in new[] { 1e-12, 0.001, 0.05, 0.5, 0.95, 0.999999 })
            {
                foreach (double delta in new[] { -3.0, 0, 0.5, 25 })
                {
                    double t = NoncentralT.Quantile(p, nu, delta);
                    Close.Relative(p, NoncentralT.Cumulative(t, nu, delta), 1e-10, $"p {p} nu {nu} delta {delta}");
                    Assert.Equal(delta, NoncentralT.Noncentrality(t, nu, p), 1e-9 * (1 + Math.Abs(delta)));
                }
            }
        }
    }

    /// <summary>
    /// Student's t, 9 degrees of freedom, 97.5 %: 2.26215716279820554 by mpmath, and R 4.2.2 has the same; SciPy 1.10.1 prints 2.26215716274099,
    /// off by 2.5e-11 (recomputed).
    /// </summary>
    [Fact]
    public void Without_noncentrality_it_is_students_t() => Close.Relative(2.26215716279820554, NoncentralT.Quantile(0.975, 9, 0), 1e-14);
}
