using BandSpec.Core.Numerics;

using Xunit;

namespace BandSpec.Tests.Numerics;

public sealed class ToleranceFactorsTests
{
    /// <summary>
    /// NIST/SEMATECH e-Handbook 7.2.6.3, n = 43, content 90 %, confidence 99 %: χ² and k1 found in print (23.650095, 1.873954), recomputed with
    /// SciPy 1.10.1 and R 4.2.2. The handbook's "exact" two-sided 2.210167 has its arguments exchanged (trap T1; check-values section 3).
    /// </summary>
    [Fact]
    public void Handbook_example()
    {
        Close.Relative(23.6500946778, ChiSquared.Quantile(0.01, 42), 1e-11);
        Close.Relative(1.8739536059, ToleranceFactors.OneSided(43, 0.90, 0.99), 1e-10);
        Close.Relative(2.2228251738, ToleranceFactors.TwoSided(43, 0.90, 0.99), 1e-10);
    }

    /// <summary>What the exchanged arguments compute: content 99 %, confidence 5 % (trap T1).</summary>
    [Fact]
    public void The_printed_two_sided_factor_has_its_arguments_exchanged() =>
        Assert.Equal(2.210167, ToleranceFactors.TwoSided(43, 0.99, 0.05), 6e-7);

    /// <summary>Howe's approximation 2.217316 (handbook, found) lies beside the exact factor, not on it.</summary>
    [Fact]
    public void Howes_approximation_is_near()
    {
        double howe = NormalDistribution.Quantile(0.95) * Math.Sqrt(42 * (1 + 1.0 / 43) / ChiSquared.Quantile(0.01, 42));
        Assert.Equal(2.2173158967, howe, 6e-11);
        Close.Relative(howe, ToleranceFactors.TwoSided(43, 0.90, 0.99), 0.003);
    }

    /// <summary>
    /// Recomputed: k1 by noncentral t, k2 by exact integral (check-values section 3); 3.393, 36.519 and 5.077 also match the tables of Odeh and
    /// Owen and of ISO 16269-6 from memory, not found.
    /// </summary>
    [Theory]
    [InlineData(2, 0.95, 0.95, 26.259674, 36.519215)]
    [InlineData(5, 0.95, 0.95, 4.202681, 5.076875)]
    [InlineData(10, 0.95, 0.95, 2.910963, 3.393429)]
    [InlineData(10, 0.99, 0.95, 3.981118, 4.436909)]
    [InlineData(20, 0.95, 0.95, 2.396002, 2.760346)]
    [InlineData(20, 0.99, 0.95, 3.295157, 3.620986)]
    [InlineData(30, 0.99, 0.95, 3.063901, 3.354576)]
    [InlineData(30, 0.9973, 0.95, 3.634642, 3.904449)]
    [InlineData(100, 0.99, 0.95, 2.683958, 2.935549)]
    public void Factors(int n, double content, double confidence, double oneSided, double twoSided)
    {
        Assert.Equal(oneSided, ToleranceFactors.OneSided(n, content, confidence), 6e-7);
        Assert.Equal(twoSided, ToleranceFactors.TwoSided(n, content, confidence), 6e-7);
    }

    [Fact]
    public void With_very_many_readings_the_factor_is_the_normal_quantile() =>
        Assert.Equal(NormalDistribution.Quantile(0.995), ToleranceFactors.TwoSided(1e8, 0.99, 0.5), 1e-6);
}
