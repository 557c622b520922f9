using BandSpec.Documents.Printing;
using Xunit;

namespace BandSpec.Tests.Documents;

/// <summary>Figures are rounded once and to the safe side, and a page shows the letters that a file shows.</summary>
public sealed class RoundedTests
{
    [Theory]
    [InlineData(0.5001, 0.05, "0.55")]
    [InlineData(0.50, 0.05, "0.50")]
    [InlineData(0.1 + 0.2, 0.1, "0.3")]
    [InlineData(-0.51, 0.05, "-0.55")]
    [InlineData(0, 0.05, "0.00")]
    public void A_band_is_rounded_up(double value, double step, string expected) => Assert.Equal(expected, Rounded.Up(value, step).Plain);

    [Theory]
    [InlineData(0.9999, "0.999")]
    [InlineData(1.0, "1.000")]
    [InlineData(0.99999999999, "1.000")]
    [InlineData(1.9427, "1.942")]
    public void A_margin_is_rounded_down_so_that_none_below_1_prints_as_1(double value, string expected) =>
        Assert.Equal(expected, Rounded.Down(value, 0.001).Plain);

    [Theory]
    [InlineData(0.48591, 0.51391, "0.4860", "0.5139")]
    [InlineData(-0.00001, 0.00001, "0.0000", "0.0000")]
    [InlineData(-1.00004, -0.99996, "-1.0000", "-1.0000")]
    public void Limits_are_rounded_inward(double lower, double upper, string expectedLower, string expectedUpper)
    {
        Assert.Equal(expectedLower, Rounded.Above(lower, 0.0001).Plain);
        Assert.Equal(expectedUpper, Rounded.Below(upper, 0.0001).Plain);
    }

    [Theory]
    [InlineData(0.000123, "130")]
    [InlineData(0.0000014, "1.4")]
    [InlineData(0.0000000649, "0.065")]
    [InlineData(0.00000000001, "0.001")]
    [InlineData(0, "0.001")]
    [InlineData(1, "1000000")]
    public void A_probability_has_two_figures_in_parts_per_million(double probability, string expected) =>
        Assert.Equal(expected, Rounded.PerMillion(probability).Plain);

    [Theory]
    [InlineData("-1234.5", ".", "\u22121234.5")]
    [InlineData("-12345.6", ",", "\u221212\u00a0345,6")]
    [InlineData("1234567", ".", "1\u00a0234\u00a0567")]
    [InlineData("0.00012", ",", "0,00012")]
    public void A_page_shows_the_same_figures_with_its_own_signs(string plain, string sign, string expected) =>
        Assert.Equal(expected, new Rounded(plain).Shown(sign));

    [Fact]
    public void What_is_smaller_than_can_be_told_is_told_so() => Assert.Equal("<\u00a00.001", Rounded.PerMillion(1e-20).Shown("."));
}
