using BandSpec.Core.Numerics;
using CsCheck;
using Xunit;

namespace BandSpec.Tests.Numerics;

/// <summary>Polynomials in two variables.</summary>
public sealed class SurfaceTests
{
    [Fact]
    public void Value_and_derivatives_are_those_of_a_surface_differentiated_by_hand()
    {
        // x³t² + 2x − 5t + 7 at (2, 3)
        Surface surface = Surface.Add(Surface.Add(Surface.Product([0, 0, 0, 1], [0, 0, 1]), Surface.Product([0, 2], [1])), Surface.Product([1], [7, -5]));
        Assert.Equal(new SurfaceJet(68, 110, 43, 108, 72, 16), surface.At(2, 3));
        Assert.Equal(68, surface.ValueAt(2, 3));
    }

    [Fact]
    public void Derivatives_are_those_that_finite_steps_tend_to() => Gen.Select(
        Gen.Double[-1, 1].Array[20], Gen.Double[0, 1], Gen.Double[0, 1]).Sample((c, x, t) =>
        {
            Surface surface = Enumerable.Range(0, 4).Aggregate(
                Surface.Product([], []), (sum, i) => Surface.Add(sum, Surface.Product([.. new double[i], 1], c[(5 * i)..((5 * i) + 5)])));
            const double h = 1e-5;
            double F(int i, int k) => surface.ValueAt(x + (i * h), t + (k * h));
            SurfaceJet jet = surface.At(x, t);
            Assert.Equal(F(0, 0), jet.Value, 1e-12);
            Assert.Equal((F(1, 0) - F(-1, 0)) / (2 * h), jet.X, 1e-7);
            Assert.Equal((F(0, 1) - F(0, -1)) / (2 * h), jet.T, 1e-7);
            Assert.Equal((F(1, 0) - (2 * F(0, 0)) + F(-1, 0)) / (h * h), jet.XX, 1e-3);
            Assert.Equal((F(0, 1) - (2 * F(0, 0)) + F(0, -1)) / (h * h), jet.TT, 1e-3);
            Assert.Equal((F(1, 1) - F(1, -1) - F(-1, 1) + F(-1, -1)) / (4 * h * h), jet.XT, 1e-3);
        });
}
