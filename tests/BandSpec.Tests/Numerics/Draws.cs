namespace BandSpec.Tests.Numerics;

/// <summary>Random numbers for naive simulations in tests; the generator is handed in, so every run draws the same.</summary>
internal static class Draws
{
    /// <summary>A standard normal number (Box and Muller 1958): shares nothing with the code under test.</summary>
    public static double Normal(Random random) =>
        Math.Sqrt(-2 * Math.Log(1 - random.NextDouble())) * Math.Cos(2 * Math.PI * random.NextDouble());
}
