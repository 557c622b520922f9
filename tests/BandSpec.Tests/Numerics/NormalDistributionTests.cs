using BandSpec.Core.Numerics;
using BandSpec.Tests.Reference;

using Xunit;

namespace BandSpec.Tests.Numerics;

public sealed class NormalDistributionTests
{
    /// <summary>normal-tail.csv: mpmath at 50 digits, recomputed.</summary>
    [Fact]
    public void Tails_keep_fifteen_digits_out_to_where_doubles_end()
    {
        foreach (double[] row in ReferenceTable.Numbers("normal-tail.csv"))
        {
            double z = row[0], tail = row[1], logTail = row[2];
            Close.Relative(logTail, NormalDistribution.LogUpperTail(z), 1e-15, $"ln Q({z})");
            if (z <= 37.5)
                Close.Relative(tail, NormalDistribution.UpperTail(z), 1e-15, $"Q({z})");
            // A double near one half cannot tell z better than its own spacing over the density.
            double blur = double.Epsilon + (Math.BitIncrement(tail) - tail) / NormalDistribution.Density(z);
            if (z is > 0 and <= 37)
                Assert.Equal(z, NormalDistribution.UpperQuantile(tail), 1e-15 * z + blur);
        }
    }

    /// <summary>Sigma level against fraction outside, two-sided: mpmath, recomputed (check-values section 4).</summary>
    [Theory]
    [InlineData(1, 0.3173105078629141)]
    [InlineData(2, 0.04550026389635841)]
    [InlineData(3, 0.002699796063260189)]
    [InlineData(3.5, 0.0004652581580710501)]
    [InlineData(4, 6.334248366623984e-5)]
    [InlineData(4.5, 6.795346249460121e-6)]
    [InlineData(5, 5.733031437583878e-7)]
    [InlineData(5.5, 3.797912493177544e-8)]
    [InlineData(6, 1.973175290075396e-9)]
    [InlineData(7, 2.55962508777167e-12)]
    public void Fraction_outside_k_sigma(double k, double outside) =>
        Close.Relative(outside, NormalDistribution.FractionOutside(k), 2e-15);

    /// <summary>Process shifted by 1.5 sigma, both tails, ppm: mpmath, recomputed (check-values section 4).</summary>
    [Theory]
    [InlineData(3, 66810.598941983)]
    [InlineData(4, 6209.6843153386)]
    [InlineData(5, 232.62911919553)]
    [InlineData(6, 3.397673156639)]
    public void Fraction_outside_with_shift(double k, double partsPerMillion)
    {
        double outside = NormalDistribution.UpperTail(k - 1.5) + NormalDistribution.UpperTail(k + 1.5);
        Close.Relative(partsPerMillion, outside * 1e6, 1e-13);
    }

    /// <summary>
    /// "Cp 1.33 is 63 ppm" holds for 4/3 only; 1.33 itself is 66.07 ppm, and 1.67 is 0.5443 ppm where 5/3 is 0.5733 (trap T5;
    /// mpmath, recomputed, check-values section 4).
    /// </summary>
    [Theory]
    [InlineData(0.5, 133614.402538)]
    [InlineData(1.33, 66.0732952588)]
    [InlineData(4.0 / 3, 63.3424836662)]
    [InlineData(1.67, 0.544300354571)]
    [InlineData(5.0 / 3, 0.573303143758)]
    [InlineData(2, 0.00197317529008)]
    public void Centred_capability_to_parts_per_million(double capability, double partsPerMillion) =>
        Close.Relative(partsPerMillion, NormalDistribution.FractionOutside(3 * capability) * 1e6, 1e-11);

    [Fact]
    public void Interval_probabilities_do_not_cancel()
    {
        // The share between z and z + h is the mean density times h, up to (zh)²: a difference of tails would keep seven digits.
        foreach (double z in new[] { -6.0, -0.3, 0, 0.7, 5, 20 })
        {
            double end = z + 1e-9, share = NormalDistribution.FractionBetween(new(z, end));
            double density = (NormalDistribution.Density(z) + NormalDistribution.Density(end)) / 2;
            Close.Relative(density, share / (end - z), 2e-15 + 1.2e-16 * z * z, $"at {z}");
        }
        // Halves put together make the whole, across the seam between quadrature and tails.
        foreach (double width in new[] { 0.5, 0.69, 0.71, 2, 9 })
        {
            double whole = NormalDistribution.FractionBetween(new(0.4, 0.4 + width));
            double parts = NormalDistribution.FractionBetween(new(0.4, 0.4 + width / 3))
                + NormalDistribution.FractionBetween(new(0.4 + width / 3, 0.4 + width));
            Close.Relative(whole, parts, 3e-15, $"width {width}");
        }
    }

    [Fact]
    public void Ends_of_the_line()
    {
        Assert.Equal(0, NormalDistribution.UpperTail(double.PositiveInfinity));
        Assert.Equal(1, NormalDistribution.UpperTail(double.NegativeInfinity));
        Assert.Equal(double.NegativeInfinity, NormalDistribution.LogUpperTail(double.PositiveInfinity));
        Assert.Equal(double.NegativeInfinity, NormalDistribution.Quantile(0));
        Assert.Equal(double.PositiveInfinity, NormalDistribution.Quantile(1));
        Assert.Equal(0, NormalDistribution.Quantile(0.5));
        Assert.Equal(double.NaN, NormalDistribution.Quantile(1.1));
        Assert.Equal(0.5, NormalDistribution.Cumulative(0));
        Assert.Equal(1, NormalDistribution.FractionBetween(new(double.NegativeInfinity, double.PositiveInfinity)));
        Assert.Equal(0, NormalDistribution.FractionBetween(new(2, 1)));
    }
}
