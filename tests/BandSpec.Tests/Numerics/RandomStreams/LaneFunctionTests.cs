using System.Runtime.Intrinsics;
using BandSpec.Core.Numerics.RandomStreams;
using CsCheck;
using Xunit;

namespace BandSpec.Tests.Numerics.RandomStreams;

/// <summary>The C library of the machine is good to one unit in the last place, which makes it a judge at 4e-16.</summary>
public sealed class LaneFunctionTests
{
    [Fact]
    public void The_logarithm_agrees_with_the_c_library() =>
        Gen.Double[-300.0, 300.0].Sample(power =>
        {
            double x = Math.Pow(10, power);
            double own = LaneFunctions.Log(Vector512.Create(x)).ToScalar();
            Assert.InRange(Math.Abs(own - Math.Log(x)), 0, 4e-16 * Math.Max(1e-3, Math.Abs(own)));
        });

    [Fact]
    public void The_logarithm_near_one_keeps_its_relative_accuracy() =>
        Gen.Double[-0.3, 0.4].Sample(e =>
        {
            double x = 1 + e;
            double own = LaneFunctions.Log(Vector512.Create(x)).ToScalar();
            Assert.InRange(Math.Abs(own - Math.Log(x)), 0, 4e-16 * Math.Abs(own));
        });

    [Fact]
    public void Sine_and_cosine_of_turns_agree_with_the_c_library() =>
        Gen.Double[0.0, 1.0].Sample(t =>
        {
            (Vector512<double> sine, Vector512<double> cosine) = LaneFunctions.SineAndCosineOfTurns(Vector512.Create(t));
            (double s, double c) = Math.SinCos(2 * Math.PI * t);
            Assert.InRange(Math.Abs(sine.ToScalar() - s), 0, 1.2e-15); // 2πt itself is rounded before the library sees it
            Assert.InRange(Math.Abs(cosine.ToScalar() - c), 0, 1.2e-15);
        });

    [Theory]
    [InlineData(0, 0, 1)]
    [InlineData(0.25, 1, 0)]
    [InlineData(0.5, 0, -1)]
    [InlineData(0.75, -1, 0)]
    [InlineData(1, 0, 1)]
    public void Quarter_turns_are_exact(double turns, double sine, double cosine)
    {
        (Vector512<double> s, Vector512<double> c) = LaneFunctions.SineAndCosineOfTurns(Vector512.Create(turns));
        Assert.Equal((sine, cosine), (s.ToScalar() + 0.0, c.ToScalar() + 0.0));
    }

    // Q(z) to 16 digits: mpmath 1.2.1, 30 digits, erfc(z/√2)/2; recomputed. Two-sided these are the usual sigma levels.
    [Theory]
    [InlineData(0.5, 0.3085375387259869)]
    [InlineData(3, 0.001349898031630095)]
    [InlineData(5, 2.866515718791939e-7)]
    [InlineData(6, 9.865876450376981e-10)]
    [InlineData(8, 6.220960574271784e-16)]
    [InlineData(12, 1.776482112077679e-33)]
    [InlineData(-2, 0.9772498680518208)]
    public void The_normal_tail_has_thirteen_digits(double z, double expected) =>
        Assert.Equal(1, NormalTail.Probability(z) / expected, 1e-13);

    [Fact]
    public void The_quantile_undoes_the_tail() =>
        Gen.Double[-5.0, 30.0].Sample(z =>
        {
            double tail = NormalTail.Probability(z);
            double back = NormalTail.Quantile(tail);
            // One rounding of a tail near 1 moves the quantile by 2^-53/φ(z).
            Assert.InRange(Math.Abs(back - z), 0, (1e-13 * Math.Max(1, Math.Abs(z))) + (z < 0 ? 3e-16 / NormalTail.Density(z) : 0));
        });

    [Fact]
    public void The_exponential_agrees_with_the_c_library() =>
        Gen.Double[-700.0, 700.0].Sample(x => Assert.Equal(1, PortableFunctions.Exp(x) / Math.Exp(x), 1e-14));
}
