using Xunit;

namespace BandSpec.Tests;

public sealed class Smoke
{
    [Fact]
    public void Runs() => Assert.Equal(4, 2 + 2);
}
