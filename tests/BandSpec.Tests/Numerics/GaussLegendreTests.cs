using BandSpec.Core.Numerics;

using Xunit;

namespace BandSpec.Tests.Numerics;

public sealed class GaussLegendreTests
{
    [Theory]
    [InlineData(1)]
    [InlineData(7)]
    [InlineData(16)]
    [InlineData(33)]
    [InlineData(64)]
    [InlineData(150)]
    public void Exact_for_polynomials_up_to_degree_2n_minus_1(int order)
    {
        for (int degree = 0; degree < 2 * order; degree++)
        {
            double integral = GaussLegendre.Integrate(x => Math.Pow(x, degree), -1, 1, order);
            Assert.Equal(degree % 2 == 0 ? 2.0 / (degree + 1) : 0, integral, 1e-14);
        }
    }

    [Fact]
    public void Nodes_rise_and_weights_add_up_to_two()
    {
        GaussRule rule = GaussLegendre.Rule(48);
        Assert.Equal(rule.Nodes.Order(), rule.Nodes);
        Assert.Equal(2, rule.Weights.Sum(), 1e-14);
        Assert.Same(rule, GaussLegendre.Rule(48));
    }

    [Fact]
    public void Panels_add_up()
    {
        Close.Relative(Math.E - 1, GaussLegendre.IntegrateBetween(Math.Exp, [0, 0.1, 0.75, 1], order: 8), 1e-15);
    }
}
