using BandSpec.Core.Numerics;

using Xunit;

namespace BandSpec.Tests.Numerics;

public sealed class StraightLinesTests
{
    private static readonly double[] Grid = [.. Enumerable.Range(0, 1001).Select(i => i / 1000.0)];

    /// <summary>
    /// Data A: textbook problem (found, residuals of its least-squares line reproduced), data E: constructed run in % of span; lines recomputed with
    /// a linear program (check-values section 10).
    /// </summary>
    [Fact]
    public void Measured_points()
    {
        double[] x = [0, 20, 40, 60, 80, 100];
        Check(x, [0, 15, 32, 49.5, 69, 92], -5.70, 2.85, 3.5625, 1e-12);
        Check(x, [0.04 / 3, -0.02 / 3, -0.085 / 3, -0.05 / 3, 0.05 / 3, 0.04], 0.0523333, 0.0261667, 0.0373810, 6e-8);
        Line independent = StraightLines.Independent(x, [0, 15, 32, 49.5, 69, 92]);
        Assert.Equal(0.92, independent.Slope, 1e-14);
        Assert.Equal(-2.85, independent.Offset, 1e-13);
        Assert.Equal(0.884375, StraightLines.ZeroBased(x, [0, 15, 32, 49.5, 69, 92]).Slope, 1e-12);
    }

    /// <summary>Data C, bow 4x(1−x): terminal 1, independent ½, zero-based 12 − 8√2; at five points ⅔ (check-values section 10).</summary>
    [Fact]
    public void Bow()
    {
        Check(Grid, [.. Grid.Select(x => 4 * x * (1 - x))], 1, 0.5, 12 - 8 * Math.Sqrt(2), 3e-6);
        double[] five = [0, 0.25, 0.5, 0.75, 1];
        Check(five, [.. five.Select(x => 4 * x * (1 - x))], 1, 0.5, 2.0 / 3, 1e-12);
        Assert.Equal(2.0 / 3, StraightLines.ZeroBased(five, [.. five.Select(x => 4 * x * (1 - x))]).Slope, 1e-12);
    }

    /// <summary>Data D, (27/4)x²(1−x): terminal 1, independent ½, zero-based 0.608647; least squares would give 0.9 (trap T7).</summary>
    [Fact]
    public void Skewed_bow() => Check(Grid, [.. Grid.Select(x => 6.75 * x * x * (1 - x))], 1, 0.5, 0.608647, 3e-6);

    [Fact]
    public void A_straight_line_deviates_from_none()
    {
        double[] x = [1, 2, 4], y = [3, 5, 9];
        Check(x, y, 0, 0, 0, 1e-15);
        Assert.Equal(new Line(1, 2), StraightLines.ZeroBased(x, y));
    }

    /// <summary>No other line does better: disturbed slopes and intercepts are all worse.</summary>
    [Fact]
    public void Disturbing_the_independent_line_makes_it_worse()
    {
        var random = new Random(3);
        for (int k = 0; k < 200; k++)
        {
            double[] x = [.. Enumerable.Range(0, 7).Select(i => i + 0.5 * random.NextDouble())], y = [.. x.Select(_ => random.NextDouble())];
            Line line = StraightLines.Independent(x, y);
            double least = Math.Abs(StraightLines.LargestDeviation(line, x, y));
            foreach ((double offset, double slope) in new[] { (1e-4, 0.0), (-1e-4, 0), (0, 1e-4), (0, -1e-4), (-3e-4, 1e-4), (3e-4, -1e-4) })
                Assert.True(Math.Abs(StraightLines.LargestDeviation(new(line.Offset + offset, line.Slope + slope), x, y)) > least);
        }
    }

    private static void Check(double[] x, double[] y, double terminal, double independent, double zeroBased, double tolerance)
    {
        Assert.Equal(Math.Abs(terminal), Math.Abs(StraightLines.LargestDeviation(StraightLines.Terminal(x, y), x, y)), tolerance);
        Assert.Equal(independent, Math.Abs(StraightLines.LargestDeviation(StraightLines.Independent(x, y), x, y)), tolerance);
        Assert.Equal(zeroBased, Math.Abs(StraightLines.LargestDeviation(StraightLines.ZeroBased(x, y), x, y)), tolerance);
    }
}
