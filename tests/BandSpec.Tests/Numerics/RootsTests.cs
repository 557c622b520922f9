using BandSpec.Core.Numerics;

using Xunit;

namespace BandSpec.Tests.Numerics;

public sealed class RootsTests
{
    [Fact]
    public void Finds_roots_to_the_spacing_of_doubles()
    {
        Close.Relative(Math.Sqrt(2), Roots.Bracketed(x => x * x - 2, 0, 5), 5e-16);
        Close.Relative(Math.Pow(1e-12, 1 / 9.0), Roots.Bracketed(x => Math.Pow(x, 9) - 1e-12, 1, 0), 1e-15);
        Close.Relative(0.7, Roots.Bracketed(x => x < 0.7 ? -1e-30 : 1e30, -3, 4), 1e-15);
        Assert.Equal(2, Roots.Bracketed(x => x - 2, 2, 5));
        Assert.Equal(1.5, Roots.Bracketed(x => x - 1.55, 0, 10, tolerance: 0.2), 0.2);
    }

    [Fact]
    public void Refuses_ends_of_the_same_sign() =>
        Assert.Throws<ArgumentException>(() => Roots.Bracketed(x => x * x + 1, -1, 1));
}
